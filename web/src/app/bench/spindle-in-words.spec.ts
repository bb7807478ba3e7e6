import { spindleInWords } from './spindle-in-words';

describe('spindleInWords', () => {
  it.each([
    [4, 'T4'],
    [0, 'T0'],
    [null, 'nothing'],
    ['unknown' as const, 'not known: look'],
  ])('says %s as “%s”', (held, words) => expect(spindleInWords(held)).toBe(words));
});
