import type { FactSection } from '../ui/facts/fact-field';
import { figure, length, maybe } from '../ui/facts/fact-field';
import { TAPERS } from '../machines/rack-fields';

/** Kinds the engine knows by name; any other text is kept and read as "other". */
export const TOOL_KINDS = [
  'compression',
  'end-mill',
  'upcut',
  'downcut',
  'ball',
  'drill',
  'v-bit',
  'surfacing',
  'saw',
  'probe',
  'knife',
  'other',
] as const;

const CUTTER: FactSection = {
  title: 'Cutter',
  fields: [
    figure('number', 'Number', 'whole', 'The T number, the same on every machine of the shop.'),
    {
      type: 'text',
      key: 'name',
      label: 'Name',
      help: 'What a person calls it: “6 mm compression”.',
    },
    {
      type: 'text',
      key: 'kind',
      label: 'Kind',
      suggestions: TOOL_KINDS,
      help: 'Decides how it may enter stock and whether it may turn.',
    },
    length('diameter', 'Diameter', 'Nominal, over the cutting edges.'),
    maybe(length('asGround', 'Diameter as ground', 'Measured, after sharpening.')),
    length('fluteLength', 'Flute length', 'From the tip to where the edges end.'),
    length('shank', 'Shank diameter', '6 and 6.35, 3 and 3.175, 8 and 7.9375 are easily confused.'),
    maybe(figure('flutes', 'Edges', 'whole', 'For feed per tooth.')),
    figure('maxRpm', 'Greatest speed', 'rpm', 'Of tool and holder together, the lower of both.'),
    {
      type: 'choice',
      key: 'turns',
      label: 'Cuts turning',
      choices: [
        { value: 'cw', label: 'clockwise (M3)' },
        { value: 'ccw', label: 'anticlockwise (M4)' },
        { value: 'never', label: 'must never turn' },
      ],
      help: 'A probe or a knife must never turn.',
    },
  ],
};

const LENGTHS: FactSection = {
  title: 'Lengths',
  help: 'Gauge length runs from the gauge line of the taper to the tip; stick-out from the holder’s lower face to the tip.',
  fields: [
    length(
      'gaugeLength',
      'Gauge length',
      'Measured on the setter; record a new one under Measure.',
    ),
    length('stickOut', 'Stick-out', 'What stands out of nut or holder.'),
    {
      type: 'group',
      key: 'measured',
      label: 'Measured',
      optional: true,
      presence: 'the gauge length was measured',
      absent: null,
      start: { at: '', method: '' },
      fields: [
        { type: 'moment', key: 'at', label: 'When' },
        { type: 'text', key: 'method', label: 'How', help: 'Setter, presetter, block.' },
      ],
    },
    {
      type: 'moment',
      key: 'touched',
      label: 'Last touched',
      optional: true,
      absent: null,
      help: 'When it was last re-clamped; a length measured before that no longer counts.',
    },
  ],
};

const HOLDER: FactSection = {
  title: 'Holder',
  fields: [
    {
      type: 'group',
      key: 'holder',
      label: 'Holder',
      unlabelled: true,
      fields: [
        {
          type: 'text',
          key: 'taper',
          label: 'Taper family',
          suggestions: TAPERS,
          help: 'Must be the pockets’ and the spindle’s; measure the flange, the number is not enough.',
        },
        length('diameter', 'Greatest diameter', 'Of flange or nut, whichever is wider.'),
        length('above', 'Above the gauge line', 'Taper and pull stud together, when parked.'),
        maybe(length('gripped', 'Shank gripped', 'Length of shank inside the collet.')),
        {
          type: 'group',
          key: 'collet',
          label: 'Collet',
          optional: true,
          presence: 'it holds by a collet',
          start: {},
          help: 'What the collet may clamp. A collet closes about 0.5 to 1 mm and never opens past its nominal size.',
          fields: [
            length('min', 'Clamps from'),
            length('max', 'Clamps to'),
            maybe(length('grips', 'Gripping length', 'The shank should fill two thirds of it.')),
          ],
        },
        {
          type: 'list',
          key: 'steps',
          label: 'Steps',
          entry: 'step',
          start: {},
          help: 'From the gauge line down to the holder’s face. With none, one cylinder of the greatest diameter stands in.',
          fields: [length('diameter', 'Diameter'), length('length', 'Length')],
        },
      ],
    },
  ],
};

const LIFE: FactSection = {
  title: 'Life',
  fields: [
    maybe(figure('life', 'Life', 'lifetime', 'Cutting time until it is changed or sharpened.')),
    figure('used', 'Used', 'lifetime', 'Cutting time since it was new or sharpened.'),
    maybe(figure('mass', 'Mass with holder', 'mass', 'For pockets with a weight limit.')),
    {
      ...maybe(
        figure('sisterOf', 'Sister of', 'whole', 'The number of the tool it can stand in for.'),
      ),
      absent: null,
    },
  ],
};

export const TOOL_SECTIONS: readonly FactSection[] = [CUTTER, LENGTHS, HOLDER, LIFE];

/** What the controller’s tables hold for this tool; beside the tool, not in it. */
export const TABLE_SECTIONS: readonly FactSection[] = [
  {
    title: 'Offset tables',
    help: 'What stands in the controller for this number. A check compares it with the gauge length.',
    fields: [
      { ...maybe(length('lengthOffset', 'Length offset (H)')), absent: null },
      { ...maybe(length('diameterOffset', 'Diameter offset (D)')), absent: null },
    ],
  },
];
