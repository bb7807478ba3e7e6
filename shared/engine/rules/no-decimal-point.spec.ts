import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { noDecimalPoint } from './no-decimal-point';

test('flags a length without a point where least increments are counted', () => {
  checkRule(
    noDecimalPoint,
    { controller: { numbers: 'least-increment' } },
    `
G0 X10
   ^^^ no-decimal-point
M30
`,
  );
});

test('allows points, counts, codes and tool numbers there', () => {
  checkRule(
    noDecimalPoint,
    { controller: { numbers: 'least-increment' } },
    `
G54 T1 M6
G43 H1 Z5.
G0 X10. Y-5. Z0
S18000 M3
G4 P1.
M30
`,
  );
});

test('allows it where numbers are decimal', () => {
  checkRule(
    noDecimalPoint,
    {},
    `
G0 X10
M30
`,
  );
});
