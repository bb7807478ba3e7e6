import * as kind from './bytes';
import { MOST_WORDS, type LineWords } from './line-words';

/** Marks of a line that are no words: comments, slash, percent sign, colon, the letter O, and strays. */

const ZERO = 48;
const POINT = 46;
const LETTER_N = 13;
const COMMA = 44;
/** R and C, in lower case. */
const CORNER_LETTERS: readonly number[] = [114, 99];
const OPEN_BRACKET = 40;
const CLOSE_BRACKET = 41;
const CLASS_OF = kind.CLASS_OF;

const isDigit = (byte: number): boolean => (byte - ZERO) >>> 0 <= 9;

/** A line that computes or steers is read as a whole, by statements/read-statement.ts. */
export function markStatement(line: LineWords, at: number): number {
  line.isRare = line.isStatement = true;
  while (CLASS_OF[line.bytes[at]!] !== kind.LINE_END) at++;
  return at;
}

/** Leaves a bracketed comment at its closing bracket, or at the line end when it never closes. */
export function skipComment(line: LineWords, open: number): number {
  const { bytes } = line;
  let at = open + 1;
  let depth = 1;
  let nested = -1;
  for (; CLASS_OF[bytes[at]!] !== kind.LINE_END; at++) {
    line.bits |= bytes[at]!;
    if (bytes[at] === 40) {
      if (nested < 0) nested = at;
      depth++;
    } else if (bytes[at] === 41 && --depth === 0) break;
  }
  line.comment(open + 1, at, false);
  if (nested >= 0)
    line.fault({
      problem: 'nested-comment',
      from: nested,
      to: nested + 1,
      facts: { closed: depth === 0 },
      voids: false,
    });
  else if (depth > 0)
    line.fault({
      problem: 'unreadable-block',
      from: open,
      to: at,
      facts: { reason: 'comment-not-closed', what: '(' },
      voids: false,
    });
  return depth === 0 ? at + 1 : at;
}

/** A comment behind a semicolon runs to the end of the line. */
export function skipLineComment(line: LineWords, from: number): number {
  const { bytes } = line;
  let bits = 0;
  let at = from;
  while (CLASS_OF[bytes[at]!] !== kind.LINE_END) bits |= bytes[at++]!;
  line.bits |= bits;
  line.comment(from, at, true);
  return at;
}

/** A slash in front makes the block skippable; after the line number is common too, anywhere else is a fault. */
export function readSlash(line: LineWords, at: number, count: number): number {
  const onlyNumber = count === 1 && line.letters[0] === LETTER_N;
  if ((count === 0 || onlyNumber) && !line.skippable) {
    line.isRare = true;
    line.skippable = true;
    line.skipAt = at;
    const next = line.bytes[at + 1]! - ZERO;
    // A digit names which of several switches skips the block; any of them may be on.
    return 1 <= next && next <= 9 ? at + 2 : at + 1;
  }
  line.fault({
    problem: 'unreadable-block',
    from: at,
    to: at + 1,
    facts: { reason: 'slash', what: '/' },
    voids: true,
  });
  return at + 1;
}

/** A percent sign opens or closes the program; text behind it belongs to the sign. */
export function readPercent(line: LineWords, at: number, count: number): number {
  if (count > 0) return readOdd(line, at);
  line.isRare = true;
  line.percentAt = at;
  while (CLASS_OF[line.bytes[at]!] !== kind.LINE_END) line.bits |= line.bytes[at++]!;
  return at;
}

/**
 * A colon marks a main block (ISO 6983-1); with nothing but digits behind it, it is how some write a
 * program number, and such a line is a statement.
 */
export function readColon(line: LineWords, at: number, count: number): number {
  if (count > 0) return readOdd(line, at);
  const end = colonEnd(line, at);
  return end > at + 1 && isAlone(line, end) ? markStatement(line, end) : end;
}

/** One past the colon at `at` and the digits that belong to it. */
export function colonEnd({ bytes }: LineWords, at: number): number {
  do at++;
  while (isDigit(bytes[at]!));
  return at;
}

/** Whether nothing but blanks and comments stands from here on. */
export function isAlone({ bytes }: LineWords, at: number): boolean {
  for (; ; at++) {
    const byte = bytes[at]!;
    if (byte === OPEN_BRACKET) {
      while (bytes[at] !== CLOSE_BRACKET && CLASS_OF[bytes[at]!] !== kind.LINE_END) at++;
      if (bytes[at] !== CLOSE_BRACKET) return true;
    } else if (CLASS_OF[byte] !== kind.BLANK)
      return CLASS_OF[byte] === kind.LINE_END || CLASS_OF[byte] === kind.SEMICOLON;
  }
}

/** `,R5` or `,C5` behind an end point rounds or breaks the corner there. */
export function isCorner({ bytes }: LineWords, at: number): boolean {
  if (bytes[at] !== COMMA) return false;
  do at++;
  while (CLASS_OF[bytes[at]!] === kind.BLANK);
  return CORNER_LETTERS.includes(bytes[at]! | 32);
}

/** A corner word is named and left out; the block goes to its end point all the same. */
export function noteCorner(line: LineWords, from: number, to: number): number {
  line.fault({
    problem: 'not-modelled',
    from,
    to,
    facts: { what: line.text(from, to), reason: 'corner' },
    voids: false,
  });
  return to;
}

function readCorner(line: LineWords, from: number): number {
  const { bytes } = line;
  let at = from + 1;
  while (CLASS_OF[bytes[at]!] === kind.BLANK) at++;
  at++;
  while (CLASS_OF[bytes[at]!] === kind.BLANK || isDigit(bytes[at]!) || bytes[at] === POINT) at++;
  while (CLASS_OF[bytes[at - 1]!] === kind.BLANK) at--;
  return noteCorner(line, from, at);
}

/** A stray mark, or bytes that belong to no block at all. */
export function readOdd(line: LineWords, at: number): number {
  const { bytes } = line;
  if (isCorner(line, at)) return readCorner(line, at);
  const from = at;
  line.bits |= bytes[at]!;
  const isStray = CLASS_OF[bytes[at]!] !== kind.ODD;
  at++;
  if (!isStray) while (CLASS_OF[bytes[at]!] === kind.ODD) at++;
  line.fault({
    problem: isStray ? 'unreadable-block' : 'odd-characters',
    from,
    to: at,
    facts: isStray
      ? { reason: bytes[from] === 41 ? 'stray-bracket' : 'stray-text', what: line.text(from, at) }
      : { what: line.text(from, Math.min(at, from + 8)), byte: bytes[from]! },
    voids: isStray && bytes[from] !== 41,
  });
  return at;
}

/**
 * The letter O in front, or behind a line number, makes a label; behind other words it stands where a
 * nought was meant.
 */
export function readLetterO(line: LineWords, start: number): number {
  const { count } = line;
  if (count === 0 || line.letters[count - 1] === LETTER_N) return markStatement(line, start);
  return readOForNought(line, start);
}

export function readOForNought(line: LineWords, start: number): number {
  const { bytes } = line;
  let to = start + 1;
  while (isDigit(bytes[to]!) || bytes[to] === POINT) to++;
  const word = line.count - 1;
  const isJoined = line.count <= MOST_WORDS && line.ends[word] === start;
  const from = isJoined ? line.starts[word]! : start;
  line.fault({
    problem: isJoined ? 'letter-for-digit' : 'unreadable-block',
    from,
    to,
    facts: isJoined
      ? { what: line.text(from, to), letter: line.text(start, start + 1) }
      : { reason: 'text', what: line.text(from, to) },
    voids: true,
  });
  return to;
}
