import { formatDuration, formatMoment, longDay, secondsBetween } from './time';

describe('formatDuration', () => {
  it.each([
    [0.312, '0.31 s'],
    [9.999, '10 s'],
    [48.4, '48 s'],
    [59.4, '59 s'],
    [59.5, '1 min'],
    [720, '12 min'],
    [3599, '1 h 00 min'],
    [4320, '1 h 12 min'],
    [null, '–'],
  ])('says %s seconds as “%s”', (seconds, words) => expect(formatDuration(seconds)).toBe(words));
});

describe('formatMoment', () => {
  // Local times throughout, so that the spec holds in every time zone.
  const now = new Date(2026, 11, 1, 20, 0);
  const at = (...parts: [number, number, number, number, number]) =>
    new Date(...parts).toISOString();
  it('says only the clock for today', () => {
    expect(formatMoment(at(2026, 11, 1, 8, 5), now)).toBe('08:05');
  });
  it('adds the day, and the year when it is another', () => {
    expect(formatMoment(at(2026, 10, 30, 18, 42), now)).toBe('30 Nov, 18:42');
    expect(formatMoment(at(2025, 10, 30, 18, 42), now)).toBe('30 Nov 2025, 18:42');
  });
  it('has a dash for no moment', () => expect(formatMoment(null, now)).toBe('–'));
});

test('the day is written out', () => {
  expect(longDay(new Date(2026, 11, 1))).toBe('Tuesday 1 December');
});
test('seconds between two moments, when both are there', () => {
  expect(secondsBetween('2026-12-01T10:00:00Z', '2026-12-01T10:00:01.5Z')).toBe(1.5);
  expect(secondsBetween(null, '2026-12-01T10:00:00Z')).toBeNull();
});
