import { expect, test } from 'vitest';
import { secondsOf } from './moment';

test('agrees with the runtime over leap years, offsets and fractions', () => {
  const moments = [
    '1970-01-01T00:00:00Z',
    '2026-12-01T18:00:00Z',
    '2024-02-29T23:59:59Z',
    '2000-02-29T12:00:00+02:00',
    '2100-03-01T00:00:00-05:30',
    '2026-06-15T08:30:15.25Z',
    '1999-12-31T23:59:59.999+14:00',
  ];
  for (const moment of moments) expect(secondsOf(moment)).toBeCloseTo(Date.parse(moment) / 1000, 6);
});

test('has no answer for what is no moment', () => {
  expect(secondsOf('yesterday')).toBeNaN();
  expect(secondsOf('2026-12-01')).toBeNaN();
});
