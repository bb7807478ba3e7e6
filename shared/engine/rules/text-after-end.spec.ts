import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { textAfterEnd } from './text-after-end';

test('flags blocks after the end', () => {
  checkRule(
    textAfterEnd,
    {},
    `
M30
G0 X10
^^^^^^ text-after-end: Blocks stand after the end of the program; they are never run.
G0 X20
`,
  );
});

test('allows blank lines, comments and a closing percent mark after it', () => {
  checkRule(
    textAfterEnd,
    {},
    `
%
G0 X10
M30

(END OF FILE)
%
`,
  );
});
