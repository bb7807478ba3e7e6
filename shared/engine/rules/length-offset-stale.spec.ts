import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { lengthOffsetStale } from './length-offset-stale';

test('flags a program Z move with the length of the tool before', () => {
  checkRule(
    lengthOffsetStale,
    {},
    `
G21 G90 G54
T1 M6
G43 H1 G0 Z50
T2 M6
G0 X10
G0 Z20
   ^^^ length-offset-stale: Z moves with T2 (6 mm end mill), but the length offset in force is still H1 of the tool before, so its tip runs 3 mm (0.118 in) too high.
G1 Z-1 F500
M30
`,
  );
});

test('allows everything ordinary between M6 and G43', () => {
  checkRule(
    lengthOffsetStale,
    {},
    `
G21 G90 G54
T1 M6
G43 H1 G0 Z50
G53 G0 Z0
T2 M6
S18000 M3
G0 X10 Y10
G91 G28 Z0
G90
G43 H2 Z20
T1 M6
G43 Z30 H1
M30
`,
  );
});

test('allows the same tool called again', () => {
  checkRule(
    lengthOffsetStale,
    {},
    `
G21 G90 G54
T1 M6
G43 H1 G0 Z50
T1 M6
G0 Z20
M30
`,
  );
});
