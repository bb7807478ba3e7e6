import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { arcImpossible } from './arc-impossible';

describe('arc-impossible', () => {
  // Each form is an error of NISTIR 6556 (numbers 7, 69, 101, 92 and 197 of its reference interpreter).
  test('flags each arc that no circle can be drawn for', () => {
    checkRule(
      arcImpossible,
      {},
      `
G21 G90 G54 G17
G0 X0 Y0
G2 X20 Y0 R5 F500
          ^^ arc-impossible: The radius of 5 mm (0.197 in) is 5 mm (0.197 in) too small: start and end are 20 mm (0.787 in) apart.
G2 X20 Y0 R10
          ^^^ arc-impossible: A radius arc ends where it starts, so its centre could lie anywhere around.
G2 X30 Y0 I5 R5
          ^^^^^ arc-impossible: The arc gives both a radius and a centre, and they may disagree.
G2 X40 I0 J0
       ^^^^^ arc-impossible: The centre of the arc lies on its start point, so it has no radius.
G2 X50 I5 K1
       ^^^^^ arc-impossible: The K word is no centre word of the XY plane now in force.
M30
`,
    );
  });

  test('stays silent on a full circle without an end point and on a half turn by radius', () => {
    checkRule(
      arcImpossible,
      {},
      `
G21 G90 G54 G17
G0 X0 Y0
G2 X20 Y0 R10 F500
G2 X20 I-10 J0
G18 G3 X0 Z0 I-10
M30
`,
    );
  });
});
