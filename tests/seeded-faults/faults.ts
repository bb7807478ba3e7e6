import { changedTools, plainSetupDocument } from '../../shared/engine/testing/test-shop';
import { lineOf } from './clean-program';
import { added, changed, cutOff, removed, type Fault } from './plant';

/**
 * The table of planted faults. Rule and line are worked out from the edit, by reading it as a person
 * would, and never taken from the engine. To add a rule, add a row: an edit of the clean program or of
 * the setup that a person might really make, and nothing else that is wrong.
 */
const MACRO_DIALECT = { controller: { language: 'custom-macro' } };

/** Lengths as differences to tool 3 (gauge length 96), so that a missing one moves nothing far. */
const FROM_MASTER = {
  controller: { lengthScheme: 'from-master', lengthReference: 96 },
  offsets: {
    length: { 1: -1, 2: -4, 3: 0, 4: -3.6, 5: -6, 6: 2, 7: 1, 8: -2 },
    work: { G54: { x: 30, y: 40, z: -86 } },
  },
};

/** The plain rack with one pocket changed. */
function changedPocket(number: number, change: object): object {
  const pockets = plainSetupDocument().rack.pockets.map((pocket) =>
    pocket.number === number ? { ...pocket, ...change } : pocket,
  );
  return { rack: { pockets } };
}

/** The plain loading without tool 2, with what else is stated. */
function withoutTool2(change: object = {}): object {
  const pockets = plainSetupDocument().loading.pockets.filter(({ tool }) => tool !== 2);
  return { loading: { pockets, ...change } };
}

const CALL_OF_2 = lineOf('N80');
const FIRST_MOVE = lineOf('N40');
const HOLDER = { taper: 'ISO30', diameter: 50, above: 72 };

