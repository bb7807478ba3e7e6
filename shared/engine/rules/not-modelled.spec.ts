import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { notModelled } from './not-modelled';

test('flags a code nobody told it about', () => {
  checkRule(
    notModelled,
    {},
    `
M250
^^^^ not-modelled: M250 is not modelled by this check.
M30
`,
  );
});

test('flags what depends on a parameter that nobody states', () => {
  checkRule(
    notModelled,
    {},
    `
G0 X[#100+2]
   ^^^^^^^^^ not-modelled: X[#100+2] depends on #100, which is not known before the run.
M30
`,
  );
});

test('flags a rounded corner and goes to its end point', () => {
  checkRule(
    notModelled,
    {},
    `
G0 X10,R2
      ^^^ not-modelled: ,R2 rounds or breaks the corner there, which this check does not follow.
M30
`,
  );
});

test('allows values that are worked out', () => {
  checkRule(
    notModelled,
    {},
    `
#1=5
#<depth>=[#1/2]
G0 X[1+2] Y#1 Z[0-#<depth>]
M30
`,
  );
});

test('flags flow words that have no place in the published language', () => {
  checkRule(
    notModelled,
    { controller: { switches: { strict: true } } },
    `
o100 sub
^^^^^^^^ not-modelled: o100 sub steers the order of the blocks, which this check does not follow.
M30
`,
  );
});

test('flags a modal call, which is not followed', () => {
  checkRule(
    notModelled,
    {},
    `
G66 P100 A1
^^^ not-modelled: G66 calls another program, which this check does not follow.
M30
`,
  );
});

test('allows what an ordinary post writes', () => {
  checkRule(
    notModelled,
    {},
    `
O1001 (DOOR)
G21 G17 G90 G94 G54 G40 G49 G80
T1 M6
S18000 M3
M8
G0 X0 Y0
G43 H1 Z5
G1 Z1 F1000
G2 X10 Y10 I10 J0
G98 G81 X5 Y5 Z-5 R2
G80
M9
G53 G0 Z0
G91 G28 X0
G90
M1
M30
`,
  );
});
