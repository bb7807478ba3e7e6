import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { missingWord } from './missing-word';

test('flags a dwell without its time', () => {
  checkRule(
    missingWord,
    {},
    `
G4
^^ missing-word: G4 needs a P word, and the block has none.
M30
`,
  );
});

test('flags a length offset without its number', () => {
  checkRule(
    missingWord,
    {},
    `
G43 Z10
^^^ missing-word: G43 needs an H word, and the block has none.
M30
`,
  );
});

test('flags axis words with no motion code in force', () => {
  checkRule(
    missingWord,
    {},
    `
G21 G90
X10 Y10
^^^^^^^ missing-word: Axis words stand here, but no motion code is in force.
M30
`,
  );
});

test('allows modal motion with the code on an earlier line', () => {
  checkRule(
    missingWord,
    {},
    `
G0 X10
Y10
G1 F500
Z-1
M30
`,
  );
});
