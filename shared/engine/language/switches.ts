/** One thing on which controllers differ, as the setup says it. */
export interface Switch {
  /** Where it stands in the setup, under `controller`. */
  readonly key: string;
  /** Its values, the default first. */
  readonly values: readonly (string | number | boolean)[];
  readonly changes: string;
  readonly source: string;
  /** A program that comes out differently under the values; run by a test. */
  readonly example: string;
  /** What else of the setup has to differ for it to show. */
  readonly setup?: object;
}

const TRADE = 'common practice, no source';
const HEAD = 'G21 G90 G17 G94 F600\n';

export const SWITCHES: readonly Switch[] = [
  {
    key: 'language',
    values: ['rs274ngc', 'custom-macro'],
    changes:
      'The published language with named parameters and o-words, or macro variables with IF, GOTO, WHILE and G65. In the latter an unset variable takes its word with it, FIX drops the fraction, AND and OR work bit by bit, cycles are a group of their own beside G0 to G3, and G80 gives back the motion code from before them. There D is kept from block to block, the offset lines of an outside corner may run on to where they cross, and P beside an arc counts no turns.',
    source: 'NISTIR 6556; common practice for macros, no source',
    example: `${HEAD}#100=FIX[0-2.8]\nG0 X[#100+10]`,
  },
  {
    key: 'arcTolerance',
    values: [0.0127, 0.5],
    changes:
      'How far the two radii of an arc may differ, and a radius word fall short of half its chord, mm.',
    source: 'NISTIR 6556 3.5.3.2 for the rule; the limit is the controller’s own',
    example: `${HEAD}G0 X0 Y0\nG2 X10.2 Y0 I5 J0`,
  },
  {
    key: 'dwell',
    values: ['seconds', 'milliseconds'],
    changes: 'What P of G4 and of cycles counts.',
    source: 'NISTIR 6556 3.5.4 (seconds); common practice, no source (milliseconds)',
    example: `${HEAD}G4 P500`,
  },
  {
    key: 'numbers',
    values: ['decimal', 'least-increment'],
    changes: 'Whether a number without a point is a length, or a count of least increments.',
    source: `NISTIR 6556 3.2.2.1 (decimal); ${TRADE} (counts)`,
    example: `${HEAD}G0 X10`,
  },
  {
    key: 'longestBlock',
    values: [256, 20],
    changes: 'Blocks longer than this are a hold.',
    source: 'NISTIR 6556 3.2',
    example: `${HEAD}G1 X1.000000 Y2.000000 Z3.000000`,
  },
  {
    key: 'toolWord',
    values: ['tool', 'pocket'],
    changes: 'Whether T names a tool, or the pocket it is fetched from.',
    source: 'NISTIR 6556 3.7.3 (pocket)',
    example: `${HEAD}T2 M6`,
    setup: { loading: { pockets: [{ pocket: 2, tool: 3 }] } },
  },
  {
    key: 'changeOn',
    values: ['M6', 'T'],
    changes: 'Which word changes the tool.',
    source: TRADE,
    example: `${HEAD}T2`,
  },
  {
    key: 'rapids',
    values: ['coordinated', 'independent'],
    changes:
      'Whether a rapid runs straight, or each axis at its own speed, so that its path is only known to lie in a box.',
    source: 'NISTIR 6556 3.5.1 (straight)',
    example: `${HEAD}G0 X900 Y10`,
  },
  {
    key: 'switches.strict',
    values: [false, true],
    changes: 'Whether everything that NISTIR 6556 refuses is refused.',
    source: 'NISTIR 6556',
    example: `${HEAD}G0 X1 ; to the side`,
  },
  {
    key: 'switches.homeAxes',
    values: ['all', 'named'],
    changes: 'Whether G28 and G30 send every axis home, or those that are named.',
    source: `NISTIR 6556 3.5.8 (all); ${TRADE} (named)`,
    example: `${HEAD}G0 X50 Y50\nG91 G28 Z0\nG90`,
  },
  {
    key: 'switches.cycleReturn',
    values: ['line', 'series'],
    changes: 'Whether G98 returns to where its line began, or to where the series of cycles began.',
    source: `NISTIR 6556 3.5.20 (line); ${TRADE} (series)`,
    example: `${HEAD}G0 X10 Y10 Z20\nG99 G81 Z-5 R2\nX20\nG98 X30\nG80`,
  },
  {
    key: 'switches.startMotion',
    values: ['none', 'rapid', 'feed'],
    changes: 'The motion code in force before the program states one.',
    source: `NISTIR 6556 3.5.1 (none); ${TRADE} (rapid, feed)`,
    example: `${HEAD}X5 Y5`,
  },
  {
    key: 'switches.lengthWithoutH',
    values: ['refused', 'held-tool'],
    changes: 'What G43 without an H does.',
    source: `NISTIR 6556 3.5.11 (refused); ${TRADE} (the held tool’s)`,
    example: `${HEAD}T2 M6\nG43 G0 Z20`,
  },
  {
    key: 'switches.leastIncrement',
    values: [0.001, 0.01],
    changes: 'The least increment, mm, where numbers are counted in it.',
    source: TRADE,
    example: `${HEAD}G0 X10`,
    setup: { controller: { numbers: 'least-increment' } },
  },
  {
    key: 'switches.peckBackOff',
    values: [0.254, 1],
    changes: 'How far G73 backs off and how far above the last depth G83 stops its rapid, mm.',
    source: 'NISTIR 6556 3.5.16.4 for G83; common practice, no source, for G73',
    example: `${HEAD}G0 X10 Y10 Z20\nG73 Z-9 R2 Q3\nG80`,
  },
  {
    key: 'switches.packedM98',
    values: [false, true],
    changes: 'Whether P of M98 holds the repeats before its last four digits.',
    source: TRADE,
    example: `${HEAD}M98 P30100\nM30\nO100\nG91 G0 X7\nM99\nO30100\nG91 G0 X1\nM99`,
  },
  {
    key: 'switches.incrementalMachineMove',
    values: ['obeyed', 'refused', 'ignored'],
    changes: 'What G53 does under G91.',
    source: `NISTIR 6556 3.5.12 (refused); ${TRADE} (the others)`,
    example: `${HEAD}G0 X5\nG91 G53 G0 X20\nG90`,
  },
];
