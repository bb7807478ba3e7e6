import { LETTER } from '../blocks/block';
import type { Value } from '../expressions/value';
import type { LineWords } from '../lexer/line-words';

const { I, K } = LETTER;
/** Local variables of argument list I, by letter; G, L, N, O and P are never arguments (facts sheet 12.1.7). */
// prettier-ignore
const VARIABLE_OF: Readonly<Record<number, number>> = {
  [LETTER.A]: 1, [LETTER.B]: 2, [LETTER.C]: 3, [LETTER.I]: 4, [LETTER.J]: 5, [LETTER.K]: 6,
  [LETTER.D]: 7, [LETTER.E]: 8, [LETTER.F]: 9, [LETTER.H]: 11, [LETTER.M]: 13, [LETTER.Q]: 17,
  [LETTER.R]: 18, [LETTER.S]: 19, [LETTER.T]: 20, [LETTER.U]: 21, [LETTER.V]: 22, [LETTER.W]: 23,
  [LETTER.X]: 24, [LETTER.Y]: 25, [LETTER.Z]: 26,
};
/** Sets of I, J and K in argument list II. */
const MOST_SETS = 10;

/**
 * The local variables that a G65 block gives. List II has up to ten sets of I, J and K, and a new set begins
 * where their letters no longer ascend; mixed lists take the later word.
 */
export function macroArguments(
  words: LineWords,
  valueOf: (word: number) => Value,
): Map<number, Value> {
  const given = new Map<number, Value>();
  let set = 0;
  let before = -1;
  for (let word = 0; word < words.count; word++) {
    const letter = words.letters[word]!;
    const variable = VARIABLE_OF[letter];
    if (variable === undefined) continue;
    if (letter < I || K < letter) {
      given.set(variable, valueOf(word));
      continue;
    }
    if (letter <= before) set++;
    before = letter;
    if (set < MOST_SETS) given.set(variable + 3 * set, valueOf(word));
  }
  return given;
}
