import { CONTINUES_NUMBER, isLetter, POWERS_OF_TEN } from './bytes';
import { MOST_WORDS, type LineWords } from './line-words';
import { isCorner, markStatement } from './marks';

/** What one line in a thousand holds: kept out of the hot path so that it stays small. */

const SPACE = 32;
const TAB = 9;
const POINT = 46;
const HASH = 35;
const OPEN_SQUARE = 91;
const LETTER_N = 13;

/** Characters of a long text that a finding shows. */
export const SHOWN = 24;
/**
 * No word of any machine is larger: a thousand kilometres in millimetres. Up to here sums and squares of
 * coordinates stay far from where doubles end.
 */
export const LARGEST = 1e9;
/** So many characters hold at most 15 digits and a point, which a double holds exactly. */
const EXACT_DIGITS = 15;
/** Words that steer the flow in macro dialects. */
const LONGEST_FLOW_WORD = 7;
const FLOW_WORDS: readonly string[] = [
  'IF',
  'WHILE',
  'DO',
  'END',
  'GOTO',
  'THEN',
  'ELSE',
  'ELSEIF',
  'ENDIF',
  'WEND',
];

/** Letters of a function's name, with room for one that is misspelt. */
const LONGEST_FUNCTION = 10;

export const isDigit = (byte: number): boolean => 48 <= byte && byte <= 57;
export const isBlank = (byte: number): boolean => byte === SPACE || byte === TAB;

/** A number that the hot path would not take: long, with blanks inside, with an exponent, or none at all. */
export function readRestOfValue(line: LineWords, start: number, letter: number): number {
  const { bytes } = line;
  let at = start + 1;
  while (isBlank(bytes[at]!)) at++;
  const sign = bytes[at] === 45 ? '-' : '';
  if (bytes[at] === 43 || bytes[at] === 45) at++;
  while (isBlank(bytes[at]!)) at++;
  const first = at;
  const end = endOfNumber(line, at);
  if (end < 0) return readValueless(line, start, letter, at);
  at = end;
  let text = '';
  if (CONTINUES_NUMBER[bytes[at]!] === 1) {
    const rest = noteContinuation(line, start, at);
    text = bytes[at] === 46 || bytes[at] === 44 ? '' : line.text(at, rest);
    at = rest;
  }
  const value = decimalValue(line, first, end, sign, text);
  noteOddities(line, { letter, start, first, end, value });
  putWord(line, letter, value, start, Math.max(end, text === '' ? end : at));
  return at;
}

/** One past the last digit or point of the number at `at`, blanks inside it allowed; -1 without digits. */
export function endOfNumber(line: LineWords, at: number): number {
  const { bytes } = line;
  let end = -1;
  let hasDigit = false;
  let hasPoint = false;
  for (; ; at++) {
    const byte = bytes[at]!;
    if (isDigit(byte)) hasDigit = true;
    else if (byte === POINT && !hasPoint) hasPoint = true;
    else if (isBlank(byte)) continue;
    else return hasDigit ? end : -1;
    end = at + 1;
  }
}

/** A decimal as parseFloat has it, to the last bit; short ones without making a string. */
export function decimalValue(
  line: LineWords,
  first: number,
  end: number,
  sign: string,
  exponent: string,
): number {
  if (exponent === '' && end - first <= EXACT_DIGITS) return exactValue(line, first, end, sign);
  return Number(sign + withoutBlanks(line, first, end) + exponent);
}

/** At most 15 digits, read as in the hot path but in doubles: mantissa and power of ten are both exact. */
function exactValue(line: LineWords, first: number, end: number, sign: string): number {
  const { bytes } = line;
  let mantissa = 0;
  let decimals = -1;
  for (let at = first; at < end; at++) {
    const byte = bytes[at]!;
    if (byte === POINT) decimals = 0;
    else if (isDigit(byte)) {
      mantissa = mantissa * 10 + (byte - 48);
      if (decimals >= 0) decimals++;
    }
  }
  const value = decimals > 0 ? mantissa / POWERS_OF_TEN[decimals]! : mantissa;
  return sign === '-' ? -value : value;
}

function withoutBlanks(line: LineWords, first: number, end: number): string {
  let text = '';
  for (let at = first; at < end; at++)
    if (!isBlank(line.bytes[at]!)) text += String.fromCharCode(line.bytes[at]!);
  return text;
}

/** What follows a number too closely: an exponent is read with it, a second point or a comma spoils it. */
export function noteContinuation(line: LineWords, start: number, at: number): number {
  const { bytes } = line;
  const byte = bytes[at]!;
  // A comma may begin a word of its own, which is no part of the number.
  if (isCorner(line, at)) return at;
  if (byte === POINT || byte === 44) {
    let to = at;
    while (bytes[to] === POINT || bytes[to] === 44 || isDigit(bytes[to]!)) to++;
    line.fault({
      problem: 'unreadable-block',
      from: start,
      to,
      facts: { reason: byte === 44 ? 'comma' : 'two-points', what: line.text(start, to) },
      voids: true,
    });
    return to;
  }
  const exponent = exponentAfter(line, at);
  if (exponent === '') return at;
  const to = at + exponent.length;
  line.fault({
    problem: 'unreadable-block',
    from: start,
    to,
    facts: { reason: 'exponent', what: line.text(start, to) },
    voids: false,
  });
  return to;
}

