import { expect, test } from 'vitest';
import { runProgram } from '../testing/check-rule';

const extents = (program: string, change: object = {}) =>
  runProgram(`${program}\nM30`, change, []).extents;

test('of a program that moves nothing there are none', () => {
  expect(extents('G21 G90 G54')).toEqual({ gauge: null, work: {} });
});

test('gauge point in the machine, tip in the work offset', () => {
  // Work zero at 30, 40, -182; T1 is 95 long, its offset too.
  expect(extents('G21 G90 G54\nT1 M6\nG43 H1\nG0 X10 Y20 Z5\nG1 X100 Z-6 F1000')).toEqual({
    gauge: { min: { x: 40, y: 60, z: -93 }, max: { x: 130, y: 60, z: -82 } },
    work: { G54: { min: { x: 10, y: 20, z: -6 }, max: { x: 100, y: 20, z: 5 } } },
  });
});

test('the tip goes by the real length, not by the offset', () => {
  const { work } = extents('G21 G90 G54\nT1 M6\nG43 H5\nG0 X10 Y20 Z5');
  expect(work['G54']?.min.z).toBe(0);
});

test('arcs by their true extremes, home moves included, the start left out', () => {
  const { gauge } = extents(
    'G21 G90 G17 G54\nG0 X70 Y60\nG1 X60 F500\nG2 X60 Y60 I10 J0\nG28 G91 Z0',
  );
  // The circle about (70, 60) of radius 10 reaches X 60 to 80 and Y 50 to 70, plus work zero.
  expect(gauge).toEqual({ min: { x: 0, y: 0, z: 0 }, max: { x: 110, y: 110, z: 0 } });
});

test('each work offset for itself', () => {
  const { work } = extents('G21 G90\nG54 G0 X10 Y0\nG55 G0 X20 Y0\nG54 G0 X15', {
    offsets: { work: { G55: { x: 500, y: 40, z: -182 } } },
  });
  expect(work['G54']).toMatchObject({ min: { x: 10 }, max: { x: 15 } });
  expect(work['G55']).toMatchObject({ min: { x: 20 }, max: { x: 20 } });
});
