import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { compensationEntry } from './compensation-entry';

test('flags a lead-in shorter than the compensation', () => {
  checkRule(
    compensationEntry,
    {},
    `
G21 G90 G54 G17
T2 M6
G0 X0 Y0
G41 D2
G1 X1 F1000
   ^^ compensation-entry
X50
G40
M30
`,
  );
});

test('allows a straight lead-in longer than it', () => {
  checkRule(
    compensationEntry,
    {},
    `
G21 G90 G54 G17
T2 M6
G0 X0 Y0
G41 D2
G1 X10 F1000
X50
G40 X60
M30
`,
  );
});
