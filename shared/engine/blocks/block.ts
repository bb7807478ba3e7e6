import type { LineWords } from '../lexer/line-words';
import { GROUP_COUNT } from './code-groups';

/** A code that the group tables do not place: declared by the setup, or unknown. */
export interface OtherCode {
  readonly letter: 'G' | 'M';
  readonly tenths: number;
  /** Index of its word in the line. */
  readonly word: number;
}

/**
 * The words of one line sorted by what they mean: at most one code a modal group, at most one word of
 * every other letter. Reused from line to line; it reads its values out of the line's own arrays.
 */
export class Block {
  /** One bit a letter, A the lowest; G and M are not counted. */
  seen = 0;
  /** One bit a modal group that has a code here. */
  groups = 0;
  /** Index of each letter's word; meaningful where `seen` has its bit. */
  readonly wordOf = new Int16Array(26);
  /** Code in tenths of each group; meaningful where `groups` has its bit. */
  readonly codes = new Int16Array(GROUP_COUNT);
  readonly codeWords = new Int16Array(GROUP_COUNT);
  mCount = 0;
  readonly others: OtherCode[] = [];
  /** M7 and M8 may stand together, so the coolant group alone does not tell. */
  mist = false;
  flood = false;

  constructor(readonly words: LineWords) {}

  has(letter: number): boolean {
    return (this.seen & (1 << letter)) !== 0;
  }

  value(letter: number): number {
    return this.words.values[this.wordOf[letter]!]!;
  }

  hasGroup(group: number): boolean {
    return (this.groups & (1 << group)) !== 0;
  }

  /** The word as it is written. */
  written(word: number): string {
    return this.words.text(this.words.starts[word]!, this.words.ends[word]!);
  }
}

// prettier-ignore
export const LETTER = {
  A: 0, B: 1, C: 2, D: 3, E: 4, F: 5, G: 6, H: 7, I: 8, J: 9, K: 10, L: 11, M: 12,
  N: 13, O: 14, P: 15, Q: 16, R: 17, S: 18, T: 19, U: 20, V: 21, W: 22, X: 23, Y: 24, Z: 25,
} as const;

export const letterName = (letter: number): string => String.fromCharCode(65 + letter);

/** One bit a letter, as in Block.seen. */
export function letterBits(letters: string): number {
  let bits = 0;
  for (const letter of letters) bits |= 1 << (letter.charCodeAt(0) - 65);
  return bits;
}
