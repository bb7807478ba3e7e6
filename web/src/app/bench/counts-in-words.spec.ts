import { countsInWords } from './counts-in-words';

describe('countsInWords', () => {
  it.each([
    [{ stop: 1, hold: 0, note: 0 }, '1 stop'],
    [{ stop: 3, hold: 1, note: 2 }, '3 stops, 1 hold, 2 notes'],
    [{ stop: 0, hold: 0, note: 0 }, 'no findings'],
    [null, ''],
  ])('says %o as “%s”', (counts, words) => expect(countsInWords(counts)).toBe(words));
});
