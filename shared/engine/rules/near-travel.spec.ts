import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { nearTravel } from './near-travel';

const START = 'G21 G90 G17 G54\nT1 M6\nG43 H1';

test('notes a program coordinate within a millimetre of the end', () => {
  checkRule(
    nearTravel,
    {},
    `
${START}
G0 X1269.5 Y100
   ^^^^^^^ near-travel (note): Comes within 0.5 mm (0.0197 in) of the right-hand travel of X (1300 mm).
G0 X1268
M30
`,
  );
  checkRule(
    nearTravel,
    {},
    `
${START}
G0 X1270
   ^^^^^ near-travel (note): Comes within 0 mm (0 in) of the right-hand travel of X (1300 mm).
M30
`,
  );
});

test('allows machine coordinates, homes and the start of the program at the end of travel', () => {
  checkRule(
    nearTravel,
    {},
    `
G21 G90 G17 G54
G53 G0 Z0
T1 M6
G43 H1
G0 X100 Y100
G0 Z30
G28 G91 Z0
G90
G53 G0 X0 Y0
M30
`,
  );
});

test('leaves what is past the end to the stop', () => {
  checkRule(nearTravel, {}, `\n${START}\nG0 X1290\nG0 X100\nM30\n`);
});