export const FAULTS: readonly Fault[] = [
  // Reading
  {
    rule: 'unreadable-block',
    story: 'a number is lost',
    text: changed('N40', 'N40 G0 X Y100'),
    severity: 'stop',
  },
  {
    rule: 'not-modelled',
    story: 'a code of another machine',
    text: added('N65', 'N66 M250'),
    severity: 'stop',
  },
  {
    rule: 'subprogram-missing',
    story: 'a call left in, its subprogram left out',
    text: added('N75', 'M98 P8100'),
    severity: 'stop',
  },
  {
    rule: 'subprogram-loop',
    story: 'the last line of a subprogram calls it again',
    text: added('N75', 'o8100 sub', 'G53 G0 Z0', 'o8100 call', 'o8100 endsub', 'o8100 call'),
    line: lineOf('N75') + 3,
    severity: 'stop',
  },
  {
    rule: 'never-ends',
    story: 'the counter of a loop is not counted',
    text: added('N190', '#1=0', 'o1 while [#1 LT 3]', 'G4 P1', 'o1 endwhile'),
    line: lineOf('N190') + 2,
    severity: 'stop',
  },
  {
    rule: 'raises-alarm',
    story: 'an alarm left in from trying out',
    text: added('N125', '#3000=1 (TRY)'),
    setup: MACRO_DIALECT,
    severity: 'stop',
  },
  {
    rule: 'repeated-word',
    story: 'a word typed twice',
    text: changed('N40', 'N40 G0 X100 X100 Y100'),
    severity: 'stop',
  },
  {
    rule: 'missing-word',
    story: 'a dwell without its time',
    text: added('N65', 'N66 G4'),
    severity: 'stop',
  },
  {
    rule: 'out-of-range-word',
    story: 'a negative feed',
    text: added('N65', 'N66 F-900'),
    severity: 'stop',
  },
  {
    rule: 'nested-comment',
    story: 'brackets in a comment',
    text: changed('(POCKET)', '(POCKET (ROUGH))'),
    severity: 'stop',
  },
  {
    rule: 'modal-conflict',
    story: 'two distance modes',
    text: changed('N10', 'N10 G91 G90 G94 G17 G21'),
    severity: 'stop',
  },
  {
    rule: 'long-block',
    story: 'a remark without end',
    text: changed('N65', `N65 G80 (${'LONG '.repeat(60)})`),
    severity: 'hold',
  },
  {
    rule: 'odd-characters',
    story: 'a stray sign',
    text: changed('N65', 'N65 G80 $'),
    severity: 'hold',
  },
  {
    rule: 'letter-for-digit',
    story: 'the letter O for nought',
    text: changed('N75', 'N75 MO5'),
    severity: 'stop',
  },
  {
    rule: 'text-after-end',
    story: 'two files joined',
    text: added('N210', 'N220 G0 X0'),
    severity: 'note',
  },
  {
    rule: 'missing-end',
    story: 'the end code is lost',
    text: removed('N205', 'N210'),
    line: lineOf('N210'),
    severity: 'hold',
  },
  {
    rule: 'cut-short',
    story: 'the transfer broke off inside a word',
    text: cutOff('N195', 'N195 G53 G0 Z'),
    severity: 'stop',
    also: [`${lineOf('N195')} missing-end`],
  },
  {
    rule: 'block-delete-matters',
    story: 'a last pass with a slash in front',
    text: added('N155', '/N156 G1 Z-18.5'),
    severity: 'hold',
  },
  // State
  {
    rule: 'units-not-stated',
    story: 'the unit word is lost',
    text: changed('N10', 'N10 G90 G94 G17'),
    line: FIRST_MOVE,
    severity: 'hold',
  },
  {
    rule: 'work-offset-not-stated',
    story: 'the first G54 is lost',
    text: removed('N40', 'N35'),
    severity: 'note',
  },
  {
    rule: 'work-offset-not-stated',
    story: 'the same where M30 resets nothing',
    shop: MACRO_DIALECT,
    text: removed('N40', 'N35'),
    severity: 'hold',
  },
  {
    rule: 'distance-not-stated',
    story: 'G90 is lost',
    text: changed('N10', 'N10 G94 G17 G21'),
    line: FIRST_MOVE,
    severity: 'note',
  },
  {
    rule: 'plane-not-stated',
    story: 'G17 is lost',
    text: changed('N10', 'N10 G90 G94 G21'),
    line: lineOf('N50'),
    severity: 'note',
  },
  {
    rule: 'units-change',
    story: 'a second unit word',
    text: added('N205', 'N206 G20'),
    severity: 'hold',
  },
  {
    rule: 'units-mismatch',
    story: 'the tool list is in inches, the program says millimetres',
    text: changed('(T2', '(T2 D=0.2362 CR=0. - ZMIN=-4. - FLAT END MILL)'),
    severity: 'stop',
  },
  {
    rule: 'work-offset-unset',
    story: 'zero is not set yet',
    setup: { offsets: { work: { G54: undefined } } },
    line: FIRST_MOVE,
    severity: 'hold',
  },
  {
    rule: 'state-left-over',
    story: 'G90 at the end is lost',
    shop: MACRO_DIALECT,
    text: removed('N210', 'N205'),
    severity: 'hold',
  },
  {
    rule: 'local-shift-left',
    story: 'a shift is not cancelled',
    shop: MACRO_DIALECT,
    text: added('N205', 'N206 G52 X5'),
    line: lineOf('N210') + 1,
    severity: 'hold',
  },
  {
    rule: 'position-assumed',
    story: 'zero where the head stands',
    text: added('N205', 'N206 G92 X0 Y0'),
    severity: 'hold',
    unattended: 'stop',
  },
  {
    rule: 'compensation-entry',
    story: 'a lead-in of 2 mm with a radius of 3 mm',
    text: added('N150', 'N151 G41 D4 G1 X42 F1000', 'N152 G40 X40'),
    severity: 'stop',
  },
  {
    rule: 'diameter-offset-other-tool',
    story: 'D of another tool',
    text: added('N150', 'N151 G41 D2 G1 X60 F1000', 'N152 G40 X40'),
    severity: 'hold',
  },
  {
    rule: 'machine-move-in-incremental',
    story: 'G53 under G91',
    shop: { controller: { switches: { incrementalMachineMove: 'refused' } } },
    text: added('N200', 'N201 G53 G0 Z0'),
    severity: 'stop',
  },
  {
    rule: 'split-machine-move',
    story: 'a line break inside the retract',
    text: changed('N195', 'N195 G53 G0', 'Z0'),
    severity: 'stop',
  },
  {
    rule: 'rotary-left-turned',
    story: 'the rotary axis is not turned back',
    shop: { machine: { travel: { a: [-3600, 3600] } }, offsets: { work: { G54: { a: 0 } } } },
    text: added('N205', 'N206 G0 A90'),
    line: lineOf('N210') + 1,
    severity: 'hold',
  },
  // Tools
  {
    rule: 'tool-unknown',
    story: 'the tool is not entered',
    setup: { tools: plainSetupDocument().tools.filter(({ number }) => number !== 2) },
    line: CALL_OF_2,
    severity: 'stop',
  },
  {
    rule: 'tool-not-loaded',
    story: 'the tool is on the bench',
    setup: withoutTool2(),
    line: CALL_OF_2,
    severity: 'stop',
  },
  {
    rule: 'tool-by-hand',
    story: 'the tool is fitted by hand',
    setup: withoutTool2({ byHand: [2] }),
    line: CALL_OF_2,
    severity: 'hold',
    unattended: 'stop',
  },
  {
    rule: 'tool-in-two-pockets',
    story: 'the loading names one tool twice',
    setup: {
      loading: {
        pockets: [2, 3, 4, 7].map((pocket) => ({ pocket, tool: pocket === 7 ? 2 : pocket })),
      },
    },
    line: CALL_OF_2,
    severity: 'stop',
  },
  {
    rule: 'holder-family',
    story: 'another flange of the same size',
    setup: { tools: changedTools({ 2: { holder: { ...HOLDER, taper: 'BT30' } } }) },
    line: CALL_OF_2,
    severity: 'stop',
  },
  {
    rule: 'too-wide-for-pocket',
    story: 'a wide holder',
    setup: { tools: changedTools({ 2: { holder: { ...HOLDER, diameter: 60 } } }) },
    line: CALL_OF_2,
    severity: 'stop',
  },
  {
    rule: 'too-long-for-pocket',
    story: 'a shallow pocket',
    setup: changedPocket(2, { longest: 90 }),
    line: CALL_OF_2,
    severity: 'stop',
  },
  {
    rule: 'too-heavy',
    story: 'a heavy cutter',
    setup: { ...changedPocket(2, { heaviest: 1 }), tools: changedTools({ 2: { mass: 1.4 } }) },
    line: CALL_OF_2,
    severity: 'hold',
  },
  {
    rule: 'too-long-to-cross',
    story: 'a pocket that opens to the far side',
    setup: changedPocket(2, { opens: '+y' }),
    line: CALL_OF_2,
    severity: 'stop',
  },
  {
    rule: 'change-without-tool',
    story: 'the tool number is lost',
    shop: { loading: { inSpindle: 3 } },
    text: changed('N25', 'N25 M6'),
    severity: 'stop',
  },
  {
    rule: 'number-order',
    story: 'M6 before its number',
    text: added('N65', 'N66 M6', 'N67 T2'),
    severity: 'stop',
  },
  {
    rule: 'selected-not-changed',
    story: 'M6 is forgotten',
    text: added('N105', 'N106 T7'),
    severity: 'hold',
  },
  {
    rule: 'preselect-left-over',
    story: 'a tool chosen for a pass that was taken out',
    text: added('N135', 'N136 T7'),
    severity: 'hold',
  },
  {
    rule: 'cut-before-change',
    story: 'the first call is lost and nobody knows what is in',
    shop: { loading: { inSpindle: 'unknown' } },
    text: removed('N50', 'N25'),
    severity: 'hold',
  },
  {
    rule: 'tool-comment-disagrees',
    story: 'programmed for another diameter',
    text: changed('(T2', '(T2 D=8. CR=0. - ZMIN=-4. - FLAT END MILL)'),
    severity: 'hold',
  },
  {
    rule: 'tool-comment-disagrees',
    story: 'programmed for another kind',
    text: changed('(T3', '(T3 D=5. CR=2.5 - ZMIN=-12. - BALL END MILL)'),
    severity: 'hold',
  },
  {
    rule: 'one-number-two-tools',
    story: 'two cutters posted as T2',
    text: added('(T2', '(T2 D=3. CR=0. - ZMIN=-2. - FLAT END MILL)'),
    severity: 'stop',
    also: [`${lineOf('(T2') + 1} tool-comment-disagrees`],
  },
  // T4 cuts 1.2 s down, 7.5 s along, 0.2 s round, 4.8 s up the side (13.7 s), then 570 mm at 4500: 7.6 s.
  {
    rule: 'life-short',
    story: 'a cutter with 20 s of its life left',
    setup: { tools: changedTools({ 4: { life: 3600, used: 3580 } }) },
    line: lineOf('N175'),
    severity: 'hold',
    unattended: 'stop',
  },
  {
    rule: 'not-measured',
    story: 'a new cutter, not measured',
    setup: { tools: changedTools({ 2: { measured: null } }) },
    line: CALL_OF_2,
    severity: 'hold',
    unattended: 'stop',
  },
  {
    rule: 'not-measured',
    story: 'touched since it was measured',
    setup: { tools: changedTools({ 2: { touched: '2026-12-01T08:00:00Z' } }) },
    line: CALL_OF_2,
    severity: 'hold',
    unattended: 'stop',
  },
  {
    rule: 'turns-wrong-way',
    story: 'M4 for M3',
    text: changed('N85', 'N85 S18000 M4'),
    severity: 'stop',
  },
  {
    rule: 'must-not-turn',
    story: 'a tool that never turns',
    setup: { tools: changedTools({ 2: { turns: 'never' } }) },
    line: lineOf('N85'),
    severity: 'stop',
  },
  {
    rule: 'collet-grip',
    story: 'a 6 mm shank in a 5 mm collet',
    setup: { tools: changedTools({ 2: { holder: { ...HOLDER, collet: { min: 4, max: 5 } } } }) },
    line: CALL_OF_2,
    severity: 'hold',
  },
  // Length
  {
    rule: 'length-offset-missing',
    story: 'G43 of the first tool is lost',
    shop: FROM_MASTER,
    text: changed('N45', 'N45 Z20'),
    severity: 'stop',
  },
  {
    rule: 'length-offset-missing',
    story: 'an H that was never entered',
    shop: FROM_MASTER,
    text: changed('N45', 'N45 G43 Z20 H33'),
    severity: 'stop',
  },
  // H3 is 96, tool 2 is 92: the tip runs 4 mm high, so nothing is met.
  {
    rule: 'length-offset-stale',
    story: 'G43 of a later tool is lost',
    text: changed('N95', 'N95 Z20'),
    severity: 'stop',
  },
  {
    rule: 'length-offset-other-tool',
    story: 'H of another tool',
    text: changed('N95', 'N95 G43 Z20 H4'),
    severity: 'stop',
  },
  {
    rule: 'length-offset-disagrees',
    story: 'half a millimetre between table and list',
    setup: { offsets: { length: { 2: 92.5 } } },
    line: lineOf('N95'),
    severity: 'hold',
  },
  {
    rule: 'length-offset-disagrees',
    story: 'two millimetres between table and list',
    setup: { offsets: { length: { 2: 94 } } },
    line: lineOf('N95'),
    severity: 'stop',
  },
  // Tool 2 is 4 mm shorter than the master: without its offset Z10 is 14 mm over the stock, 6 mm under Z20.
  {
    rule: 'length-offset-cancelled-low',
    story: 'G49 before a program move down',
    shop: FROM_MASTER,
    text: added('N115', 'N116 G49', 'N117 G0 Z10'),
    line: lineOf('N115') + 2,
    severity: 'stop',
  },
  {
    rule: 'reach-short',
    story: 'a cutter set deep into its collet',
    setup: { tools: changedTools({ 4: { stickOut: 18, fluteLength: 18.3 } }) },
    line: lineOf('N155'),
    severity: 'hold',
  },
  {
    rule: 'flutes-short',
    story: 'short flutes',
    setup: { tools: changedTools({ 4: { fluteLength: 18 } }) },
    line: lineOf('N155'),
    severity: 'hold',
  },
  // Arcs and cycles
  {
    rule: 'arc-radius-mismatch',
    story: 'a centre 1 mm off',
    text: changed('N165', 'N165 G3 X610 Y40 I0 J11'),
    severity: 'stop',
  },
  {
    rule: 'arc-centre-missing',
    story: 'the centre words are lost',
    text: changed('N165', 'N165 G3 X610 Y40'),
    severity: 'stop',
  },
  {
    rule: 'cycle-words-missing',
    story: 'R is lost',
    text: changed('N50', 'N50 G98 G81 X100 Y100 Z-12 F900'),
    severity: 'stop',
  },
  {
    rule: 'cycle-plane',
    story: 'R and Z are swapped',
    text: changed('N50', 'N50 G98 G81 X100 Y100 Z2 R-12 F900'),
    severity: 'stop',
  },
  {
    rule: 'cycle-left-on',
    story: 'G80 and the retract are lost',
    text: removed('N80', 'N65', 'N70'),
    severity: 'hold',
  },
  // Unattended
  {
    rule: 'pause-in-program',
    story: 'a stop in the middle',
    text: added('N125', 'N126 M0'),
    severity: 'note',
    unattended: 'stop',
  },
  {
    rule: 'pause-in-program',
    story: 'an optional stop',
    text: added('N125', 'N126 M1'),
    severity: 'note',
    unattended: 'hold',
  },
  {
    rule: 'hand-work',
    story: 'a person has to move a clamp',
    text: added('N125', '(MOVE THE CLAMPS)', 'N126 M0'),
    severity: 'note',
    unattended: 'hold',
    also: [`${lineOf('N125') + 2} pause-in-program`],
  },
  {
    rule: 'change-not-proven',
    story: 'the macro is not walked',
    setup: { controller: { toolChange: 'macro' } },
    line: lineOf('N25'),
    severity: 'hold',
    unattended: 'stop',
  },
];
