/** Lines from `from` to `to`, both included, counted from 1. */
export interface LineRange {
  readonly from: number;
  readonly to: number;
}

/** Adds ranges to a list, joined where they touch: sorted, apart, and within 1 … `last`. */
export function joinRanges(ranges: readonly LineRange[], last: number): readonly LineRange[] {
  const sorted = ranges
    .map(({ from, to }) => ({ from: Math.max(1, from), to: Math.min(last, to) }))
    .filter(({ from, to }) => from <= to)
    .sort((a, b) => a.from - b.from);
  const joined: { from: number; to: number }[] = [];
  for (const range of sorted) {
    const before = joined.at(-1);
    if (before && range.from <= before.to + 1) before.to = Math.max(before.to, range.to);
    else joined.push({ ...range });
  }
  return joined;
}

/** What lies between the ranges of a joined list, up to `last`. */
export function gapsBetween(joined: readonly LineRange[], last: number): readonly LineRange[] {
  const gaps: LineRange[] = [];
  let next = 1;
  for (const range of joined) {
    if (next < range.from) gaps.push({ from: next, to: range.from - 1 });
    next = range.to + 1;
  }
  if (next <= last) gaps.push({ from: next, to: last });
  return gaps;
}

export function countOf(range: LineRange): number {
  return range.to - range.from + 1;
}
