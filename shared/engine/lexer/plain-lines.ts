import { POWERS_OF_TEN } from './bytes';

// Enumerations, here and below: a bundler writes their numbers in place, where a constant would be looked up.

/** What a byte is to a plain line; the first are letters, each with its bit in `seen`. */
const enum Kind {
  other,
  x,
  y,
  z,
  i,
  j,
  feed,
  code,
  number,
  blank,
  lineEnd,
  openComment,
  semicolon,
}

const KIND_OF = Uint8Array.from({ length: 256 }, (_, byte) => {
  const at = 'XYZIJFGN \t\n\r(;'.indexOf(String.fromCharCode(byte).toUpperCase());
  if (at < 0) return Kind.other;
  if (at < 8) return at + 1;
  if (at < 10) return Kind.blank;
  return at < 12 ? Kind.lineEnd : at === 12 ? Kind.openComment : Kind.semicolon;
});

/** Letters that a plain line has: the bit whose place is their kind. */
export const enum Seen {
  x = 2,
  y = 4,
  z = 8,
  i = 16,
  j = 32,
  feed = 64,
  code = 128,
  number = 256,
  comment = 512,
  axes = 14,
  centre = 48,
}

/** Numbers kept of a line: X, Y, Z, I, J, F, in this order. */
export const enum Kept {
  x,
  y,
  z,
  i,
  j,
  feed,
  count,
}

const enum Most {
  /** Lines read ahead: few enough that what is read and not used costs nothing to speak of. */
  lines = 256,
  /** So many digits always fit 32 bits; a line with a longer number is not plain. */
  digits = 9,
  /** Characters of a comment; a longer one is rare, and read elsewhere. */
  comment = 120,
}

const enum Byte {
  tab = 9,
  lineFeed = 10,
  return = 13,
  space = 32,
  open = 40,
  close = 41,
  plus = 43,
  minus = 45,
  point = 46,
  zero = 48,
  tilde = 126,
}

/**
 * Lines read ahead, cut into parallel arrays: those of nothing but N, one G word with a whole number, and
 * X, Y, Z, I, J and F at most once each, with at most one comment of plain ASCII. It is what the lexer and the sorting of words would make of them,
 * for the nine lines in ten of a long program that are no more than this.
 */
export class PlainLines {
  bytes: Uint8Array = new Uint8Array(0);
  count = 0;
  /** Where each line begins, and at `count` where the first begins that is not plain, or not read yet. */
  readonly starts = new Int32Array(Most.lines + 1);
  readonly ends = new Int32Array(Most.lines);
  readonly seen = new Int16Array(Most.lines);
  readonly codes = new Int8Array(Most.lines);
  readonly values = new Float64Array(Most.lines * Kept.count);
  /** The bytes of the G word and of the F word, counted from the start of the line. */
  readonly codeFrom = new Int32Array(Most.lines);
  readonly codeTo = new Int32Array(Most.lines);
  readonly feedFrom = new Int32Array(Most.lines);
  readonly feedTo = new Int32Array(Most.lines);
  /** The bytes of the comment, without its marks. */
  readonly commentFrom = new Int32Array(Most.lines);
  readonly commentTo = new Int32Array(Most.lines);

  /** Reads on from `at`; every line up to `end` ends with a line end. */
  read(bytes: Uint8Array, at: number, end: number): void {
    const { starts, seen, values } = this;
    const kinds = KIND_OF;
    const powers = POWERS_OF_TEN;
    this.bytes = bytes;
    let line = 0;
    starts[0] = at;
    plainLines: while (at < end && line < Most.lines) {
      const start = at;
      let letters = 0;
      let byte = bytes[at]!;
      for (;;) {
        const kind = kinds[byte]!;
        if (kind > Kind.number) {
          if (kind === Kind.lineEnd) break;
          at++;
          if (kind !== Kind.blank) {
            if ((letters & Seen.comment) !== 0) break plainLines;
            letters |= Seen.comment;
            this.commentFrom[line] = at;
            at = endOfComment(bytes, at, kind === Kind.openComment);
            if (at < 0) break plainLines;
            this.commentTo[line] = at;
            if (kind === Kind.openComment) at++;
          }
          byte = bytes[at]!;
          continue;
        }
        // Another letter, the same one twice, or a line number that is not in front.
        if (kind === Kind.other || (letters & (1 << kind)) !== 0) break plainLines;
        if (kind === Kind.number && (letters & ~Seen.comment) !== 0) break plainLines;
        letters |= 1 << kind;
        const from = at;
        byte = bytes[++at]!;
        let sign = 1;
        if (byte < Byte.point) {
          while (byte === Byte.space || byte === Byte.tab) byte = bytes[++at]!;
          if (byte === Byte.minus || byte === Byte.plus) {
            if (byte === Byte.minus) sign = -1;
            byte = bytes[++at]!;
          }
        }
        let mantissa = 0;
        let digits = at;
        let decimals = 0;
        byte -= Byte.zero;
        while (byte >>> 0 <= 9) {
          mantissa = (Math.imul(mantissa, 10) + byte) | 0;
          byte = bytes[++at]! - Byte.zero;
        }
        digits = at - digits;
        if (byte === Byte.point - Byte.zero) {
          decimals = ++at;
          byte = bytes[at]! - Byte.zero;
          while (byte >>> 0 <= 9) {
            mantissa = (Math.imul(mantissa, 10) + byte) | 0;
            byte = bytes[++at]! - Byte.zero;
          }
          decimals = at - decimals;
          digits += decimals;
        }
        byte += Byte.zero;
        if ((digits - 1) >>> 0 >= Most.digits) break plainLines;
        // The sign goes last: −0 stays −0, as parseFloat has it.
        if (kind <= Kind.feed) {
          values[line * Kept.count + kind - 1] =
            decimals === 0 ? sign * mantissa : (sign * mantissa) / powers[decimals]!;
          if (kind === Kind.feed) {
            this.feedFrom[line] = from - start;
            this.feedTo[line] = at - start;
          }
        } else {
          if (sign < 0 || decimals > 0) break plainLines;
          if (kind === Kind.code) {
            if (mantissa > 99) break plainLines;
            this.codes[line] = mantissa;
            this.codeFrom[line] = from - start;
            this.codeTo[line] = at - start;
          }
        }
        // Nearly always one blank, and then the next word.
        if (byte === Byte.space) byte = bytes[++at]!;
      }
      this.ends[line] = at;
      seen[line] = letters;
      at++;
      if (byte === Byte.return && at < bytes.length && bytes[at] === Byte.lineFeed) at++;
      starts[++line] = at;
    }
    this.count = line;
  }
}

/** Where a comment's text ends; -1 where it holds anything that has to be looked at more closely. */
function endOfComment(bytes: Uint8Array, from: number, isBracketed: boolean): number {
  for (let at = from; at - from <= Most.comment; at++) {
    const byte = bytes[at]!;
    if (isBracketed) {
      if (byte === Byte.close) return at;
      if (byte === Byte.open) return -1;
    } else if (byte === Byte.lineFeed || byte === Byte.return) return at;
    if ((byte < Byte.space && byte !== Byte.tab) || byte > Byte.tilde) return -1;
  }
  return -1;
}
