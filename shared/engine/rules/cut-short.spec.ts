import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { cutShort } from './cut-short';

test('flags a last line that stops inside a word', () => {
  checkRule(
    cutShort,
    {},
    `
G21 G90
G0 X10 Y
       ^ cut-short: The last line stops in the middle of a word.`,
  );
});

test('flags an opening percent mark with neither end code nor closing one', () => {
  checkRule(
    cutShort,
    {},
    `
%
G21 G90
G0 X10
| cut-short: The file opens with % but has neither an end code nor a closing %.
`,
  );
});

test('allows a missing last line end and a missing percent mark after the end code', () => {
  checkRule(
    cutShort,
    {},
    `
%
G0 X10
M30`,
  );
});
