import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { missingEnd } from './missing-end';

test('flags the absence of every end code on the last written line', () => {
  checkRule(
    missingEnd,
    {},
    `
G21 G90
G0 X10
| missing-end: The program ends without M2, M30 or M99.
`,
  );
});

test('allows M2, M30 and M99 before a closing percent mark', () => {
  checkRule(
    missingEnd,
    {},
    `
%
G0 X10
M2
%
`,
  );
});
