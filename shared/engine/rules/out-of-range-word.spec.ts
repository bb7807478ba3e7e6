import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { outOfRangeWord } from './out-of-range-word';

test('flags a tool number that is not whole', () => {
  checkRule(
    outOfRangeWord,
    {},
    `
T1.5 M6
^^^^ out-of-range-word: T1.5 is not a whole number; T has to be one.
M30
`,
  );
});

test('flags a negative feed and a negative speed', () => {
  checkRule(
    outOfRangeWord,
    {},
    `
G1 X10 F-500
       ^^^^^ out-of-range-word: F-500 is negative; F has to be zero or more.
M3 S-18000
   ^^^^^^^ out-of-range-word: S-18000 is negative; S has to be zero or more.
M30
`,
  );
});

test('flags a code finer than one decimal', () => {
  checkRule(
    outOfRangeWord,
    {},
    `
G54.25
^^^^^^ out-of-range-word
M30
`,
  );
});

test('allows a whole number written with a point', () => {
  checkRule(
    outOfRangeWord,
    {},
    `
T1. M6
S18000. M3
M30
`,
  );
});
