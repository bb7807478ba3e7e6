import type { Severity } from '#engine';
import type { LineRange } from './line-ranges';
import { countOf, gapsBetween, joinRanges } from './line-ranges';

/** What the layout needs of a finding. */
export interface FindingSpan {
  readonly id: string;
  readonly severity: Severity;
  readonly line: number;
  readonly endLine: number;
  /** Violating blocks from line to endLine. */
  readonly count: number;
}

/** A piece of the line report, from top to bottom. */
export type Segment =
  | { readonly kind: 'lines'; readonly from: number; readonly to: number }
  /** Folded lines on which nothing was found; `notShown` findings of the current filter lie in it. */
  | {
      readonly kind: 'quiet';
      readonly from: number;
      readonly to: number;
      readonly notShown: number;
    }
  /** Folded lines over which findings told above go on. */
  | {
      readonly kind: 'repeat';
      readonly from: number;
      readonly to: number;
      readonly severity: Severity;
      /** Indices of the findings that go on here. */
      readonly findings: readonly number[];
      /** Blocks still to come of the one finding whose first fold this is; null: say that it goes on. */
      readonly more: number | null;
    }
  /** A finding, below the line it stands at. */
  | { readonly kind: 'finding'; readonly line: number; readonly index: number };
export type Fold = Extract<Segment, { kind: 'quiet' | 'repeat' }>;

export interface RowsToLay {
  /** Lines of the program. */
  readonly lines: number;
  /** Findings to show, ordered by line. */
  readonly findings: readonly FindingSpan[];
  /** Lines of findings that the filter leaves out, ascending. */
  readonly leftOut: readonly number[];
  /** Ranges a person has unfolded. */
  readonly opened: readonly LineRange[];
}

/** The head of a program says what it is; it is never folded. */
const HEAD = 3;
/** Lines shown on either side of a finding's line. */
const AROUND = 1;
/** A fold of fewer lines would hide less than its own rule takes. */
const LEAST_FOLD = 3;

/** Folds what is quiet and sets every finding below its line. */
export function layRows(input: RowsToLay): readonly Segment[] {
  const { findings } = input;
  // An empty program has no line, yet a finding must stand somewhere: on line 1.
  const lines = Math.max(1, input.lines);
  const shown = shownRanges({ ...input, lines });
  const segments: Segment[] = [];
  const goingOn = trackRepeats(findings);
  const notShown = countWithin(input.leftOut);
  const gaps = gapsBetween(shown, lines);
  let next = 0;
  let gap = 0;
  const foldUpTo = (line: number): void => {
    for (; gap < gaps.length && gaps[gap]!.from < line; gap += 1) {
      segments.push(...foldsOf(gaps[gap]!, goingOn, notShown));
    }
  };
  for (const range of shown) {
    foldUpTo(range.from);
    let from = range.from;
    for (; next < findings.length; next += 1) {
      const line = Math.min(lines, Math.max(1, findings[next]!.line));
      if (range.to < line) break;
      if (from <= line) segments.push({ kind: 'lines', from, to: line });
      from = Math.max(from, line + 1);
      segments.push({ kind: 'finding', line, index: next });
    }
    if (from <= range.to) segments.push({ kind: 'lines', from, to: range.to });
  }
  foldUpTo(lines + 1);
  return segments;
}

function shownRanges({ lines, findings, opened }: RowsToLay): readonly LineRange[] {
  const wanted = joinRanges(
    [
      { from: 1, to: HEAD },
      { from: lines, to: lines },
      ...findings.map(({ line }) => ({ from: line - AROUND, to: line + AROUND })),
      ...opened,
    ],
    lines,
  );
  const slivers = gapsBetween(wanted, lines).filter((gap) => countOf(gap) < LEAST_FOLD);
  return slivers.length === 0 ? wanted : joinRanges([...wanted, ...slivers], lines);
}

interface GoingOn {
  readonly indices: readonly number[];
  readonly severity: Severity;
  readonly last: number;
  readonly more: number | null;
}

