import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { probeInProgram } from './probe-in-program';

describe('probe-in-program', () => {
  test('notes a probing move, and holds it unattended', () => {
    checkRule(
      probeInProgram,
      {},
      `
G21 G90 G54
G38.2 Z-5 F100
^^^^^ probe-in-program (note, unattended hold): The head probes here, and where it ends depends on what it touches.
M30
`,
    );
  });

  test('stays silent on an ordinary feed move down', () => {
    checkRule(probeInProgram, {}, 'G21 G90 G54\nG1 Z-5 F100\nM30\n');
  });
});
