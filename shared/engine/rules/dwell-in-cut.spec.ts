import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { dwellInCut } from './dwell-in-cut';

const START = 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5';

test('holds a long dwell turning in the stock', () => {
  checkRule(
    dwellInCut,
    {},
    `
${START}
G1 Z-5 F1000
G4 P1.5
^^^^^^^ dwell-in-cut (hold): Dwells 1.5 s with the cutter turning 5 mm (0.197 in) deep in the stock.
M30
`,
  );
});

test('reads the dwell in the controller’s own unit', () => {
  const program = `\n${START}\nG1 Z-5 F1000\nG4 P900\nM30\n`;
  checkRule(dwellInCut, { controller: { dwell: 'milliseconds' } }, program);
});

test('allows a second, dwells above the stock, with the spindle off, of drills and of cycles', () => {
  checkRule(
    dwellInCut,
    {},
    `
${START}
G4 P5
G1 Z-5 F1000
G4 P1
G0 Z5
G82 X60 Y60 Z-5 R2 P2 F300
G80
M5
T3 M6
S6000 M3
G43 H3
G0 X50 Y50 Z5
G1 Z-5
G4 P2
G0 Z5
M5
G4 P6
M30
`,
  );
});
