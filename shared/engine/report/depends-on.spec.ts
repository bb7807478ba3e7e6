import { expect, test } from 'vitest';
import { runProgram } from '../testing/check-rule';

const rests = (program: string, change: object = {}) =>
  runProgram(`${program}\nM30`, change, []).dependsOn;

test('names tools, their pockets and the ones beside them, offsets and pairs', () => {
  expect(
    rests('G21 G90 G54\nT4 M6\nG0 X10 Y10\nT1 M6\nT4 M6\nT1 M6\nG55 G0 X10', {
      offsets: { work: { G55: { x: 0, y: 0, z: 0 } } },
    }),
  ).toEqual({
    tools: [1, 4],
    pockets: [1, 2, 3, 4, 5],
    offsets: ['G54', 'G55'],
    pairs: [
      [0, 4],
      [4, 1],
      [1, 4],
    ],
  });
});

test('names the pockets a moving body passes over or near', () => {
  // Pockets stand at X 100, 250 … with 150 between; the spindle is 60 wide each way.
  expect(rests('G21 G90 G54\nG53 G0 X400\nG53 G0 Y2500').pockets).toEqual([3]);
  expect(rests('G21 G90 G54\nG53 G0 X100\nG53 G0 Y2500\nG53 G0 X700').pockets).toEqual([
    1, 2, 3, 4, 5,
  ]);
  expect(rests('G21 G90 G54\nG53 G0 X100 Y2300').pockets).toEqual([]);
});

test('a gantry’s beam is near every pocket it comes level with', () => {
  const beam = {
    machine: {
      bodies: [
        { name: 'beam', rides: 'gantry', box: { min: { y: 80, z: -40 }, max: { y: 240, z: 160 } } },
      ],
    },
  };
  expect(rests('G21 G90 G54\nG53 G0 Y2400', beam).pockets).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
});

test('a program that changes and moves nothing rests on nothing', () => {
  expect(rests('G21 G90')).toEqual({ tools: [], pockets: [], offsets: [], pairs: [] });
});
