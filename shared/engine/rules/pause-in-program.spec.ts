import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { pauseInProgram } from './pause-in-program';

describe('pause-in-program', () => {
  test('notes a stop, and forbids it unattended; an optional stop is held', () => {
    checkRule(
      pauseInProgram,
      {},
      `
G21 G90 G54
M0
^^ pause-in-program (note, unattended stop): M0 stops here until someone presses cycle start.
M1
^^ pause-in-program (note, unattended hold): M1 stops here when the optional stop switch is on.
M30
`,
    );
  });

  test('notes the stop with a message of a macro dialect', () => {
    checkRule(
      pauseInProgram,
      { controller: { language: 'custom-macro' } },
      `
G21 G90 G54
#3006=1 (TURN THE PART)
^^^^^^^ pause-in-program (note, unattended stop): “#3006” stops here until someone presses cycle start.
M30
`,
    );
  });

  test('only notes it where the shop allows pauses in unattended runs', () => {
    checkRule(
      pauseInProgram,
      { policy: { unattended: { allowPauses: true } } },
      `
G21 G90 G54
M0
^^ pause-in-program (note)
M30
`,
    );
  });

  test('stays silent on a dwell and on the word M0 in a comment', () => {
    checkRule(pauseInProgram, {}, 'G21 G90 G54\nG4 P2\n(M0 WAS HERE)\nM30\n');
  });
});
