import { formatLength, fromMm, toMm } from './length';

describe('formatLength', () => {
  // 1 inch is exactly 25.4 mm (International yard and pound agreement, 1959).
  it.each([
    [92.4, 'mm', '92.4 mm'],
    [92.4, 'inch', '3.638 in'],
    [1219.2, 'inch', '48 in'],
    [-18.4, 'mm', '\u221218.4 mm'],
    [100, 'mm', '100 mm'],
    [-0.001, 'mm', '0 mm'],
    [0.125, 'mm', '0.13 mm'],
    [null, 'mm', '–'],
    [NaN, 'mm', '–'],
  ] as const)('writes %s in %s as “%s”', (mm, units, words) => {
    expect(formatLength(mm, units)).toBe(words);
  });
  it('gives inches one decimal more', () => expect(formatLength(1, 'inch', 3)).toBe('0.0394 in'));
});

describe('fromMm and toMm', () => {
  it('bring a figure back as it was, to a tenth of a micron', () => {
    for (const mm of [0.1, 18.2, 597.3, 2438.4]) {
      expect(Math.abs(toMm(fromMm(mm, 'inch'), 'inch') - mm)).toBeLessThan(0.0001);
    }
  });
  it('leave millimetres alone', () => expect(toMm(fromMm(18.123456, 'mm'), 'mm')).toBe(18.123456));
});
