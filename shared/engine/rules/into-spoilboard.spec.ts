import { expect, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { intoSpoilboard } from './into-spoilboard';

// The board's top is machine Z -200, work zero Z -182: the board begins 18 mm under Z zero, and the
// tip may go 1 mm into it.
const START = 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X100 Y100 Z5';

test('flags a cut deeper than the allowance, by how much', () => {
  checkRule(
    intoSpoilboard,
    {},
    `
${START}
G1 Z-19 F1000
G1 Z-19.3
   ^^^^^^ into-spoilboard: The tip goes 1.3 mm (0.0512 in) into the spoilboard, 0.3 mm (0.0118 in) more than the 1 mm (0.0394 in) allowed.
M30
`,
  );
});

test('sees a wrong length offset as a wrong depth', () => {
  // T6 is 98 mm long; under the offset of T5 (90 mm) its tip stands 8 mm lower than the program says.
  checkRule(
    intoSpoilboard,
    {},
    `
G21 G90 G17 G54
T6 M6
S18000 M3
G43 H5
G0 X100 Y100 Z20
G1 Z-11 F1000
G1 Z-12
   ^^^^ into-spoilboard
M30
`,
  );
});

test('flags a rapid that touches the board at all', () => {
  checkRule(
    intoSpoilboard,
    {},
    `
${START}
G1 Z-18.5 F1000
G0 X130
   ^^^^ into-spoilboard: The tip goes 0.5 mm (0.0197 in) into the spoilboard at rapid.
M30
`,
  );
});

test('allows through cuts within the allowance, the retract from them and drilling cycles', () => {
  checkRule(
    intoSpoilboard,
    {},
    `
${START}
G1 Z-18.3 F1000
G1 X300
G3 X310 Y110 I0 J10
G0 Z5
M5
T3 M6
S6000 M3
G43 H3
G0 X50 Y50 Z5
G98 G83 Z-18.8 R2 Q5 F300
X90
G80
G53 G0 Z0
M30
`,
  );
});

test('does not see the board where its area ends', () => {
  checkRule(
    intoSpoilboard,
    {},
    `
${START}
G0 X1220
G1 Z-25 F1000
G1 X1210
   ^^^^^ into-spoilboard
M30
`,
  );
});

test('judges a tool that is not in the list by its offset, and nothing without one', () => {
  const change = { offsets: { length: { 20: 95 } } };
  const found = checkRule(
    intoSpoilboard,
    change,
    `
G21 G90 G17 G54
T20 M6
S18000 M3
G43 H20
G0 X100 Y100 Z5
G1 Z-20 F1000
   ^^^^ into-spoilboard
M30
`,
  );
  expect(found).toHaveLength(1);
  checkRule(intoSpoilboard, change, '\nG21 G90 G17 G54\nG0 X100 Y100 Z5\nG1 Z-20 F1000\nM30\n');
});
