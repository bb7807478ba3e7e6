import { counted, formatBytes, formatCount } from './count';

describe('formatCount', () => {
  it.each([
    [999, '999'],
    [58025, '58\u202f025'],
    [1200000, '1\u202f200\u202f000'],
  ])('writes %i as “%s”', (count, words) => expect(formatCount(count)).toBe(words));
});

describe('counted', () => {
  it('has one and many', () => {
    expect([counted(1, 'line'), counted(0, 'line')]).toEqual(['1 line', '0 lines']);
  });
});

describe('formatBytes', () => {
  it.each([
    [744, '744 B'],
    [1024, '1 kB'],
    [1_000_000, '977 kB'],
    [268_435_456, '256 MB'],
    [26_000_000, '24.8 MB'],
  ])('writes %i as “%s”', (bytes, words) => expect(formatBytes(bytes)).toBe(words));
});
