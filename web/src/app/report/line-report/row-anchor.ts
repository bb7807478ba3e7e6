import type { ShownFinding } from '../shown-finding';
import { openingOf } from './line-rows';
import type { LineRange } from './line-ranges';
import type { RowStack } from './stack-rows';
import { placeOfFinding, placeOfLine, rowsWithin } from './stack-rows';

/**
 * The row that must not move on the screen while others are measured, folded or unfolded around it:
 * a line or a finding, and how far below the window's upper edge it stands (px).
 */
export interface RowAnchor {
  readonly line: number;
  /** A finding by its id; null: the line itself. */
  readonly finding: string | null;
  readonly below: number;
}

/** The first row in the window. */
export function anchorAt(
  stack: RowStack,
  top: number,
  findings: readonly ShownFinding[],
): RowAnchor | null {
  const [row] = rowsWithin(stack, top, 1);
  if (!row) return null;
  const segment = stack.segments[row.segment]!;
  const finding = segment.kind === 'finding' ? (findings[segment.index]?.id ?? null) : null;
  return { line: row.line, finding, below: row.top - top };
}

/** Where the window must begin so that the anchor stands where it stood; null: it is gone. */
export function topFor(
  stack: RowStack,
  anchor: RowAnchor,
  indexOf: ReadonlyMap<string, number>,
): number | null {
  const index = anchor.finding === null ? undefined : indexOf.get(anchor.finding);
  const place =
    (index === undefined ? null : placeOfFinding(stack, index)) ?? placeOfLine(stack, anchor.line);
  return place === null ? null : place.top - anchor.below;
}

/** Lines shown on either side of a line that somebody asked for. */
const AROUND_ASKED = 4;
/** What must be open so that a line can be seen with its surroundings. */
export function openingAround(line: number): LineRange {
  return { from: line - AROUND_ASKED, to: line + AROUND_ASKED };
}

/** Unfolding by hand: how often each fold was pressed, by the line it ends or begins at. */
export class FoldPresses {
  readonly #presses = new Map<string, number>();

  /** What the next press opens; each press on what is left of a fold opens more. */
  press(fold: LineRange, from: 'top' | 'bottom'): LineRange {
    // Opening from the top leaves a fold with the same last line, from the bottom with the same first.
    const key = from === 'top' ? `t${fold.to}` : `b${fold.from}`;
    const presses = this.#presses.get(key) ?? 0;
    this.#presses.set(key, presses + 1);
    return openingOf(fold, presses, from);
  }
  clear(): void {
    this.#presses.clear();
  }
}
