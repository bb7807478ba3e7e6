import type { Segment } from './line-rows';

export const LINE_HEIGHT = 24;
export const FOLD_HEIGHT = 30;
/** A finding before it has been measured: sentence, advice and its surroundings. */
export const USUAL_FINDING_HEIGHT = 84;

/** One row of the report as drawn, `top` in the report's own pixels. */
export interface Row {
  /** Index of the segment it belongs to. */
  readonly segment: number;
  /** The line, for rows of a `lines` segment; the line a finding stands at or a fold begins with. */
  readonly line: number;
  readonly top: number;
  readonly height: number;
}

/** All rows stacked: only segments are kept, so a million lines cost no more than their folds. */
export interface RowStack {
  readonly segments: readonly Segment[];
  /** tops[i] is where segment i begins; the last entry is the whole height. */
  readonly tops: Float64Array;
}

/** `findingHeight` gives the measured height of a finding by its index, or undefined. */
export function stackRows(
  segments: readonly Segment[],
  findingHeight: (index: number) => number | undefined,
): RowStack {
  const tops = new Float64Array(segments.length + 1);
  segments.forEach((segment, index) => {
    tops[index + 1] = tops[index]! + heightOf(segment, findingHeight);
  });
  return { segments, tops };
}

export function totalOf(stack: RowStack): number {
  return stack.tops[stack.segments.length]!;
}

/** The rows that touch the window from `top`, `view` high. */
export function rowsWithin(stack: RowStack, top: number, view: number): readonly Row[] {
  const rows: Row[] = [];
  const bottom = top + view;
  for (let at = segmentAt(stack, top); at < stack.segments.length; at += 1) {
    const begin = stack.tops[at]!;
    if (bottom <= begin) break;
    const segment = stack.segments[at]!;
    if (segment.kind === 'lines') {
      const first = segment.from + Math.max(0, Math.floor((top - begin) / LINE_HEIGHT));
      const last = Math.min(
        segment.to,
        segment.from + Math.ceil((bottom - begin) / LINE_HEIGHT) - 1,
      );
      for (let line = first; line <= last; line += 1) {
        rows.push({
          segment: at,
          line,
          top: begin + (line - segment.from) * LINE_HEIGHT,
          height: LINE_HEIGHT,
        });
      }
    } else {
      const line = segment.kind === 'finding' ? segment.line : segment.from;
      rows.push({ segment: at, line, top: begin, height: stack.tops[at + 1]! - begin });
    }
  }
  return rows;
}

/** Where a line is, or the fold that holds it. */
export function placeOfLine(
  stack: RowStack,
  line: number,
): { readonly segment: number; readonly top: number } | null {
  let low = 0;
  let high = stack.segments.length - 1;
  while (low <= high) {
    const middle = (low + high) >> 1;
    const segment = stack.segments[middle]!;
    const from = segment.kind === 'finding' ? segment.line + 0.5 : segment.from;
    const to = segment.kind === 'finding' ? segment.line + 0.5 : segment.to;
    if (line < from) high = middle - 1;
    else if (to < line) low = middle + 1;
    else {
      const below = segment.kind === 'lines' ? (line - segment.from) * LINE_HEIGHT : 0;
      return { segment: middle, top: stack.tops[middle]! + below };
    }
  }
  return null;
}

/** Where a finding is, by its index. */
export function placeOfFinding(
  stack: RowStack,
  index: number,
): { readonly segment: number; readonly top: number; readonly height: number } | null {
  const segment = stack.segments.findIndex(
    (each) => each.kind === 'finding' && each.index === index,
  );
  if (segment < 0) return null;
  const top = stack.tops[segment]!;
  return { segment, top, height: stack.tops[segment + 1]! - top };
}

/** The segment that covers a pixel: the last one that begins at or above it. */
function segmentAt(stack: RowStack, top: number): number {
  let low = 0;
  let high = stack.segments.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (stack.tops[middle]! <= top) low = middle;
    else high = middle - 1;
  }
  return Math.max(0, low);
}

function heightOf(segment: Segment, findingHeight: (index: number) => number | undefined): number {
  if (segment.kind === 'lines') return (segment.to - segment.from + 1) * LINE_HEIGHT;
  if (segment.kind === 'finding') return findingHeight(segment.index) ?? USUAL_FINDING_HEIGHT;
  return FOLD_HEIGHT;
}
