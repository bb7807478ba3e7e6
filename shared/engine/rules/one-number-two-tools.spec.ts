import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { oneNumberTwoTools } from './one-number-two-tools';

test('flags two sizes under one number', () => {
  checkRule(
    oneNumberTwoTools,
    {},
    `
(T2 D=6. CR=0. - ZMIN=-5 - FLAT END MILL)
(T2 D=3.175 CR=0. - ZMIN=-2 - FLAT END MILL)
 ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ one-number-two-tools: T2 is 3.175 mm (0.125 in) across in this comment and 6 mm (0.236 in) in the one of line 1.
G21 G90 G54
G0 X0
M30
`,
  );
});

test('allows the same size twice, in two units, and a head without stated units', () => {
  checkRule(
    oneNumberTwoTools,
    {},
    `
(T2 D=6. - FLAT END MILL)
G21 G90 G54
T2 M6 (0.236" END MILL)
G0 X0
(T2 6MM)
M30
`,
  );
});
