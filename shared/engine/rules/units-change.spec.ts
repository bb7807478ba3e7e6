import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { unitsChange } from './units-change';

test('flags a unit word that changes the unit after the first move', () => {
  checkRule(
    unitsChange,
    {},
    `
G21 G90 G54
G0 X10
G20
^^^ units-change: Units change from millimetres to inches after the program has begun to move.
G0 X1
M30
`,
  );
});

test('allows the unit stated again, and two unit words before anything moves', () => {
  checkRule(
    unitsChange,
    {},
    `
G20
G21 G90 G54
G53 G0 Z0
G20
G0 X1
G20
M30
`,
  );
});
