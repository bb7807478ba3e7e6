import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { changeWithoutTool } from './change-without-tool';

test('flags M6 before any T', () => {
  checkRule(
    changeWithoutTool,
    {},
    `
M6
^^ change-without-tool: M6 changes the tool, but the program has not chosen one.
M30
`,
  );
});

test('allows T on an earlier line, and M6 again with the same choice', () => {
  checkRule(
    changeWithoutTool,
    {},
    `
T1
M6
T2 M6
M6
M30
`,
  );
});
