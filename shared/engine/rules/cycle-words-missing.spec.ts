import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { cycleWordsMissing } from './cycle-words-missing';

test('flags a cycle without R, and one without its depth and its peck', () => {
  checkRule(
    cycleWordsMissing,
    {},
    `
G21 G90 G54 G17
G0 Z10
G81 X10 Y10 Z-5 F500
^^^ cycle-words-missing: G81 starts without its R word.
G80
G83 X20 R2
^^^ cycle-words-missing: G83 starts without its words Z and Q.
G80
M30
`,
  );
});

test('allows words kept from the first block, and a cycle started again with all of them', () => {
  checkRule(
    cycleWordsMissing,
    {},
    `
G21 G90 G54 G17
G0 Z10
G99 G81 X10 Y10 Z-5 R2 F500
X20
Y20 Z-6
G98 X30
G80
G83 X10 Y10 Z-5 R2 Q1
G80
M30
`,
  );
});
