import { characterLength } from '../lexer/decode';
import type { LineWords } from '../lexer/line-words';
import type { Columns } from '../report/report';

/**
 * Columns of a byte range: 1-based, first and one past the last, in UTF-16 units of the line decoded as
 * UTF-8, an invalid byte counting one. Worked out only when something is told of there.
 */
export function columnsOf(line: LineWords, from: number, to: number): Columns {
  if (!line.hasWide) return [from - line.start + 1, to - line.start + 1];
  return [unitsBefore(line, from) + 1, unitsBefore(line, to) + 1];
}

function unitsBefore(line: LineWords, end: number): number {
  let units = 0;
  for (let at = line.start; at < end;) {
    const length = characterLength(line.bytes, at, line.end);
    units += length === 4 ? 2 : 1;
    at += length;
  }
  return units;
}
