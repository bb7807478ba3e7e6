import { test } from 'vitest';
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
