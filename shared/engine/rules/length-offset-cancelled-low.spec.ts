import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { lengthOffsetCancelledLow } from './length-offset-cancelled-low';

test('flags a program move that goes down after G49', () => {
  checkRule(
    lengthOffsetCancelledLow,
    {},
    `
G21 G90 G54
T1 M6
G43 H1 G0 Z50
G49
G0 Z20
   ^^^ length-offset-cancelled-low: The length offset of T1 (10 mm end mill) is cancelled (line 4), and Z then moves down by 125 mm (4.921 in) in program coordinates.
M30
`,
  );
});

test('allows G49 before machine moves, moves up, and cancelling before the length was applied', () => {
  checkRule(
    lengthOffsetCancelledLow,
    { offsets: { work: { G54: { z: -90 } } } },
    `
G21 G90 G54 G49
T1 M6
G43 H1 G0 Z-80
G49
G53 G0 Z0
T2 M6
G43 H2 G0 Z-80
G49 G0 Z80
G28
M30
`,
  );
});
