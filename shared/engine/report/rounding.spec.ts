import { expect, test } from 'vitest';
import { roundData, roundFigure, roundSeconds } from './rounding';

test('rounds to a thousandth, half away from zero', () => {
  const rows: [number, number][] = [
    [1.2344, 1.234],
    [1.2345, 1.235],
    [-1.2345, -1.235],
    [0.0005, 0.001],
    [-0.0005, -0.001],
    [1.0005, 1.001],
    [304.2004999, 304.2],
    [1304.2, 1304.2],
  ];
  for (const [value, rounded] of rows) expect(roundFigure(value)).toBe(rounded);
});

test('never writes minus zero', () => {
  expect(Object.is(roundFigure(-0.0004), 0)).toBe(true);
  expect(Object.is(roundSeconds(-0), 0)).toBe(true);
});

test('rounds times to a tenth of a second and every other figure of a finding to a thousandth', () => {
  expect(roundData({ seconds: 3.25, spinUpSeconds: 4.04, by: 0.12345, at: [1.00049, 2] })).toEqual({
    seconds: 3.3,
    spinUpSeconds: 4,
    by: 0.123,
    at: [1, 2],
  });
});

test('has no figure for what is not a number', () => {
  expect(roundData({ by: Number.NaN })).toEqual({ by: null });
});
