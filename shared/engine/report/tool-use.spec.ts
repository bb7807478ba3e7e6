import { expect, test } from 'vitest';
import { runProgram } from '../testing/check-rule';

const use = (program: string, change: object = {}) =>
  runProgram(`${program}\nM30`, change, []).tools;

test('lists tools in the order of first use, with what they cut', () => {
  const found = use(`G21 G90 G54
T4 M6
S18000 M3
G43 H4
G0 X0 Y0 Z5
G1 Z-18.2 F1000
G1 X100
G0 Z5
T1 M6
S18000 M3
G43 H1
G0 X0 Y0 Z5
G1 Z-1 F1000
T4 M6`);
  expect(found).toMatchObject([
    { number: 4, pocket: 4, firstLine: 2, changes: 2, cutLength: 123.2, lowest: -18.2 },
    { number: 1, pocket: 1, firstLine: 9, changes: 1, cutLength: 6, lowest: -1 },
  ]);
  // 23.2 mm and 100 mm at 1000 mm/min are 1.39 s and 6 s; the ramps add 0.02 s or less each.
  expect(found[0]?.cutSeconds).toBe(7.4);
});

test('counts a tool found in the spindle from its first motion, and no change to itself', () => {
  const found = use('G21 G90 G54\nG0 X10\nT3 M6', { loading: { inSpindle: 3 } });
  expect(found).toMatchObject([{ number: 3, pocket: 3, firstLine: 2, changes: 0 }]);
});

test('knows no depth for a tool that does not move, and no pocket for one that has none', () => {
  expect(use('T44 M6')).toEqual([
    {
      number: 44,
      pocket: null,
      firstLine: 1,
      changes: 1,
      cutSeconds: 0,
      cutLength: 0,
      lowest: null,
    },
  ]);
});

test('air moves at feed with the spindle off are no cut', () => {
  expect(use('G21 G90 G54\nT1 M6\nG1 X100 F1000')).toMatchObject([{ cutLength: 0, cutSeconds: 0 }]);
});
