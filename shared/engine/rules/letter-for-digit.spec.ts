import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { letterForDigit } from './letter-for-digit';

test('flags the letter O in a change and in a length offset', () => {
  checkRule(
    letterForDigit,
    {},
    `
T1 MO6
   ^^^ letter-for-digit: MO6 holds the letter O where a digit belongs.
G43 HO1 Z5
    ^^^ letter-for-digit
M30
`,
  );
});

test('allows program numbers', () => {
  checkRule(
    letterForDigit,
    {},
    `
O1001
T1 M06
M30
`,
  );
});
