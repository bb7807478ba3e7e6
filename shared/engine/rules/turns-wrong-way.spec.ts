import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { turnsWrongWay } from './turns-wrong-way';

test('flags M4 with a right-hand cutter', () => {
  checkRule(
    turnsWrongWay,
    {},
    `
T1 M6
S18000 M4
^^^^^^^^^ turns-wrong-way: M4 turns counterclockwise, but T1 (10 mm end mill) cuts clockwise.
M30
`,
  );
});

test('flags a direction the spindle does not have', () => {
  checkRule(
    turnsWrongWay,
    {},
    `
S18000 M4
^^^^^^^^^ turns-wrong-way: M4 turns counterclockwise, which this spindle does not do.
M30
`,
  );
});

test('allows M3, M5 and a start at speed zero', () => {
  checkRule(
    turnsWrongWay,
    {},
    `
T1 M6
S18000 M3
M5
S0 M4
M30
`,
  );
});
