import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { reachShort } from './reach-short';

test('holds a cut deeper than the tool stands out', () => {
  checkRule(
    reachShort,
    {},
    `
G21 G90 G54
T1 M6
G43 H1 G0 Z5
G0 X50 Y50
G1 Z-40.5 F500
   ^^^^^^ reach-short (hold): The tip goes 40.5 mm (1.594 in) under the top of the stock, but T1 (10 mm end mill) stands only 40 mm (1.575 in) out of its holder.
M30
`,
  );
});

test('says nothing while the length in force is wrong, which is a stop of its own', () => {
  checkRule(
    reachShort,
    {},
    `
G21 G90 G54
T1 M6
G0 X50 Y50
G1 Z-1 F500
M30
`,
  );
});

test('allows exactly the stick-out, and depth clear of the stock', () => {
  checkRule(
    reachShort,
    {},
    `
G21 G90 G54
T1 M6
G43 H1 G0 Z5
G0 X50 Y50
G1 Z-40 F500
G0 Z5
G0 X50 Y660
G1 Z-45
M30
`,
  );
});

test('holds it over the whole table without a job sheet, and not with zero on the board', () => {
  checkRule(
    reachShort,
    { job: undefined },
    `
G21 G90 G54
T1 M6
G43 H1 G0 Z5
G0 X50 Y660
G1 Z-45 F500
   ^^^^ reach-short
M30
`,
  );
});
