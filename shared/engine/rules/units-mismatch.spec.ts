import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { unitsMismatch } from './units-mismatch';

test('flags a program that fits the machine only in the other unit, at its unit word', () => {
  checkRule(
    unitsMismatch,
    {},
    `
G20 G90 G54
^^^ units-mismatch: Read in inches the program spans 30480 mm (1200 in) in X, more than the machine’s travel of 1300 mm (51.181 in); read in millimetres it fits.
G0 X0 Y0
G0 X1200 Y600
M30
`,
  );
});

test('flags a tool list that fits ours only in the other unit', () => {
  checkRule(
    unitsMismatch,
    {},
    `
(T2 D=6. CR=0. - ZMIN=-3 - FLAT END MILL)
 ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ units-mismatch: The comment gives T2 (6 mm end mill) a diameter of 6, which fits the tool list (6 mm (0.236 in)) only if the program is in millimetres; it says inches.
G20 G90 G54
G0 X1 Y1
M30
`,
  );
});

test('allows an inch program with its list in inches above the unit word, and sizes with a unit of their own', () => {
  checkRule(
    unitsMismatch,
    {},
    `
(T2 D=0.2362 CR=0. - ZMIN=-0.1 - FLAT END MILL)
(T4 6MM COMPRESSION)
G20 G90 G54
G0 X1 Y1
G0 X45 Y22
M30
`,
  );
});

test('allows a small job on a large sheet and a program a little too large', () => {
  checkRule(
    unitsMismatch,
    {},
    `
G21 G90 G54
G0 X0 Y0
G0 X48 Y24
G0 X1400
M30
`,
  );
});
