import { describe, expect, test } from 'vitest';
import { runProgram } from '../testing/check-rule';

/** Rapids 20 m/min and 1000 mm/s² on every axis, so that the handbook's own figures come out. */
const even = {
  machine: {
    rapid: { x: 20000, y: 20000, z: 10000 },
    maxFeed: { x: 15000, y: 15000, z: 6000 },
    acceleration: { x: 1000, y: 1000, z: 800 },
    travel: { x: [0, 3000], y: [0, 3000] },
    spindle: { waits: false },
  },
  offsets: { work: { G54: { x: 0, y: 0, z: -182 } } },
};
const seconds = (program: string, change: object = even) =>
  runProgram(`${program}\nM30`, change, []).seconds;

// Source: uniform acceleration (any handbook of mechanics): d/v + v/a, or 2 sqrt(d/a) when too short.
describe('rapids', () => {
  test('1500 mm at 20 m/min and 1000 mm/s²: 4.5 + 0.33 s', () => {
    expect(seconds('G21 G90 G54\nG0 X1500')).toMatchObject({ rapid: 4.8, total: 4.8, cutting: 0 });
  });
  test('ten of 50 mm: ten times 0.447 s', () => {
    const program = Array.from({ length: 10 }, (_, at) => `G0 X${(at + 1) * 50}`).join('\n');
    expect(seconds(`G21 G90 G54\n${program}`).rapid).toBe(4.5);
  });
  test('200 mm in Z at 10 m/min and 800 mm/s²: 1.2 + 0.21 s', () => {
    expect(seconds('G21 G90 G54\nG53 G0 Z-200').rapid).toBe(1.4);
  });
  test('along a slope the first axis to reach its limit decides', () => {
    // 300 and 400 make 500 mm; Y's share is 0.8, so 25 m/min and 1250 mm/s²: 1.2 + 0.3333 s.
    expect(seconds('G21 G90 G54\nG0 X300 Y400').rapid).toBe(1.5);
  });
  test('independent axes last as long as the slowest', () => {
    const independent = { ...even, controller: { rapids: 'independent' } };
    // Y: 400 mm take 1.2 + 0.3333 s, X: 300 mm 0.9 + 0.3333 s.
    expect(seconds('G21 G90 G54\nG0 X300 Y400', independent).rapid).toBe(1.5);
    expect(seconds('G21 G90 G54\nG0 X300 Y300', independent).rapid).toBe(1.2);
  });
});

describe('feeds', () => {
  const steps = (size: number) =>
    Array.from({ length: 100 }, (_, at) => `G1 X${((at + 1) * size).toFixed(3)}`).join('\n');
  test('exact stop: a hundred steps of 10 mm at 9 m/min take 0.2 s each', () => {
    expect(seconds(`G21 G90 G54\nG61\nS18000 M3\nF9000\n${steps(10)}`).cutting).toBe(20);
  });
  test('exact stop: a hundred steps of 1 mm take 0.0632 s each', () => {
    expect(seconds(`G21 G90 G54\nG61\nS18000 M3\nF9000\n${steps(1)}`).cutting).toBe(6.3);
  });
  test('blended straight on: one ramp up and one down for all of them', () => {
    // 1000 mm at 150 mm/s are 6.6667 s, and 0.15 s for the two ramps.
    expect(seconds(`G21 G90 G54\nG64\nS18000 M3\nF9000\n${steps(10)}`).cutting).toBe(6.8);
  });
  test('blended round a right angle: each side from rest to rest', () => {
    const square = 'G1 X100 F9000\nG1 Y100\nG1 X0\nG1 Y0';
    // 100 mm: 0.6667 + 0.15 s, four times 0.8167 s.
    expect(seconds(`G21 G90 G54\nG64\nS18000 M3\n${square}`).cutting).toBe(3.3);
  });
  test('blended from a line into an arc that begins its way: no slowing down', () => {
    // 200 mm of line, half a turn of radius 50 (157.08 mm) and 200 mm back: 557.08 mm at 50 mm/s, + 0.05 s.
    const turn = 'G1 X200 F3000\nG3 X200 Y100 I0 J50\nG1 X0';
    expect(seconds(`G21 G90 G17 G54\nG64\nS18000 M3\n${turn}`).cutting).toBe(11.2);
  });
  test('an axis too slow for the feed clamps it', () => {
    // 120 mm in Z at most 100 mm/s and 800 mm/s²: 1.2 + 0.125 s.
    expect(
      seconds('G21 G90 G54\nG53 G0 Z-20\nS18000 M3\nF9000\nG1 Z140\nG91\nG1 Z-120').cutting,
    ).toBeGreaterThan(1.3);
  });
  test('with the spindle off a feed is no cut, but takes its time', () => {
    expect(seconds('G21 G90 G54\nG1 X150 F9000')).toMatchObject({ cutting: 0, total: 1.2 });
  });
});

describe('what stands still', () => {
  test('dwells, and changes where the tool differs', () => {
    const program = 'G21 G90 G54\nG4 P2.5\nT1 M6\nT1 M6\nT2 M6';
    expect(seconds(program)).toMatchObject({ dwell: 2.5, changes: 30, total: 32.5 });
  });
  test('waiting for the spindle where it holds the program, by the difference of speeds', () => {
    const waits = { machine: { spindle: { waits: true } } };
    // 4 s to 24 000: 3 s to 18 000, 1 s more to 24 000, nothing back down.
    expect(seconds('S18000 M3\nS24000\nS12000', waits).dwell).toBe(4);
    expect(seconds('S18000 M3\nS24000').dwell).toBe(0);
  });
});
