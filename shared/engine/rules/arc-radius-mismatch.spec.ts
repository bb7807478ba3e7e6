import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { arcRadiusMismatch } from './arc-radius-mismatch';

describe('arc-radius-mismatch', () => {
  test('flags an end that lies off the circle by more than the controller allows', () => {
    // By hand: start radius 10, end radius |(0, 10.5)| = 10.5, 0.5 apart.
    checkRule(
      arcRadiusMismatch,
      {},
      `
G21 G90 G54 G17
G0 X10 Y0
G3 X0 Y10.5 I-10 J0 F500
   ^^^^^^^^^^^^^^^^ arc-radius-mismatch: The arc starts 10 mm (0.394 in) from its centre and ends 10.5 mm (0.413 in) from it, 0.5 mm (0.0197 in) apart; this controller allows 0.013 mm (0.0005 in).
M30
`,
    );
  });

  test('stays silent on an arc rounded to three decimals, as posts write them', () => {
    checkRule(
      arcRadiusMismatch,
      {},
      `
G21 G90 G54 G17
G0 X7.071 Y7.071
G3 X-7.071 Y7.071 I-7.071 J-7.071 F500
G20
G2 X-.2784 Y-.2784 I.2784 J-.2784 F50
M30
`,
    );
  });
});
