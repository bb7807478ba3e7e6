import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { subprogramMissing } from './subprogram-missing';

/** Where subprograms are looked for: facts sheet 12.1.5, 12.1.8, 12.1.9. */
const MACRO = { controller: { language: 'custom-macro' } };

test('finds a call of a program that is nowhere', () => {
  checkRule(
    subprogramMissing,
    {},
    `
G21 G90 G54
M98 P1000 L2
^^^^^^^^^ subprogram-missing: The subprogram O1000 is neither in this file nor given with the controller description.
o<fetch> call [1]
^^^^^^^^^^^^^^^^^ subprogram-missing: The subprogram o<fetch> is neither in this file nor given with the controller description.
M97 P250
^^^^^^^^ subprogram-missing: The call leads to N250, and no block of this program has that number.
M30
O100
N250 G0 Z5
M99
`,
  );
});

test('finds a jump and a return to a line that is nowhere', () => {
  checkRule(
    subprogramMissing,
    MACRO,
    `
G21 G90 G54
GOTO 20
^^^^^^^ subprogram-missing: The jump leads to N20, and no block of this program has that number.
M98 P5
M30
O5
N20 G0 Z5
M99 P30
    ^^^ subprogram-missing: The return leads to N30, and no block of the program it returns to has that number.
`,
  );
});

test('stays silent where it is in the file, or given with the setup', () => {
  const given = { subprograms: [{ name: 'O200', text: 'G0 Z6\nM99' }] };
  checkRule(subprogramMissing, given, 'M98 P100\nM98 P200\nM30\nO0100\nG0 Z5\nM99\n');
  checkRule(subprogramMissing, {}, 'o<lift> sub\nG0 Z5\no<lift> endsub\no<lift> call\nM2\n');
});