const GRAVITY: Readonly<Record<Severity, number>> = { stop: 0, hold: 1, note: 2 };

/** Asked for ascending lines: which findings told before `line` still go on there. */
function trackRepeats(findings: readonly FindingSpan[]): (line: number) => GoingOn | null {
  let active: number[] = [];
  let next = 0;
  const told = new Set<number>();
  return (line) => {
    for (; next < findings.length && findings[next]!.line < line; next += 1) active.push(next);
    active = active.filter(
      (index) => line <= findings[index]!.endLine && 1 < findings[index]!.count,
    );
    if (active.length === 0) return null;
    let severity: Severity = 'note';
    let last = 0;
    for (const index of active) {
      const finding = findings[index]!;
      if (GRAVITY[finding.severity] < GRAVITY[severity]) severity = finding.severity;
      last = Math.max(last, finding.endLine);
    }
    const only = active.length === 1 ? active[0]! : null;
    const more = only !== null && !told.has(only) ? findings[only]!.count - 1 : null;
    for (const index of active) told.add(index);
    return { indices: [...active], severity, last, more };
  };
}

/** Asked for ascending ranges: how many of the ascending lines lie within. */
function countWithin(lines: readonly number[]): (range: LineRange) => number {
  let next = 0;
  return ({ from, to }) => {
    while (next < lines.length && lines[next]! < from) next += 1;
    const first = next;
    while (next < lines.length && lines[next]! <= to) next += 1;
    return next - first;
  };
}

function foldsOf(
  gap: LineRange,
  goingOn: (line: number) => GoingOn | null,
  notShown: (range: LineRange) => number,
): Segment[] {
  const on = goingOn(gap.from);
  if (on === null) return [{ kind: 'quiet', ...gap, notShown: notShown(gap) }];
  const to = Math.min(gap.to, on.last);
  // A rest too short for a rule of its own stays with the stretch before it.
  const end = gap.to - to < LEAST_FOLD ? gap.to : to;
  const repeat: Segment = {
    kind: 'repeat',
    from: gap.from,
    to: end,
    severity: on.severity,
    findings: on.indices,
    more: on.more,
  };
  if (end === gap.to) return [repeat];
  const rest = { from: end + 1, to: gap.to };
  return [repeat, { kind: 'quiet', ...rest, notShown: notShown(rest) }];
}

/** Lines that the first, second, third press on a fold unfolds; after these, all of it. */
export const UNFOLD_STEPS = [20, 200, 2000] as const;

/** What a press on a fold opens: some lines from its top or its bottom, more with each press. */
export function openingOf(fold: LineRange, presses: number, from: 'top' | 'bottom'): LineRange {
  const step = UNFOLD_STEPS[presses];
  if (step === undefined || countOf(fold) <= step + LEAST_FOLD) {
    return { from: fold.from, to: fold.to };
  }
  return from === 'top'
    ? { from: fold.from, to: fold.from + step - 1 }
    : { from: fold.to - step + 1, to: fold.to };
}

/** A fold in words: what the rule across the report says. */
export function wordFold(fold: Fold): string {
  const lines = countOf(fold);
  if (fold.kind === 'quiet') {
    const plain = fold.notShown === 0;
    const what = `${grouped(lines)} ${plain ? 'quiet ' : ''}${lines === 1 ? 'line' : 'lines'}`;
    if (plain) return what;
    return `${what}, ${fold.notShown} ${fold.notShown === 1 ? 'finding' : 'findings'} not shown`;
  }
  if (fold.findings.length > 1) return `${fold.findings.length} findings go on`;
  if (fold.more === null) return 'same finding goes on';
  return `same finding, ${grouped(fold.more)} more ${fold.more === 1 ? 'block' : 'blocks'}`;
}

/** 58025 as 58 025: a narrow space that does not break, as the drawings have it. */
export function grouped(count: number): string {
  return String(count).replace(/\B(?=(\d{3})+$)/g, '\u202f');
}
