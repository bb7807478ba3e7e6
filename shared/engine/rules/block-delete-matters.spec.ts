import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { blockDeleteMatters } from './block-delete-matters';

test('flags a change that the switch decides', () => {
  checkRule(
    blockDeleteMatters,
    {},
    `
G21 G90 G54
T1 M6
/T2 M6
^ block-delete-matters: With block delete on the program uses other tools.
M30
`,
  );
});

test('flags another depth, and with it other extents', () => {
  checkRule(
    blockDeleteMatters,
    {},
    `
G21 G90 G54
T1 M6
G43 H1 G0 Z5
S18000 M3
G1 Z-1 F500
/G1 Z-4
^ block-delete-matters: With block delete on the program reaches another depth and reaches other extents.
M30
`,
  );
});

test('allows a switched line that changes no motion', () => {
  checkRule(
    blockDeleteMatters,
    {},
    `
G21 G90 G54
T1 M6
/M8
/N40 M1
M30
`,
  );
});
