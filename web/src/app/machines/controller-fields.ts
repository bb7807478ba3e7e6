import { CODE_DEEDS, INPUT_MEANINGS } from '#engine';
import type { Choice, ChoiceField, FactField, FactSection } from '../ui/facts/fact-field';
import { figure, length, maybe } from '../ui/facts/fact-field';

/** The controller part of the setup contract: how this machine reads a program. */
function choice(
  key: string,
  label: string,
  help: string,
  choices: Record<string, string>,
): ChoiceField {
  const list = Object.entries(choices).map(([value, word]): Choice => ({ value, label: word }));
  return { type: 'choice', key, label, help, choices: list };
}
const spelt = (values: readonly string[]): readonly Choice[] =>
  values.map((value) => ({ value, label: value.replaceAll('-', ' ') }));
const parameter = (key: string, label: string, help: string): FactField => ({
  type: 'text',
  key,
  label,
  help,
  mono: true,
  optional: true,
});

const READING: FactSection = {
  title: 'How it reads a program',
  fields: [
    choice(
      'language',
      'Language',
      'Which way of writing parameters and jumps the controller knows.',
      {
        rs274ngc: 'RS274/NGC: named parameters, o-words',
        'custom-macro': 'custom macro: # numbers, IF … GOTO, WHILE',
      },
    ),
    choice(
      'numbers',
      'A number without a point',
      'Whether X100 means 100 or a hundred smallest steps.',
      {
        decimal: 'is what it says',
        'least-increment': 'counts least increments',
      },
    ),
    choice('dwell', 'P of a dwell (G4)', 'The unit in which a pause is written.', {
      seconds: 'seconds',
      milliseconds: 'milliseconds',
    }),
    length(
      'arcTolerance',
      'Arc tolerance',
      'Start and end radius of an arc may differ by this much.',
    ),
    figure(
      'longestBlock',
      'Longest block',
      'whole',
      'Characters in a line before the controller cuts it off or refuses it.',
    ),
    choice(
      'rapids',
      'Rapid path',
      'Whether a G0 over two axes runs straight from point to point.',
      {
        coordinated: 'all axes arrive together, straight',
        independent: 'each axis at its own speed',
      },
    ),
    {
      type: 'group',
      key: 'defaults',
      label: 'State after power-on and after the end of a program',
      help: 'A program that does not state one of these runs in what stands here.',
      fields: [
        choice('units', 'Units', 'G21 or G20.', { mm: 'millimetres (G21)', inch: 'inches (G20)' }),
        choice('plane', 'Plane', 'G17, G18 or G19.', {
          xy: 'XY (G17)',
          zx: 'ZX (G18)',
          yz: 'YZ (G19)',
        }),
        choice('distance', 'Distance', 'G90 or G91.', {
          absolute: 'absolute (G90)',
          incremental: 'incremental (G91)',
        }),
        choice('arcCentre', 'Arc centre', 'What I, J and K are measured from.', {
          incremental: 'from the start of the arc',
          absolute: 'from work zero',
        }),
        choice('feed', 'Feed', 'G93, G94 or G95.', {
          'per-minute': 'per minute (G94)',
          'inverse-time': 'inverse time (G93)',
          'per-revolution': 'per revolution (G95)',
        }),
        { type: 'text', key: 'workOffset', label: 'Work offset', help: 'Such as G54.', mono: true },
        choice('return', 'Cycle return', 'Where a drilling cycle goes back to.', {
          G98: 'start height (G98)',
          G99: 'R height (G99)',
        }),
        choice('path', 'Path', 'How corners are taken.', {
          G61: 'exact path (G61)',
          'G61.1': 'exact stop (G61.1)',
          G64: 'blended (G64)',
        }),
      ],
    },
  ],
};

