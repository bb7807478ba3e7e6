import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { changedTools } from '../testing/test-shop';
import { flutesShort } from './flutes-short';

test('holds a cut deeper than the flutes', () => {
  checkRule(
    flutesShort,
    {},
    `
G21 G90 G54
T1 M6
G43 H1 G0 Z5
G0 X50 Y50
G1 Z-25.5 F500
   ^^^^^^ flutes-short (hold): The tip goes 25.5 mm (1.004 in) under the top of the stock, but the flutes of T1 (10 mm end mill) are 25 mm (0.984 in) long.
M30
`,
  );
});

test('allows exactly their length, a thinner shank, and flutes nobody entered', () => {
  checkRule(
    flutesShort,
    { tools: changedTools({ 2: { shank: 4 }, 4: { fluteLength: 0 } }) },
    `
G21 G90 G54
T1 M6
G43 H1 G0 Z5
G0 X50 Y50
G1 Z-25 F500
G0 Z5
T2 M6
G43 H2 Z5
G1 Z-30
T4 M6
G43 H4 Z5
G1 Z-30
M30
`,
  );
});
