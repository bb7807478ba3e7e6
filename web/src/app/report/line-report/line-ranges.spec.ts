import { gapsBetween, joinRanges } from './line-ranges';

test('joins what touches or overlaps and keeps within the program', () => {
  const joined = joinRanges(
    [
      { from: 8, to: 9 },
      { from: -3, to: 2 },
      { from: 3, to: 4 },
      { from: 95, to: 120 },
      { from: 9, to: 12 },
    ],
    100,
  );
  expect(joined).toEqual([
    { from: 1, to: 4 },
    { from: 8, to: 12 },
    { from: 95, to: 100 },
  ]);
});

test('a range outside the program is no range', () => {
  expect(joinRanges([{ from: 101, to: 120 }], 100)).toEqual([]);
});

test('gaps are what is left, to the last line', () => {
  expect(gapsBetween([{ from: 3, to: 4 }], 10)).toEqual([
    { from: 1, to: 2 },
    { from: 5, to: 10 },
  ]);
  expect(gapsBetween([], 5)).toEqual([{ from: 1, to: 5 }]);
  expect(gapsBetween([{ from: 1, to: 5 }], 5)).toEqual([]);
});