const TOOLS: FactSection = {
  title: 'Tools, changes and lengths',
  fields: [
    choice(
      'toolWord',
      'T names',
      'A wrong answer here loads the wrong tool: try it on the machine.',
      {
        tool: 'a tool, wherever it sits',
        pocket: 'a pocket, whatever sits in it',
      },
    ),
    choice('changeOn', 'A change happens at', 'The word that sets the changer going.', {
      M6: 'M6',
      T: 'T itself',
    }),
    choice('toolChange', 'Who changes', 'What runs when a change is called.', {
      macro: 'the tool-change macro',
      controller: 'the controller by itself',
      manual: 'a person, by hand',
      ignored: 'nobody: the call does nothing',
    }),
    choice('toolZero', 'T0 M6', 'What a change to tool 0 does.', {
      'put-away': 'puts the tool away',
      ignored: 'does nothing',
      'by-hand': 'waits for a person',
      refused: 'is refused',
    }),
    {
      type: 'flag',
      key: 'changeStopsSpindle',
      label: 'Spindle at a change',
      yes: 'the change stops it and waits',
      no: 'the program must stop it',
      help: 'Only for changes by the controller; a macro is read instead.',
    },
    choice('lengthOffset', 'Length after a change', 'Who applies the new tool’s length.', {
      program: 'the program (G43 H)',
      macro: 'the macro',
      automatic: 'the controller, by itself',
    }),
    choice(
      'lengthScheme',
      'What the length table holds',
      'How lengths are measured in this shop.',
      {
        'from-nose': 'lengths from the spindle nose',
        'from-master': 'differences to a master tool',
        'touch-off': 'touch-off values',
        none: 'nothing: zero is set with the tool in',
        'measured-in-macro': 'the macro measures each tool',
      },
    ),
    length('lengthReference', 'Length reference', 'The table holds gauge length minus this.'),
    figure(
      'diameterOffsetShift',
      'D number minus T number',
      'whole',
      'If D20 belongs to T4, write 16.',
    ),
  ],
};

const PARAMETERS: FactSection = {
  title: 'Parameters a macro reads',
  help: 'Written #500 or #<name>. Leave empty what this controller does not have.',
  fields: [
    parameter(
      'currentTool',
      'Tool in the spindle',
      'Holds the number of the tool the controller believes it holds.',
    ),
    parameter('selectedTool', 'Tool selected', 'Holds the number of the last T word.'),
    parameter(
      'currentPocket',
      'Pocket of the tool held',
      'Holds the pocket the held tool came from.',
    ),
    parameter(
      'selectedPocket',
      'Pocket of the tool selected',
      'Holds the pocket of the last T word.',
    ),
    {
      type: 'map',
      key: 'pocketContents',
      label: 'Contents of each pocket',
      help: 'The parameter that tells which tool sits in a pocket.',
      entry: 'pocket’s parameter',
      keyLabel: 'Pocket',
      keyExample: '1',
      value: { type: 'text', key: 'value', label: 'Parameter', mono: true },
      start: '',
    },
    {
      type: 'map',
      key: 'parameters',
      label: 'Starting values',
      help: 'What stands in a parameter before the program, in the units of the power-on state.',
      entry: 'value',
      keyLabel: 'Parameter',
      keyExample: '#1001',
      value: figure('value', 'Value', 'plain'),
      start: undefined,
    },
  ],
};

