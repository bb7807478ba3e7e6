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
/** So many digits always fit 32 bits; longer numbers are rare, and read apart. */
const SHORT_DIGITS = 9;
const CLASS_OF = kind.CLASS_OF;
const CONTINUES = kind.CONTINUES_NUMBER;
const POWERS = kind.POWERS_OF_TEN;

/**
 * Reads one line from `at` into `line` and returns where the next begins. The text handed over must end
 * with a line end, which is what lets every loop here run without looking at a length.
 *
 * This is the hot path of every check: short decimals are read in one pass over the bytes without making
 * a string, and come out bit-identical to parseFloat, because a whole mantissa below 2^53 and a power of
 * ten up to 10^22 are both exact and their quotient is rounded once. Everything rarer is in rare-words.
 */
export function readLine(bytes: Uint8Array, at: number, line: LineWords): number {
  const { letters, values, starts, ends } = line;
  if (line.isRare) line.clearRare();
  line.start = at;
  let count = 0;
  for (;;) {
    let byte = bytes[at]!;
    switch (CLASS_OF[byte]) {
      case kind.LETTER: {
        const start = at;
        const letter = (byte & 31) - 1;
        byte = bytes[++at]!;
        while (byte === SPACE || byte === TAB) byte = bytes[++at]!;
        let sign = 1;
        if (byte === MINUS || byte === PLUS) {
          if (byte === MINUS) sign = -1;
          byte = bytes[++at]!;
          while (byte === SPACE || byte === TAB) byte = bytes[++at]!;
        }
        // 32-bit arithmetic: about 15 % of the lexer's time on a carve against doubles.
        let mantissa = 0;
        let digits = at;
        let decimals = 0;
        byte -= ZERO;
        while (byte >>> 0 <= 9) {
          mantissa = (Math.imul(mantissa, 10) + byte) | 0;
          byte = bytes[++at]! - ZERO;
        }
        digits = at - digits;
        if (byte === POINT - ZERO) {
          decimals = ++at;
          byte = bytes[at]! - ZERO;
          while (byte >>> 0 <= 9) {
            mantissa = (Math.imul(mantissa, 10) + byte) | 0;
            byte = bytes[++at]! - ZERO;
          }
          decimals = at - decimals;
          digits += decimals;
        }
        const end = at;
        byte += ZERO;
        while (byte === SPACE || byte === TAB) byte = bytes[++at]!;
        if ((digits - 1) >>> 0 >= SHORT_DIGITS || CONTINUES[byte] === 1) {
          line.count = count;
          at = readRestOfValue(line, start, letter);
          count = line.count;
          break;
        }
        if (count < MOST_WORDS) {
          letters[count] = letter;
          // The sign goes last: −0 stays −0, as parseFloat has it.
          values[count] = decimals === 0 ? sign * mantissa : (sign * mantissa) / POWERS[decimals]!;
          starts[count] = start;
          ends[count] = end;
        }
        count++;
        break;
      }
      case kind.LETTER_O:
        line.count = count;
        at = skipLabel(line, at);
        count = line.count;
        break;
      case kind.BLANK:
        at++;
        break;
      case kind.LINE_END:
        return finishLine(bytes, at, line, count);
      case kind.OPEN_COMMENT:
        at = skipComment(line, at);
        break;
      case kind.SEMICOLON:
        at = skipToLineEnd(line, at + 1);
        break;
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

function skipToLineEnd(line: LineWords, from: number): number {
  const { bytes } = line;
  let bits = 0;
  let at = from;
  while (CLASS_OF[bytes[at]!] !== kind.LINE_END) bits |= bytes[at++]!;
  line.bits |= bits;
  line.comment(from, at, true);
  return at;
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
  const next = at + 1;
  // The text may end with the CR itself; reading past the bytes would slow every later read.
  return bytes[at] === CR && next < bytes.length && bytes[next] === LF ? next + 1 : next;
}

/** A slash in front makes the block skippable; after the line number is common too, anywhere else is a fault. */
function readSlash(line: LineWords, at: number, count: number): number {
  const onlyNumber = count === 1 && line.letters[0] === LETTER_N;
  if ((count === 0 || onlyNumber) && line.label === '' && !line.skippable) {
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
function readPercent(line: LineWords, at: number, count: number): number {
  if (count > 0 || line.label !== '') return readOdd(line, at);
  line.isRare = true;
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
