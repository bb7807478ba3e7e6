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

test('flags values that cannot be worked out', () => {
  checkRule(
    outOfRangeWord,
    {},
    `
G0 X[1/0]
   ^^^^^^ out-of-range-word: X[1/0] divides by zero.
G0 Y SQRT[-1]
   ^^^^^^^^^^ out-of-range-word: Y SQRT[-1] asks SQRT of a value it does not take.
G0 X[[0-8]**0.5]
   ^^^^^^^^^^^^^ out-of-range-word: X[[0-8]**0.5] raises a negative number to a fraction.
G0 X[TAN[90]]
   ^^^^^^^^^^ out-of-range-word: X[TAN[90]] comes out larger than any controller counts.
#100000=1
^^^^^^^^^ out-of-range-word: “#100000=1” names the parameter #100000, which this controller does not have.
#1.5=2
^^^^^^ out-of-range-word: “#1.5=2” names the parameter #1.5, and a parameter has a whole number.
G0 Z#<depth>
   ^^^^^^^^^ out-of-range-word: Z#<depth> reads #<depth>, which nothing has set before.
M30
`,
  );
});

test('allows the same values where they can be worked out', () => {
  checkRule(
    outOfRangeWord,
    {},
    `
#<depth>=[0-SQRT[4]]
#5399=1
G0 X[1/2] Y SQRT[1] Z#<depth>
M30
`,
  );
});

test('flags turns of an arc that are no whole number from one on', () => {
  checkRule(
    outOfRangeWord,
    {},
    `
G21 G90 G54 G17 F500
G3 I10 P1.5
       ^^^^ out-of-range-word: P1.5 is not a whole number; P has to be one.
G3 I10 P0
       ^^ out-of-range-word: P0 has to be more than zero.
G3 I10 P5000
       ^^^^^ out-of-range-word: P5000 asks for more turns than any arc makes.
G3 I10 P3
M30
`,
  );
});

test('flags a diameter offset the table does not hold, by number or as that of the held tool', () => {
  checkRule(
    outOfRangeWord,
    { controller: { diameterOffsetShift: 50 } },
    `
G21 G90 G54 G17 F500
T2 M6
G41 D99
    ^^^ out-of-range-word: D99 names an offset that the table does not hold.
G1 X50
G40 X90
G41
^^^ out-of-range-word: G41 takes D52, a diameter offset which the table does not hold.
G1 X150
G40 X200
M30
`,
  );
});
