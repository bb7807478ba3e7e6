import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { unitsNotStated } from './units-not-stated';

test('flags the first move of a program that states no unit', () => {
  checkRule(
    unitsNotStated,
    {},
    `
G90 G54
G0 X10
| units-not-stated: The program moves without having stated its units; this controller would take millimetres if nothing changed it.
G0 X20
M30
`,
  );
});

test('flags a unit word that comes after the first move', () => {
  checkRule(
    unitsNotStated,
    {},
    `
G90 G54 G0 X10
| units-not-stated
G21
M30
`,
  );
});

test('allows machine moves and home moves before the unit word, and the word on the first moving block', () => {
  checkRule(
    unitsNotStated,
    {},
    `
G53 G0 Z0
G91 G28 Z0
G90
G20 G54 G0 X1
M30
`,
  );
});

test('allows a program that never moves', () => {
  checkRule(
    unitsNotStated,
    {},
    `
M5
M30
`,
  );
});
