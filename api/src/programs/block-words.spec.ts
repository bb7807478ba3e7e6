import { describe, expect, test } from 'vitest';
import { readBlockWords } from './block-words';

describe('the words of a block', () => {
  test('are its letters with their numbers, comments apart', () => {
    expect(readBlockWords(7, 'N70 G1 X1262.5 F4800. (EDGE)')).toEqual({
      line: 7,
      words: [
        { letter: 'G', value: 1 },
        { letter: 'X', value: 1262.5 },
        { letter: 'F', value: 4800 },
      ],
      comments: ['EDGE'],
      isPlain: true,
    });
  });

  test.each(['/G0 X5', 'g1x-.5y+2.', '%', '', '(ONLY WORDS)', 'G0 X1 ; TO THE LEFT'])(
    'are all of it in %j',
    (text) => expect(readBlockWords(1, text).isPlain).toBe(true),
  );

  // Each of these the tokeniser reads without complaint and without what matters in it.
  test.each([
    'G1 X[1+2]',
    'G1 X#5',
    'O100 IF [#1 GT 3]',
    'G1 X Y2',
    'G1 X1,5',
    'G1 X1 (OPEN',
    'G1 X--5',
  ])('are not all of it in %j, and that is said', (text) =>
    expect(readBlockWords(1, text).isPlain).toBe(false),
  );
});
