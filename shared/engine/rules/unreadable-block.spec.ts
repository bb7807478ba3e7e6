import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { unreadableBlock } from './unreadable-block';

test('flags a letter without a number', () => {
  checkRule(
    unreadableBlock,
    {},
    `
G21 G90
G0 X10 Y
       ^ unreadable-block: The letter Y stands without a number.
M30
`,
  );
});

test('flags a comment that is not closed on its line', () => {
  checkRule(
    unreadableBlock,
    {},
    `
G0 X10 (POCKET
       ^^^^^^^ unreadable-block: A comment is opened with “(” and not closed on its line.
M30
`,
  );
});

test('flags an exponent and a second decimal point', () => {
  checkRule(
    unreadableBlock,
    {},
    `
G0 X1E3
   ^^^^ unreadable-block
G0 X1.5.2
   ^^^^^^ unreadable-block
M30
`,
  );
});

test('flags a merge left in the file', () => {
  checkRule(
    unreadableBlock,
    {},
    `
<<<<<<< HEAD
        ^^^^ unreadable-block
M30
`,
  );
});

test('flags block delete inside a block', () => {
  checkRule(
    unreadableBlock,
    {},
    `
G0 /X10
   ^ unreadable-block: A “/” stands inside the block; block delete is only read at its beginning.
M30
`,
  );
});

test('allows spacing, lower case, signs, leading and trailing points, and comments of any kind', () => {
  checkRule(
    unreadableBlock,
    {},
    `
%
N10g0x+10.y-.5
 N20 G1 X 10. F 500 ; a comment (with brackets)
(A "QUOTED" REMARK, 1/2" BIT)
/ N30 M8
: G90

M30
%
`,
  );
});
