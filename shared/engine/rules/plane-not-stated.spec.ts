import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { planeNotStated } from './plane-not-stated';

test('notes an arc without a plane', () => {
  checkRule(
    planeNotStated,
    {},
    `
G21 G90 G54
G0 X0 Y0
G2 X10 Y10 I10 J0 F500
| plane-not-stated: An arc or a cycle runs without a plane having been stated; this controller would use XY if nothing changed it.
M30
`,
  );
});

test('allows straight moves without one, and arcs after G17', () => {
  checkRule(
    planeNotStated,
    {},
    `
G21 G90 G54
G0 X0 Y0
G1 X5 F500
G17 G2 X15 Y10 I10 J0
M30
`,
  );
});
