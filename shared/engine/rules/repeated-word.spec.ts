import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { repeatedWord } from './repeated-word';

test('flags the second word of a letter', () => {
  checkRule(
    repeatedWord,
    {},
    `
G0 X10 X20
       ^^^ repeated-word: The letter X stands more than once in this block (X20).
M30
`,
  );
});

test('allows several G and M words', () => {
  checkRule(
    repeatedWord,
    {},
    `
G0 G90 G54 X10
M3 M8 S18000
M30
`,
  );
});
