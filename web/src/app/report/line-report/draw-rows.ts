import type { ShownFinding } from '../shown-finding';
import { formatCount } from '../../ui/count';
import type { Fold, Segment } from './line-rows';
import { wordFold } from './line-rows';
import type { Piece, Underline } from './mark-line';
import { LONGEST_LINE_SHOWN, markLine } from './mark-line';
import type { Row, RowStack } from './stack-rows';

/** A row ready to be drawn; `key` stays with it while others come and go. */
export type DrawnRow =
  | {
      readonly kind: 'line';
      readonly key: string;
      readonly line: number;
      readonly number: string;
      /** null while the text is being fetched. */
      readonly pieces: readonly Piece[] | null;
      /** Whether the line goes on past what the server hands out. */
      readonly cut: boolean;
    }
  | {
      readonly kind: 'fold';
      readonly key: string;
      readonly fold: Fold;
      readonly range: string;
      readonly words: string;
      readonly tone: string;
      /** The whole button in words. */
      readonly label: string;
    }
  | {
      readonly kind: 'finding';
      readonly key: string;
      readonly shown: ShownFinding;
      /** Room it takes, px; null while it has not been measured. */
      readonly height: number | null;
    };

export interface RowsToDraw {
  readonly stack: RowStack;
  readonly rows: readonly Row[];
  readonly findings: readonly ShownFinding[];
  readonly underlines: ReadonlyMap<number, readonly Underline[]>;
  readonly text: (line: number) => string | undefined;
  readonly isMeasured: (id: string) => boolean;
}

export function drawRows(input: RowsToDraw): readonly DrawnRow[] {
  return input.rows.map((row) => drawRow(input, row, input.stack.segments[row.segment]!));
}

/** Columns to underline, by line. */
export function underlinesOf(
  findings: readonly ShownFinding[],
): ReadonlyMap<number, readonly Underline[]> {
  const byLine = new Map<number, Underline[]>();
  for (const { line, severity, finding } of findings) {
    if (!finding.columns) continue;
    const list = byLine.get(line) ?? [];
    list.push({ columns: finding.columns, severity });
    byLine.set(line, list);
  }
  return byLine;
}

function drawRow(input: RowsToDraw, row: Row, segment: Segment): DrawnRow {
  if (segment.kind === 'finding') {
    const shown = input.findings[segment.index]!;
    const height = input.isMeasured(shown.id) ? row.height : null;
    return { kind: 'finding', key: `f${shown.id}`, shown, height };
  }
  if (segment.kind === 'lines') {
    const text = input.text(row.line);
    return {
      kind: 'line',
      key: `l${row.line}`,
      line: row.line,
      number: formatCount(row.line),
      pieces: text === undefined ? null : markLine(text, input.underlines.get(row.line) ?? []),
      cut: text !== undefined && LONGEST_LINE_SHOWN <= text.length,
    };
  }
  const range = wordRange(segment.from, segment.to);
  const words = wordFold(segment);
  return {
    kind: 'fold',
    key: `z${segment.to}`,
    fold: segment,
    range,
    words,
    tone: segment.kind === 'quiet' ? 'quiet' : segment.severity,
    label: `Lines ${range}: ${words}. Unfold.`,
  };
}

function wordRange(from: number, to: number): string {
  return from === to ? formatCount(from) : `${formatCount(from)}–${formatCount(to)}`;
}
