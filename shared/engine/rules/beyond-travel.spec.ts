import { expect, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { beyondTravel } from './beyond-travel';

const START = 'G21 G90 G17 G54\nT1 M6\nG43 H1';

test('names the axis, the side, how far and where to move zero', () => {
  const [finding] = checkRule(
    beyondTravel,
    {},
    `
${START}
G0 X1304.2 Y10
   ^^^^^^^ beyond-travel: Drives X 34.2 mm (1.346 in) past the right-hand travel (1300 mm).
M30
`,
  );
  expect(finding?.advice).toBe(
    'Move work zero at least 34.2 mm (1.346 in) left, if the work-zero window of this report allows it.',
  );
  expect(finding?.data).toEqual({
    axis: 'x',
    side: 'high',
    by: 34.2,
    at: 1334.2,
    limit: 1300,
    moved: 'program',
  });
});

test('flags each side of each axis', () => {
  checkRule(
    beyondTravel,
    {},
    `
${START}
G0 X-31
   ^^^^ beyond-travel: Drives X 1 mm (0.0394 in) past the left-hand travel (0 mm).
G0 X0 Y-40.5
      ^^^^^^ beyond-travel: Drives Y 0.5 mm (0.0197 in) past the front travel (0 mm).
G0 Y2611
   ^^^^^ beyond-travel: Drives Y 1 mm (0.0394 in) past the back travel (2650 mm).
G0 Y0 Z88
      ^^^ beyond-travel: Drives Z 1 mm (0.0394 in) past the upper travel (0 mm).
G0 Z-134
   ^^^^^ beyond-travel: Drives Z 1 mm (0.0394 in) past the lower travel (-220 mm).
M30
`,
  );
});

test('allows exactly the limit and the last digit of a converted inch', () => {
  checkRule(beyondTravel, {}, `\n${START}\nG0 X1270 Y2610 Z87\nG0 X1270.001\nM30\n`);
  // 50 in from zero is 1270 mm exactly, one inch being 25.4 mm by definition.
  checkRule(beyondTravel, {}, `\nG20 G90 G17 G54\nT1 M6\nG43 H1\nG0 X50.\nM30\n`);
});

test('flags what an arc bulges past its ends', () => {
  checkRule(
    beyondTravel,
    {},
    `
${START}
S18000 M3
G0 X1265 Y100
G1 Z-1 F1000
G3 X1265 Y120 I0 J10
   ^^^^^ beyond-travel: Drives X 5 mm (0.197 in) past the right-hand travel (1300 mm).
M30
`,
  );
});

test('flags a machine coordinate past the end, with advice that fits it', () => {
  const [finding] = checkRule(
    beyondTravel,
    {},
    `
G21 G90
G53 G0 Z5
       ^^ beyond-travel: Drives Z 5 mm (0.197 in) past the upper travel (0 mm).
M30
`,
  );
  expect(finding?.advice).toContain('machine coordinate');
});

test('does not count the move that comes back', () => {
  const [finding] = checkRule(
    beyondTravel,
    {},
    `
${START}
G0 X1290
   ^^^^^ beyond-travel
G0 X100
G0 X1280
M30
`,
  );
  expect(finding).toMatchObject({ count: 2, line: 4, endLine: 6, worstLine: 4 });
});

test('allows the retracts, homes and parks of a posted program', () => {
  checkRule(
    beyondTravel,
    {},
    `
G21 G90 G17 G40 G49 G80 G54
G53 G0 Z0
T1 M6
G43 H1 Z50
G0 X0 Y0
G28 G91 Z0
G90
G53 G0 X0 Y2650 Z0
M30
`,
  );
});

test('does not judge an axis whose work offset has no value yet', () => {
  checkRule(
    beyondTravel,
    { offsets: { work: { G54: { x: 30, y: 40, z: undefined } } } },
    `
${START}
G0 Z15
G0 X1290
   ^^^^^ beyond-travel
M30
`,
  );
});

test('flags a rotary axis turned past its travel', () => {
  checkRule(
    beyondTravel,
    { machine: { travel: { a: [-90, 90] } } },
    `
G21 G90 G54
G0 A45
G0 A100
   ^^^^ beyond-travel: Turns A 10 degrees past the upper end of its travel (90 degrees).
M30
`,
  );
});

test('judges the path of the cutter under compensation, not the programmed one', () => {
  // The sheet's right-hand edge is 2 mm inside the travel, and the cutter of 3 mm radius runs outside it.
  checkRule(
    beyondTravel,
    {},
    `
${START.replace('T1', 'T2').replace('H1', 'H2')}
G0 X1240 Y-30
G42 D2 G1 X1240 Y0 F3000
X1268
Y500
^^^^ beyond-travel: Drives X 1 mm (0.0394 in) past the right-hand travel (1300 mm).
G40 G0 X1200
M30
`,
  );
  checkRule(
    beyondTravel,
    {},
    `
${START.replace('T1', 'T2').replace('H1', 'H2')}
G0 X1240 Y-30
G1 X1240 Y0 F3000
X1268
Y500
M30
`,
  );
});
