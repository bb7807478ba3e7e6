import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { noSpinUp } from './no-spin-up';

// Spin-up 4 s to 24 000 rev/min, so 3 s to 18 000.
const waitsNot = { machine: { spindle: { waits: false } } };
const START = 'G21 G90 G17 G54\nT1 M6\nG43 H1\nG0 X50 Y50 Z5';

test('notes a cut before the speed is reached, once a program', () => {
  // 5 mm at 600 mm/min from a stand: 0.5 s, and 0.00625 s more for half of the ramp (v/2a at 800 mm/s²).
  checkRule(
    noSpinUp,
    waitsNot,
    `
${START}
S18000 M3
G4 P2.2
G1 Z-5 F600
   ^^^ no-spin-up (note, unattended hold): The tip meets the stock 2.7 s after the spindle was set to 18000 rev/min in line 5; it needs 3 s.
G0 Z5
S24000
G1 Z-5
M30
`,
  );
});

test('counts only the difference at a change of speed', () => {
  const program = (dwell: number) => `
${START}
S18000 M3
G4 P3
G1 Z-5 F600
G1 X60
S21000
G4 P${dwell}
G1 X80
M30
`;
  checkRule(noSpinUp, waitsNot, program(0.5));
  checkRule(
    noSpinUp,
    waitsNot,
    program(0.4).replace('G1 X80', 'G1 X80\n   ^^^ no-spin-up (note, unattended hold)'),
  );
});

test('counts the way to the stock', () => {
  checkRule(
    noSpinUp,
    waitsNot,
    `
G21 G90 G17 G54
T1 M6
S18000 M3
G43 H1
G0 X1100 Y550
G0 Z5
G1 Z-5 F600
M30
`,
  );
});

test('starts afresh after a change that stopped the spindle', () => {
  checkRule(
    noSpinUp,
    waitsNot,
    `
${START}
S18000 M3
G4 P3
G1 Z-5 F600
G0 Z5
T2 M6
S18000 M3
G43 H2
G0 Z5
G1 Z-5
   ^^^ no-spin-up (note, unattended hold)
M30
`,
  );
});

test('allows everything where the spindle holds the program until it is at speed', () => {
  checkRule(noSpinUp, {}, `\n${START}\nS18000 M3\nG1 Z-5 F600\nM30\n`);
});
