import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { rapidInStock } from './rapid-in-stock';

// Stock: X 0 to 1200, Y 0 to 600, 18 mm, Z zero on its top.
const START = 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5';

test('stops a rapid through stock that nothing has cut', () => {
  checkRule(
    rapidInStock,
    {},
    `
${START}
G1 Z-5 F1000
G0 X300
   ^^^^ rapid-in-stock (stop): Moves at rapid through the stock, with the tip 5 mm (0.197 in) under its top.
M30
`,
  );
});

test('holds a rapid back along what this program has cut that deep', () => {
  checkRule(
    rapidInStock,
    {},
    `
${START}
G1 Z-5 F1000
G1 X300
G0 X60
   ^^^ rapid-in-stock (hold): Moves at rapid with the tip 5 mm (0.197 in) under the top of the stock, through space this program has cut but that is not known to be cleared.
M30
`,
  );
});

test('stops where the cut was shallower, or beside', () => {
  checkRule(
    rapidInStock,
    {},
    `
${START}
G1 Z-2 F1000
G1 X300
G1 Z-5
G0 X60
   ^^^ rapid-in-stock (stop)
M30
`,
  );
  checkRule(
    rapidInStock,
    {},
    `
${START}
G1 Z-5 F1000
G1 X300
G1 Y62
G0 X60
   ^^^ rapid-in-stock (stop)
M30
`,
  );
});

test('stops a diagonal dive whose end alone is in the stock', () => {
  checkRule(
    rapidInStock,
    {},
    `
${START}
G0 X100 Y80 Z-1
   ^^^^^^^^^^^^ rapid-in-stock (stop): Moves at rapid through the stock, with the tip 1 mm (0.0394 in) under its top.
M30
`,
  );
});

test('sees the stock through a wrong length offset', () => {
  checkRule(
    rapidInStock,
    {},
    `
G21 G90 G17 G54
T6 M6
S18000 M3
G43 H5
G0 Z20
G0 X50 Y50 Z5
   ^^^^^^^^^^ rapid-in-stock (stop): Moves at rapid through the stock, with the tip 3 mm (0.118 in) under its top.
M30
`,
  );
});

test('allows low clearance planes, retracts, ramps, cycles and ways beside the stock', () => {
  checkRule(
    rapidInStock,
    {},
    `
${START}
G0 Z0.5
G0 X80
G1 X100 Z-6 F1200
G1 X200
G2 X220 Y70 I0 J20
G0 Z0.5
G0 X20 Y20
G0 Z0
G0 X30
G53 G0 Z0
G53 G0 X650 Y0
G28 G91 Z0
G90
M5
T3 M6
S6000 M3
G43 H3
G0 X50 Y50 Z5
G99 G83 X50 Y50 Z-15 R1 Q4 F300
X90 Y50
X130
G80
G0 Z5
G0 X-20 Y-20
G0 Z-10
G0 Y620
G0 Z5
M30
`,
  );
});

test('without a job sheet takes everything under Z zero for stock, and nothing with zero on the board', () => {
  const program = `
${START}
G1 Z-5 F1000
G0 X2000 Y90
M30
`;
  checkRule(
    rapidInStock,
    { job: undefined, machine: { travel: { x: [0, 3000] } } },
    program.replace('M30', '   ^^^^^^^^^ rapid-in-stock (stop)\nM30'),
  );
  checkRule(rapidInStock, { job: { stock: undefined, zeroOn: 'board' } }, program);
});

test('knows the stock of another work offset', () => {
  const change = { offsets: { work: { G55: { x: 630, y: 40, z: -182 } } } };
  checkRule(
    rapidInStock,
    change,
    `
G21 G90 G17 G55
T1 M6
S18000 M3
G43 H1
G0 X700 Y50 Z5
G1 Z-5 F1000
G0 X500
   ^^^^ rapid-in-stock (stop)
M30
`,
  );
});
