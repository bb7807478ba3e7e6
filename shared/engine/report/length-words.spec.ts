import { expect, test } from 'vitest';
import { lengthWords } from './length-words';

test('a report gives millimetres with inches in brackets', () => {
  const words = lengthWords('both');
  expect(words.length(34.2)).toBe('34.2 mm (1.346 in)');
  expect(words.length(0.05)).toBe('0.05 mm (0.002 in)');
  expect(words.length(-1.27)).toBe('-1.27 mm (-0.05 in)');
  expect(words.position('x', 1304.2)).toBe('X 1304.2 mm (51.346 in)');
  expect(words.feed(4800)).toBe('4800 mm/min (189 in/min)');
});

test('a person’s own view gives one unit', () => {
  expect(lengthWords('mm').length(34.2)).toBe('34.2 mm');
  expect(lengthWords('inch').length(25.4)).toBe('1 in');
  expect(lengthWords('inch').feed(2540)).toBe('100 in/min');
});

test('writes no minus zero', () => {
  expect(lengthWords('both').length(-0.0001)).toBe('0 mm (0 in)');
});
