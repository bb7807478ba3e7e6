import { expect, test } from 'vitest';
import { runProgram } from '../testing/check-rule';
import { changedTools } from '../testing/test-shop';

const windows = (program: string, change: object = {}) =>
  runProgram(`${program}\nM30`, change, []).workZeroWindow;

// Source: the trade's formula W between A_min − min p and A_max − max p, worked by hand.
test('X travel 0 to 1250 and a program from -6.35 to 1212.85 leave 6.35 to 37.15', () => {
  const travel = { machine: { travel: { x: [0, 1250] } } };
  expect(windows('G21 G90 G54\nG0 X-6.35\nG0 X1212.85', travel)['G54']).toEqual({
    x: [6.35, 37.15],
    y: null,
    z: null,
  });
});

test('Z meets every tool at once: lengths 90, 130 and 185 leave -270.8 to -210', () => {
  const change = {
    machine: { travel: { z: [-200, 0] } },
    tools: changedTools({
      1: { gaugeLength: 90 },
      2: { gaugeLength: 130 },
      3: { gaugeLength: 185 },
    }),
    offsets: { length: { 1: 90, 2: 130, 3: 185 } },
  };
  const two = 'G21 G90 G54\nT1 M6\nG43 H1\nG0 Z25\nG1 Z-19.2 F500\nT2 M6\nG43 H2\nG0 Z25\nG1 Z-12';
  expect(windows(two, change)['G54']?.z).toEqual([-270.8, -155]);
  const three = `${two}\nT3 M6\nG43 H3\nG0 Z25\nG1 Z-30`;
  expect(windows(three, change)['G54']?.z).toEqual([-270.8, -210]);
});

test('arcs count by what they bulge, each work offset for itself', () => {
  const found = windows(
    'G21 G90 G17\nG54 G0 X100 Y100\nG55 G0 X0 Y0\nG1 X10 F500\nG3 X10 Y20 I0 J10',
    { offsets: { work: { G55: { x: 300, y: 300, z: -182 } } } },
  );
  expect(Object.keys(found)).toEqual(['G54', 'G55']);
  // The half circle about (10, 10) bulges to X 20; travel X 0 to 1300.
  expect(found['G55']?.x).toEqual([0, 1280]);
});

test('machine coordinates, homes and where the head waits are none of the offset’s business', () => {
  expect(windows('G21 G90 G54\nG53 G0 Z0\nG53 G0 X1300 Y2650\nG28 G91 Z0\nG90')).toEqual({});
  const found = windows('G21 G90 G54\nG53 G0 X1300 Z0\nG0 Y10\nG91\nG0 X-20\nG90\nG0 X50');
  expect(found['G54']).toEqual({ x: [-50, 1250], y: [-10, 2640], z: null });
});

test('says what an offset without a value may be', () => {
  const unset = { offsets: { work: { G54: { x: 30, y: 40, z: undefined } } } };
  const found = windows('G21 G90 G54\nT1 M6\nG43 H1\nG0 Z20\nG1 Z-18 F500', unset);
  // T1 is 95 long: from -220 + 18 - 95 to 0 - 20 - 95.
  expect(found['G54']?.z).toEqual([-297, -115]);
});

test('a program that fits nowhere leaves an empty window', () => {
  const found = windows('G21 G90 G54\nG0 X-10\nG0 X1400')['G54']?.x;
  expect(found).toEqual([10, -100]);
});
