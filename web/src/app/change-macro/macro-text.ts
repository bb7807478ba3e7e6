/** Lines of a text as an editor counts them: LF, CRLF and a lone CR end a line. */
export function linesOf(text: string): readonly string[] {
  return text.split(/\r\n|\r|\n/);
}

/** Lines to read: what follows the last line end is a line only if something stands there. */
export function linesToRead(text: string): readonly string[] {
  const lines = linesOf(text);
  return lines.at(-1) === '' ? lines.slice(0, -1) : lines;
}

/**
 * What was typed, with the line ends the macro had: a text area only knows LF, and a controller may
 * only know CRLF. A text whose ends are mixed keeps the kind of its first line.
 */
export function keepLineEnds(typed: string, before: string): string {
  const end = /\r\n|\r|\n/.exec(before)?.[0] ?? '\n';
  return typed.replace(/\r\n|\r|\n/g, end);
}

/** How two texts differ, short: the lines from the first to the last that changed. */
export function changedLines(
  was: string,
  is: string,
): { readonly from: number; readonly removed: number; readonly added: number } | null {
  const [before, after] = [linesOf(was), linesOf(is)];
  let start = 0;
  const shorter = Math.min(before.length, after.length);
  while (start < shorter && before[start] === after[start]) start += 1;
  let end = 0;
  while (end < shorter - start && before.at(-1 - end) === after.at(-1 - end)) end += 1;
  const removed = before.length - start - end;
  const added = after.length - start - end;
  return removed === 0 && added === 0 ? null : { from: start + 1, removed, added };
}

/** The same, in a sentence. */
export function wordChangedLines(was: string, is: string): string {
  const changed = changedLines(was, is);
  if (!changed) return 'No line changed.';
  const { from, removed, added } = changed;
  const lines = (count: number) => `${count} ${count === 1 ? 'line' : 'lines'}`;
  if (removed === 0) return `From line ${from}: ${lines(added)} added.`;
  if (added === 0) return `From line ${from}: ${lines(removed)} taken out.`;
  return `From line ${from}: ${lines(removed)} replaced by ${lines(added)}.`;
}
