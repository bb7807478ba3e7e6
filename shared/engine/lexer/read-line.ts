import * as kind from './bytes';
import { MOST_WORDS, type LineWords } from './line-words';
import { readRestOfValue, skipComment, skipLabel, skipParameter } from './rare-words';

const LF = 10;
const CR = 13;
const TAB = 9;
const SPACE = 32;
const PLUS = 43;
const MINUS = 45;
const POINT = 46;
const ZERO = 48;
const LETTER_N = 13;
const LETTER_O = 14;
/** Up to this many digits the mantissa is exact in a double, and so is one division by a power of ten. */
const EXACT_DIGITS = 15;
export const POWERS_OF_TEN = Float64Array.from({ length: 23 }, (_, exponent) =>
  Number(`1e${exponent}`),
);
const CLASS_OF = kind.CLASS_OF;

/**
 * Reads one line from `at` into `line` and returns where the next begins. The text handed over must end
 * with a line end, which is what lets every loop here run without looking at a length.
 *
 * This is the hot path of every check: plain decimals are read in one pass over the bytes without
 * making a string, and come out bit-identical to parseFloat (a mantissa of at most 15 digits and a power
 * of ten up to 10^22 are both exact, so their quotient is rounded once). Everything rarer is in rare-words.
 */
export function readLine(bytes: Uint8Array, at: number, line: LineWords): number {
  line.clear(bytes, at);
  let count = 0;
  for (;;) {
    let byte = bytes[at]!;
    switch (CLASS_OF[byte]) {
      case kind.LETTER: {
        const start = at;
        const letter = (byte & 31) - 1;
        byte = bytes[++at]!;
        while (byte === SPACE || byte === TAB) byte = bytes[++at]!;
        let negative = false;
        if (byte === MINUS || byte === PLUS) {
          negative = byte === MINUS;
          byte = bytes[++at]!;
          while (byte === SPACE || byte === TAB) byte = bytes[++at]!;
        }
        const first = at;
        let mantissa = 0;
        let digit = byte - ZERO;
        while (digit >>> 0 <= 9) {
          mantissa = mantissa * 10 + digit;
          digit = bytes[++at]! - ZERO;
        }
        let digits = at - first;
        let decimals = 0;
        let point = 0;
        if (digit === POINT - ZERO) {
          point = 1;
          const afterPoint = ++at;
          digit = bytes[at]! - ZERO;
          while (digit >>> 0 <= 9) {
            mantissa = mantissa * 10 + digit;
            digit = bytes[++at]! - ZERO;
          }
          decimals = at - afterPoint;
          digits += decimals;
        }
        byte = digit + ZERO;
        const end = at;
        while (byte === SPACE || byte === TAB) byte = bytes[++at]!;
        if (
          digits === 0 ||
          digits > EXACT_DIGITS ||
          letter === LETTER_O ||
          byte === POINT ||
          (byte - ZERO) >>> 0 <= 9 ||
          byte === 69 ||
          byte === 101 ||
          byte === 44
        ) {
          line.count = count;
          at = letter === LETTER_O ? skipLabel(line, start) : readRestOfValue(line, start, letter);
          count = line.count;
          break;
        }
        if (count < MOST_WORDS) {
          const value = decimals === 0 ? mantissa : mantissa / POWERS_OF_TEN[decimals]!;
          line.letters[count] = letter;
          line.values[count] = negative ? -value : value;
          line.starts[count] = start;
          line.ends[count] = end;
          line.points[count] = point;
        }
        count++;
        break;
      }
      case kind.BLANK:
        at++;
        break;
      case kind.LINE_END:
        return finishLine(bytes, at, line, count);
      case kind.OPEN_COMMENT:
        at = skipComment(line, at);
        break;
      case kind.SEMICOLON: {
        const from = ++at;
        let bits = 0;
        while (bytes[at] !== LF && bytes[at] !== CR) bits |= bytes[at++]!;
        line.bits |= bits;
        line.comments.push({ from, to: at, isLine: true });
        break;
      }
      case kind.SLASH:
        at = readSlash(line, at, count);
        break;
      case kind.PERCENT:
        at = readPercent(line, at, count);
        break;
      case kind.COLON:
        at = readColon(line, at, count);
        break;
      case kind.PARAMETER:
        at = skipParameter(line, at);
        break;
      default:
        at = readOdd(line, at);
    }
  }
}

function finishLine(bytes: Uint8Array, at: number, line: LineWords, count: number): number {
  line.end = at;
  if (count > MOST_WORDS) {
    line.fault({
      problem: 'unreadable-block',
      from: line.starts[0]!,
      to: line.ends[MOST_WORDS - 1]!,
      facts: { reason: 'too-many-words', words: count, most: MOST_WORDS },
      voids: true,
    });
    count = MOST_WORDS;
  }
  line.count = count;
  return bytes[at] === CR && bytes[at + 1] === LF ? at + 2 : at + 1;
}

/** A slash in front makes the block skippable; after the line number is common too, anywhere else is a fault. */
function readSlash(line: LineWords, at: number, count: number): number {
  const onlyNumber = count === 1 && line.letters[0] === LETTER_N;
  if ((count === 0 || onlyNumber) && line.label === '' && !line.skippable) {
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
function readPercent(line: LineWords, at: number, count: number): number {
  if (count > 0 || line.label !== '') return readOdd(line, at);
  line.percentAt = at;
  while (CLASS_OF[line.bytes[at]!] !== kind.LINE_END) line.bits |= line.bytes[at++]!;
  return at;
}

/** A colon marks a main block; with digits it is how some write a program number. */
function readColon(line: LineWords, at: number, count: number): number {
  if (count > 0) return readOdd(line, at);
  at++;
  while ((line.bytes[at]! - ZERO) >>> 0 <= 9) at++;
  return at;
}

function readOdd(line: LineWords, at: number): number {
  const { bytes } = line;
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
