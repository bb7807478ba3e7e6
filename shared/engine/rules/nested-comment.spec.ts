import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { nestedComment } from './nested-comment';

test('flags a bracket inside a comment', () => {
  checkRule(
    nestedComment,
    {},
    `
(POCKET (ROUGH) PASS)
        ^ nested-comment: A “(” stands inside a comment, which for many controllers ends at the first “)”.
M30
`,
  );
});

test('allows two comments on a line and brackets behind a semicolon', () => {
  checkRule(
    nestedComment,
    {},
    `
(ONE) G0 X10 (TWO)
; POCKET (ROUGH) PASS
M30
`,
  );
});
