import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { dustOrVacuumOff } from './dust-or-vacuum-off';

const codes = {
  controller: {
    codes: [
      { code: 'M64', where: { P: 3 }, does: 'extraction-on' },
      { code: 'M65', where: { P: 3 }, does: 'extraction-off' },
      { code: 'M71', does: 'vacuum-on' },
      { code: 'M72', does: 'vacuum-off' },
    ],
  },
};
const START = 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5';

test('flags each that is off at the first cut', () => {
  checkRule(
    dustOrVacuumOff,
    codes,
    `
${START}
M71
G1 Z-5 F1000
   ^^^ dust-or-vacuum-off (note, unattended stop): Cuts while the extraction is off.
M64 P3
G1 X100
M72
G1 X200
   ^^^^ dust-or-vacuum-off (note, unattended stop): Cuts while the vacuum is off.
M30
`,
  );
});

test('allows cuts with both on, moves in air, and machines without such codes', () => {
  checkRule(
    dustOrVacuumOff,
    codes,
    `\n${START}\nG1 Z1 F1000\nM64 P3\nM71\nG1 Z-5\nG0 Z5\nM65 P3\nM72\nM30\n`,
  );
  checkRule(dustOrVacuumOff, {}, `\n${START}\nG1 Z-5 F1000\nM30\n`);
});