const CODES: FactSection = {
  title: 'What its own codes do',
  help: 'A code listed here overrides its ordinary meaning. A code that is not known stops a check, so list those that only this machine has.',
  fields: [
    {
      type: 'list',
      key: 'codes',
      label: 'Codes',
      entry: 'code',
      namedBy: 'code',
      start: { code: '', does: 'nothing' },
      fields: [
        { type: 'text', key: 'code', label: 'Code', mono: true, help: 'Like M64 or G38.2.' },
        {
          type: 'map',
          key: 'where',
          label: 'Only where',
          help: 'Words of the block that must have these values, such as P = 2.',
          optional: true,
          entry: 'word',
          keyLabel: 'Letter',
          keyExample: 'P',
          value: figure('value', 'Value', 'plain'),
          start: undefined,
        },
        { type: 'choice', key: 'does', label: 'Does', choices: spelt(CODE_DEEDS) },
        maybe({
          type: 'choice',
          key: 'input',
          label: 'Input it reads',
          choices: spelt(INPUT_MEANINGS),
          help: 'For read input and wait input.',
        } as const),
        maybe(figure('pocket', 'Pocket', 'whole', 'For an input of one pocket.')),
        maybe(figure('when', 'Value that says so', 'plain', 'The input’s value that means yes.')),
        {
          ...maybe(
            figure(
              'seconds',
              'Seconds',
              'plain',
              'How long it may take, or the letter that says it.',
            ),
          ),
          orLetter: true,
        },
        parameter('into', 'Result goes into', 'The parameter that keeps what was read.'),
        maybe(
          figure(
            'timeout',
            'Value at time-out',
            'plain',
            'What is kept when the input never came.',
          ),
        ),
        {
          type: 'text',
          key: 'from',
          label: 'Tool number from word',
          mono: true,
          optional: true,
          help: 'For set current tool: the letter that carries it.',
        },
      ],
    },
    {
      type: 'list',
      key: 'inputs',
      label: 'Inputs read as parameters',
      entry: 'input',
      namedBy: 'parameter',
      start: { parameter: '', means: 'holder-clamped', when: 1 },
      fields: [
        { type: 'text', key: 'parameter', label: 'Parameter', mono: true, help: 'Like #1005.' },
        { type: 'choice', key: 'means', label: 'Says', choices: spelt(INPUT_MEANINGS) },
        maybe(figure('pocket', 'Pocket', 'whole', 'For pocket occupied.')),
        figure('when', 'Value that says so', 'plain', 'Usually 1; some sensors say it with 0.'),
      ],
    },
  ],
};

const SWITCHES: FactSection = {
  title: 'Switches',
  help: 'Points on which controllers differ. As they stand they follow NISTIR 6556; change one only after trying it on the machine.',
  fields: [
    {
      type: 'group',
      key: 'switches',
      label: 'Behaviour',
      unlabelled: true,
      fields: [
        choice('homeAxes', 'G28 with axis words', 'Which axes go home.', {
          all: 'all axes',
          named: 'only those named',
        }),
        choice('cycleReturn', 'G98 goes back to', 'The start height of a series of holes.', {
          line: 'the height before this line',
          series: 'the height before the series',
        }),
        choice(
          'startMotion',
          'Motion mode at the start',
          'What a bare X Y does before any G0 or G1.',
          {
            none: 'none: it is refused',
            rapid: 'rapid (G0)',
            feed: 'feed (G1)',
          },
        ),
        choice('lengthWithoutH', 'G43 without H', 'What a length call without a number does.', {
          refused: 'is refused',
          'held-tool': 'takes the tool in the spindle',
        }),
        length(
          'leastIncrement',
          'Least increment',
          'The smallest step a number without a point counts.',
        ),
        length(
          'peckBackOff',
          'Peck back-off',
          'How far above the last depth a peck cycle turns to feed.',
        ),
        {
          type: 'flag',
          key: 'packedM98',
          label: 'P of M98',
          yes: 'packs repeats and number together',
          no: 'is the program number',
          help: 'Whether P50010 means program 10 five times.',
        },
        choice(
          'incrementalMachineMove',
          'G53 under G91',
          'A machine move while incremental is on.',
          {
            obeyed: 'is obeyed as absolute',
            refused: 'is refused',
            ignored: 'is ignored',
          },
        ),
        {
          type: 'flag',
          key: 'strict',
          label: 'Strictness',
          yes: 'refuses all that NISTIR 6556 refuses',
          no: 'accepts what router posts write',
          help: 'Strict finds more than most controllers mind.',
        },
      ],
    },
  ],
};

export const CONTROLLER_SECTIONS: readonly FactSection[] = [
  READING,
  TOOLS,
  PARAMETERS,
  CODES,
  SWITCHES,
];
