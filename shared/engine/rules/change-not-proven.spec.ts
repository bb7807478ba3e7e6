import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { changeNotProven } from './change-not-proven';

const MACRO = { controller: { toolChange: 'macro' } };

describe('change-not-proven', () => {
  test('holds the first change of a setup that changes tools by macro, and forbids it unattended', () => {
    checkRule(
      changeNotProven,
      { ...MACRO, changeMacro: { name: 'change.ngc', text: 'M2' } },
      `
G21 G90 G54
T1 M6
^^^^^ change-not-proven (hold, unattended stop): The change macro change.ngc was not walked: its motions and waits are not judged.
T2 M6
M30
`,
    );
  });

  test('says so when there is no macro text', () => {
    checkRule(
      changeNotProven,
      MACRO,
      `
G21 G90 G54
T1 M6
^^^^^ change-not-proven: Tools are changed by a macro here, and the setup has no macro text.
M30
`,
    );
  });

  test('stays silent where the controller changes tools by itself, and without a change', () => {
    checkRule(changeNotProven, {}, 'G21 G90 G54\nT1 M6\nM30\n');
    checkRule(changeNotProven, MACRO, 'G21 G90 G54\nG0 Z5\nM30\n');
  });
});
