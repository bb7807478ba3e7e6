import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { preselectLeftOver } from './preselect-left-over';

test('flags another tool left chosen at the end', () => {
  checkRule(
    preselectLeftOver,
    {},
    `
T1 M6
T2
^^ preselect-left-over (hold): The program ends with T2 chosen and not fetched.
G1 X10 F1000
M30
`,
  );
});

test('notes the first tool chosen again for the next part', () => {
  checkRule(
    preselectLeftOver,
    {},
    `
T1 M6
T2
G1 X10 F1000
M6
T1
^^ preselect-left-over (note): The program ends with T1, its first tool, chosen and not fetched.
G1 X20
M30
`,
  );
});

test('allows every choice fetched, T0 and the held tool at the end', () => {
  checkRule(
    preselectLeftOver,
    {},
    `
T1 M6
T2
G1 X10 F1000
M6
T2
T0
M30
`,
  );
});
