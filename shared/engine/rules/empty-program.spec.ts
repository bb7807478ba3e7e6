import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { emptyProgram } from './empty-program';

test('flags a file of comments alone, on its last written line', () => {
  checkRule(
    emptyProgram,
    {},
    `
%
(NOTHING HERE)
%
| empty-program: The program holds no block at all.
`,
  );
});

test('flags an empty file on line 1', () => {
  checkRule(
    emptyProgram,
    {},
    `
| empty-program
`,
  );
});

test('allows a program of one block', () => {
  checkRule(
    emptyProgram,
    {},
    `
M30
`,
  );
});