interface OddNumber {
  readonly letter: number;
  readonly start: number;
  readonly first: number;
  readonly end: number;
  readonly value: number;
}

function noteOddities(line: LineWords, { letter, start, first, end, value }: OddNumber): void {
  if (!(Math.abs(value) <= LARGEST) && letter !== LETTER_N)
    line.fault({
      problem: 'unreadable-block',
      from: start,
      to: end,
      facts: { reason: 'too-large', what: line.text(start, Math.min(end, start + SHOWN)) },
      voids: true,
    });
  noteBlanks(line, start, first, end);
}

/** Blanks inside a number: all controllers of the published language pass over them, some others stop. */
export function noteBlanks(line: LineWords, start: number, first: number, end: number): void {
  for (let at = first; at < end; at++)
    if (isBlank(line.bytes[at]!)) {
      line.fault({
        problem: 'odd-characters',
        from: start,
        to: end,
        facts: { what: line.text(start, Math.min(end, start + SHOWN)), byte: SPACE },
        voids: false,
      });
      return;
    }
}

function exponentAfter(line: LineWords, at: number): string {
  const { bytes } = line;
  let to = at + 1;
  if (bytes[to] === 43 || bytes[to] === 45) to++;
  const from = to;
  while (isDigit(bytes[to]!)) to++;
  return to === from || to - from > 3 ? '' : line.text(at, to);
}

export function putWord(
  line: LineWords,
  letter: number,
  value: number,
  start: number,
  end: number,
): void {
  const { count } = line;
  if (count < MOST_WORDS) {
    line.letters[count] = letter;
    line.values[count] = value;
    line.starts[count] = start;
    line.ends[count] = end;
  }
  line.count = count + 1;
}

/** A letter with no number behind it: what computes or steers makes the line a statement. */
function readValueless(line: LineWords, start: number, letter: number, at: number): number {
  const isFirst = line.count === 0 || (line.count === 1 && line.letters[0] === LETTER_N);
  if (beginsValue(line, at) || (isFirst && flowWordAt(line, start) !== ''))
    return markStatement(line, at);
  return readNoValue(line, start, letter, at);
}

/** A letter for a digit, text, or a letter with simply nothing behind it. */
export function readNoValue(line: LineWords, start: number, letter: number, at: number): number {
  const { bytes } = line;
  const byte = bytes[at]!;
  const textEnd = endOfText(line, start);
  if (isDigitLike(byte) && (isDigit(bytes[at + 1]!) || isDigit(bytes[at - 1]!)))
    return readLetterForDigit(line, start, at);
  const isText = textEnd > start + 1;
  const to = isText ? textEnd : Math.max(at, start + 1);
  line.fault({
    problem: 'unreadable-block',
    from: start,
    to: isText ? to : endWithoutBlanks(line, to),
    facts: {
      reason: isText ? 'text' : 'no-number',
      what: line.text(start, Math.min(to, start + SHOWN)).trimEnd(),
      letter: String.fromCharCode(65 + letter),
    },
    voids: true,
  });
  return to;
}

/** One past the letters that stand together from `start` on. */
export function endOfText(line: LineWords, start: number): number {
  let to = start + 1;
  while (isLetter(line.bytes[to]!)) to++;
  return to;
}

function endWithoutBlanks(line: LineWords, to: number): number {
  while (isBlank(line.bytes[to - 1]!)) to--;
  return to;
}

/** O and l, in either case, pass for a nought and a one. */
const isDigitLike = (byte: number): boolean => (byte | 32) === 111 || (byte | 32) === 108;

function readLetterForDigit(line: LineWords, start: number, at: number): number {
  const { bytes } = line;
  let to = at;
  while (isDigit(bytes[to]!) || isDigitLike(bytes[to]!)) to++;
  line.fault({
    problem: 'letter-for-digit',
    from: start,
    to,
    facts: { what: line.text(start, to), letter: line.text(at, at + 1) },
    voids: true,
  });
  return to;
}

/** Whether a value begins here that has to be worked out: `#5`, `[1+2]`, `SQRT[2]`. */
export function beginsValue(line: LineWords, at: number): boolean {
  const { bytes } = line;
  if (bytes[at] === HASH || bytes[at] === OPEN_SQUARE) return true;
  let letters = 0;
  for (; isLetter(bytes[at]!) || (letters > 0 && isBlank(bytes[at]!)); at++)
    if (isLetter(bytes[at]!) && ++letters > LONGEST_FUNCTION) return false;
  return letters >= 2 && bytes[at] === OPEN_SQUARE;
}

/** The word at `start` that steers the flow, in upper case, or ''. */
export function flowWordAt(line: LineWords, start: number): string {
  const end = endOfText(line, start);
  const word = line.text(start, Math.min(end, start + LONGEST_FLOW_WORD)).toUpperCase();
  return FLOW_WORDS.includes(word) ? word : '';
}
