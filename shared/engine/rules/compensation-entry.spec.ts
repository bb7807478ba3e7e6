import { expect, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { compensationEntry } from './compensation-entry';

test('flags a lead-in no longer than the compensation', () => {
  checkRule(
    compensationEntry,
    {},
    `
G21 G90 G54 G17
T2 M6
G0 X0 Y0
G41 D2
G1 X3 F1000
   ^^ compensation-entry: The move that switches compensation on is 3 mm (0.118 in) long, no longer than the compensation of 3 mm (0.118 in).
X50
G40
M30
`,
  );
});

test('flags compensation switched on and off on an arc', () => {
  checkRule(
    compensationEntry,
    {},
    `
G21 G90 G54 G17
T2 M6
G0 X0 Y0
G42 D2
G2 X20 Y20 I20 J0 F1000
   ^^^^^^^^^^^^^^ compensation-entry: Cutter compensation is switched on on an arc.
G1 X50
G40
G3 X70 Y40 I0 J20
   ^^^^^^^^^^^^^^ compensation-entry: Cutter compensation is switched off on an arc.
M30
`,
  );
});

test('flags an inside arc that the cutter does not fit, and not the same arc on its outside', () => {
  checkRule(
    compensationEntry,
    {},
    `
G21 G90 G54 G17
T2 M6
G0 X0 Y0
G41 D2
G1 X20 F1000
G3 X24 Y0 I2 J0
   ^^^^^^^^^^^^ compensation-entry: An inside arc of radius 2 mm (0.0787 in) is no wider than the compensation of 3 mm (0.118 in).
G1 X50
G2 X54 Y0 I2 J0
G1 X80
G40 X90
M30
`,
  );
});

test('flags compensation outside the XY plane', () => {
  checkRule(
    compensationEntry,
    {},
    `
G21 G90 G54 G18
T2 M6
G41 D2
^^^ compensation-entry: Cutter compensation is switched on outside the XY plane.
M30
`,
  );
});

test('allows a straight lead-in longer than it, Z moves between, and a straight lead-out', () => {
  checkRule(
    compensationEntry,
    {},
    `
G21 G90 G54 G17
T2 M6
G0 X0 Y0
G41 D2
G1 Z-1 F500
G1 X10 F1000
G3 X30 Y20 I0 J20
G40 G1 X40
M30
`,
  );
});

test('flags a lead-out at feed that comes back over the edge, and counts it with a short lead-in', () => {
  const [finding] = checkRule(
    compensationEntry,
    {},
    `
G21 G90 G54 G17
T2 M6
G0 X0 Y0
G41 D2
G1 X3 F1000
   ^^ compensation-entry
X50
G40 X52
M30
`,
  );
  expect(finding?.count).toBe(2);
  checkRule(
    compensationEntry,
    {},
    `
G21 G90 G54 G17
T2 M6
G0 X0 Y0
G41 D2 G1 X20 F1000
X50
G40 G1 X52
       ^^^ compensation-entry: The move that ends compensation is 2 mm (0.0787 in) long, no longer than the compensation of 3 mm (0.118 in): the cutter comes back over the edge it has cut.
M30
`,
  );
});

test('flags an inside corner whose moves leave the cutter no room, and not one that does', () => {
  // A right angle uses up one radius, 3 mm, of each of its moves.
  checkRule(
    compensationEntry,
    {},
    `
G21 G90 G54 G17
T2 M6
G0 X0 Y0
G41 D2 G1 X20 F1000
X50
Y2
^^ compensation-entry: An inside corner needs 3 mm (0.118 in) of each of its moves for the compensation of 3 mm (0.118 in), and one of them has 2 mm (0.0787 in).
G40 G0 Z20
M30
`,
  );
  checkRule(
    compensationEntry,
    {},
    `
G21 G90 G54 G17
T2 M6
G0 X0 Y0
G41 D2 G1 X20 F1000
X50
Y6.1
X20
G40 G0 Z20
M30
`,
  );
});

test('two inside corners share what is between them', () => {
  checkRule(
    compensationEntry,
    {},
    `
G21 G90 G54 G17
T2 M6
G0 X0 Y0
G41 D2 G1 X20 F1000
X50
Y5.9
X20
^^^ compensation-entry: An inside corner needs 3 mm (0.118 in) of each of its moves for the compensation of 3 mm (0.118 in), and one of them has 2.9 mm (0.114 in).
G40 G0 Z20
M30
`,
  );
});

test('a strict controller refuses any inside corner', () => {
  checkRule(
    compensationEntry,
    { controller: { switches: { strict: true } } },
    `
G21 G90 G54 G17
T2 M6
G0 X0 Y0
G41 D2 G1 X20 F1000
X50
Y30
^^^ compensation-entry: An inside corner with cutter compensation on, which this controller refuses.
G40 G0 Z20
M30
`,
  );
});

test('flags compensation that no move follows, and work zero moved under it', () => {
  checkRule(
    compensationEntry,
    { offsets: { work: { G55: { x: 50, y: 50, z: -182 } } } },
    `
G21 G90 G54 G17
T2 M6
G0 X0 Y0
G41 D2
G1 Z-1 F500
G40
^^^ compensation-entry: Cutter compensation is switched off before any XY move has followed it.
G41 D2 G1 X20
G55
^^^ compensation-entry: Work zero is moved while cutter compensation is on, which distorts the path.
G40 G0 Z20
M30
`,
  );
});

/**
 * Contours as posts write them (common practice, no source): a straight lead-in and lead-out, an arc that comes
 * tangent to the contour, several depths, restated codes, small moves on a curve. On each kind of controller.
 */
const OUTSIDE = `
G21 G90 G94 G17 G40 G49 G80
G53 G0 Z0
T2 M6
S18000 M3
G54 G0 X30 Y-20
G43 Z20 H2
Z2
G1 Z-4 F1000
G41 D2 G1 X30 Y-10 F3000
G3 X20 Y0 I-10 J0
G1 X0
G2 X-10 Y10 I0 J10
G1 Y50
G2 X0 Y60 R10
G1 X60
Y0
X20
G3 X10 Y-10 I0 J-10
G1 G40 Y-20
G0 Z20
M5
G53 G0 Z0
M30
`;
/** A bore: down a helix on its wall, out to the middle, and once more with a short line behind a lead-out arc. */
const BORE = `
G21 G90 G17 G40
T2 M6
S18000 M3
G54 G0 X50 Y50
G43 Z20 H2
Z1
G41 D2 G1 X58 F2500
G3 I-8 J0 Z-1
G3 I-8 J0 Z-2
G3 I-8 J0
G40 G1 X50
Z2
G41 D2 G1 X58
G3 I-8 J0 Z-2
G3 X50 Y58 I-8 J0
G3 X46 Y54 I0 J-4
G1 G40 X46 Y53
G0 Z20
M30
`;
const POCKET = `
G21 G90 G17 G40
T2 M6
S18000 M3
G54 G0 X50 Y50
G43 Z20 H2
G1 Z-3 F800
G41 D2 X50 Y60 F2500
X20
Y20
G3 X30 Y10 R10
G1 X80
Y60
X50
G40 X50 Y50
Z-6 F800
G41 D2 X50 Y60 F2500
X20
G40
G0 Z20
G0 X55 Y55
M30
`;
const CURVE = [
  'G21 G90 G17 G54',
  'T2 M6',
  'G0 X100 Y50',
  'G41 D2 G1 X80 Y50 F2000',
  // Half round a circle of 30 about (50, 50), from its inside, in steps of a degree.
  ...Array.from({ length: 180 }, (_, degree) => {
    const angle = (degree * Math.PI) / 180;
    return `X${(50 + 30 * Math.cos(angle)).toFixed(3)} Y${(50 + 30 * Math.sin(angle)).toFixed(3)}`;
  }),
  'G40 G0 Z20',
  'M30',
].join('\n');

test.each([
  ['rs274ngc', OUTSIDE],
  ['custom-macro', OUTSIDE],
  ['rs274ngc', POCKET],
  ['custom-macro', POCKET],
  ['rs274ngc', BORE],
  ['custom-macro', BORE],
  ['rs274ngc', CURVE],
  ['custom-macro', CURVE],
])('is silent on ordinary contours, %s', (language, program) => {
  checkRule(compensationEntry, { controller: { language } }, program);
});
