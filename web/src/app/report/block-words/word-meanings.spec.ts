import { meanWords } from './word-meanings';

describe('meanWords', () => {
  const wordsOf = (...words: readonly (readonly [string, number])[]) =>
    meanWords({
      line: 1,
      words: words.map(([letter, value]) => ({ letter, value })),
      comments: [],
      isPlain: true,
    });

  it('says what codes and letters mean', () => {
    expect(wordsOf(['G', 1], ['X', 1262.5], ['F', 4800])).toEqual([
      { word: 'G1', meaning: 'feed move' },
      { word: 'X1262.5', meaning: 'along X' },
      { word: 'F4800', meaning: 'feed' },
    ]);
    expect(wordsOf(['G', 54])[0]?.meaning).toBe('work offset');
    expect(wordsOf(['G', 59.3])[0]?.meaning).toBe('work offset');
  });

  it('makes nothing up for what it does not know', () => {
    expect(wordsOf(['G', 5], ['M', 64], ['E', 1]).map(({ meaning }) => meaning)).toEqual([
      'see the controller',
      'see the controller',
      'see the controller',
    ]);
  });
});
