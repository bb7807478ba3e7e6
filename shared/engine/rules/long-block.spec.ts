import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { longBlock } from './long-block';

test('flags a line longer than the controller reads', () => {
  checkRule(
    longBlock,
    { controller: { longestBlock: 20 } },
    `
G0 X10 Y10 (A LONG REMARK)
| long-block: The line is 26 characters long; the controller takes 20.
M30
`,
  );
});

test('allows a line of exactly that length, its line end not counted', () => {
  checkRule(
    longBlock,
    { controller: { longestBlock: 20 } },
    `
G0 X10.0000 Y10.0000
M30
`,
  );
});
