import type { LineWords } from '../lexer/line-words';
import type { Columns } from '../report/report';

/**
 * Columns of a byte range: 1-based, first and one past the last, in UTF-16 units of the line decoded as
 * UTF-8, an invalid byte counting one. Worked out only when something is reported there.
 */
export function columnsOf(line: LineWords, from: number, to: number): Columns {
  if (!line.hasWide) return [from - line.start + 1, to - line.start + 1];
  return [unitsBefore(line, from) + 1, unitsBefore(line, to) + 1];
}

function unitsBefore(line: LineWords, end: number): number {
  const { bytes } = line;
  let units = 0;
  for (let at = line.start; at < end;) {
    const length = sequenceLength(bytes, at, line.end);
    units += length === 4 ? 2 : 1;
    at += length;
  }
  return units;
}

/** Bytes of the well-formed UTF-8 character at `at`, or 1 for a byte that begins none. */
function sequenceLength(bytes: Uint8Array, at: number, end: number): number {
  const lead = bytes[at]!;
  if (lead < 0xc2 || lead > 0xf4) return 1;
  const length = lead < 0xe0 ? 2 : lead < 0xf0 ? 3 : 4;
  if (at + length > end) return 1;
  const second = bytes[at + 1]!;
  // Over-long forms, surrogates and points past U+10FFFF are not well-formed (Unicode table 3-7).
  const low = lead === 0xe0 ? 0xa0 : lead === 0xf0 ? 0x90 : 0x80;
  const high = lead === 0xed ? 0x9f : lead === 0xf4 ? 0x8f : 0xbf;
  if (second < low || high < second) return 1;
  for (let i = 2; i < length; i++) if ((bytes[at + i]! & 0xc0) !== 0x80) return 1;
  return length;
}
