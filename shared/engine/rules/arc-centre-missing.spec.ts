import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { arcCentreMissing } from './arc-centre-missing';

describe('arc-centre-missing', () => {
  test('flags a bare coordinate while an arc is in force', () => {
    checkRule(
      arcCentreMissing,
      {},
      `
G21 G90 G54 G17
G0 X10 Y0
G3 X0 Y10 I-10 J0 F500
X-10 Y0
^^^^^^^ arc-centre-missing: An arc is in force here, but the block gives neither a radius nor a centre.
M30
`,
    );
  });

  test('stays silent on modal arcs that each bring their own centre', () => {
    checkRule(
      arcCentreMissing,
      {},
      `
G21 G90 G54 G17
G0 X10 Y0
G3 X0 Y10 I-10 J0 F500
X-10 Y0 J-10
X10 R10
M30
`,
    );
  });
});

test('flags one centre word where centres count from program zero', () => {
  checkRule(
    arcCentreMissing,
    {},
    `
G21 G90 G54 G17 F500
G90.1 G0 X10 Y0
G3 X0 Y10 I0
^^^^^^^^^^^^ arc-centre-missing: Arc centres count from program zero here (G90.1), and the block gives one of the two centre words.
G0 X10 Y0
G3 X0 Y10 I0 J0
G91.1 G3 X-10 Y0 J-10
M30
`,
  );
});
