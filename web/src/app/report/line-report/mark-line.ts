import type { Columns, Severity } from '#engine';

/** A run of a line's text, underlined when `severity` is set. */
export interface Piece {
  readonly text: string;
  readonly severity: Severity | null;
}
export interface Underline {
  /** 1-based, first and one past the last, in UTF-16 units. */
  readonly columns: Columns;
  readonly severity: Severity;
}

/** The server cuts a line here; what is longer goes on unseen. */
export const LONGEST_LINE_SHOWN = 2000;

const GRAVITY: readonly Severity[] = ['note', 'hold', 'stop'];

/** Cuts a line where underlines begin and end; where two lie over each other the graver is drawn. */
export function markLine(text: string, underlines: readonly Underline[]): readonly Piece[] {
  if (underlines.length === 0) return [{ text: visible(text), severity: null }];
  const cuts = new Set([0, text.length]);
  const spans = underlines.map(({ columns: [first, end], severity }) => {
    const from = Math.min(text.length, Math.max(0, first - 1));
    const to = Math.min(text.length, Math.max(from, end - 1));
    cuts.add(from).add(to);
    return { from, to, gravity: GRAVITY.indexOf(severity) };
  });
  const edges = [...cuts].sort((a, b) => a - b);
  const pieces: Piece[] = [];
  for (let at = 0; at + 1 < edges.length; at += 1) {
    const from = edges[at]!;
    const to = edges[at + 1]!;
    let gravity = -1;
    for (const span of spans) {
      if (span.from <= from && to <= span.to) gravity = Math.max(gravity, span.gravity);
    }
    pieces.push({ text: visible(text.slice(from, to)), severity: GRAVITY[gravity] ?? null });
  }
  return pieces.length > 0 ? pieces : [{ text: '', severity: null }];
}

/**
 * Control characters as their own pictures (U+2400 …), one for one, so that columns stay true and a
 * stray character can be seen. A tab stays: it is drawn as room.
 */
export function visible(text: string): string {
  // eslint-disable-next-line no-control-regex -- control characters are just what is meant
  return text.replace(/[\u0000-\u0008\u000a-\u001f\u007f]/g, (character) =>
    String.fromCharCode(character === '\u007f' ? 0x2421 : 0x2400 + character.charCodeAt(0)),
  );
}
