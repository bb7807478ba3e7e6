import * as kind from './bytes';
import { MOST_WORDS, type LineWords } from './line-words';
import {
  markStatement,
  readColon,
  readLetterO,
  readOdd,
  readPercent,
  readSlash,
  skipComment,
  skipLineComment,
} from './marks';
import { readRestOfValue } from './rare-words';

const LF = 10;
const CR = 13;
const TAB = 9;
const SPACE = 32;
const PLUS = 43;
const MINUS = 45;
const POINT = 46;
const ZERO = 48;
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
        at = readLetterO(line, at);
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
        at = skipLineComment(line, at + 1);
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
        at = markStatement(line, at);
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
  const next = at + 1;
  // The text may end with the CR itself; reading past the bytes would slow every later read.
  return bytes[at] === CR && next < bytes.length && bytes[next] === LF ? next + 1 : next;
}
