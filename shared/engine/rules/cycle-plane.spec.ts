import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { cyclePlane } from './cycle-plane';

test('flags a clearance plane under the depth', () => {
  checkRule(
    cyclePlane,
    {},
    `
G21 G90 G54 G17
G0 Z10
G81 X10 Y10 Z2 R-5 F500
               ^^^ cycle-plane: G81 has its clearance plane at -5 mm (-0.197 in), 7 mm (0.276 in) under its depth of 2 mm (0.0787 in).
G80
M30
`,
  );
});

test('allows a clearance plane above it, in absolute and in incremental coordinates', () => {
  checkRule(
    cyclePlane,
    {},
    `
G21 G90 G54 G17
G0 Z10
G81 X10 Y10 Z-5 R2 F500
G80
G91 G81 X10 Z-7 R-3
G80
G90
M30
`,
  );
});
