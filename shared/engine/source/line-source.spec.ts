import { expect, test } from 'vitest';
import { LineSource, LONGEST_LINE, type LineReader } from './line-source';

/** Gathers whole lines as text; `~` marks text with no line end behind it. */
function linesOf(chunks: readonly (string | Uint8Array)[]): string[] {
  const lines: string[] = [];
  const decode = (bytes: Uint8Array) => new TextDecoder('utf-8', { ignoreBOM: true }).decode(bytes);
  const reader: LineReader = {
    readLines(bytes, at, end) {
      const text = decode(bytes.subarray(at, end));
      expect(text).toMatch(/[\n\r]$/);
      lines.push(...text.split(/\r\n|\n|\r/).slice(0, -1));
    },
    readOverlong: (_bytes, length) => lines.push(`<${length}>`),
    readLast: (bytes, end) => lines.push(`~${decode(bytes.subarray(0, end - 1))}`),
  };
  const source = new LineSource(reader);
  for (const chunk of chunks)
    source.push(typeof chunk === 'string' ? new TextEncoder().encode(chunk) : chunk);
  source.end();
  return lines;
}

test.each<[string, readonly string[], readonly string[]]>([
  ['LF', ['a\nb\n'], ['a', 'b']],
  ['CRLF', ['a\r\nb\r\n'], ['a', 'b']],
  ['lone CR', ['a\rb\r'], ['a', 'b']],
  ['all three, and blank lines', ['a\n\rb\r\n\n\r\r\nc\n'], ['a', '', 'b', '', '', '', 'c']],
  ['no last line end', ['a\nb'], ['a', '~b']],
  ['nothing', [''], []],
  ['nothing at all', [], []],
  ['CRLF across a chunk border', ['a\r', '\nb\n'], ['a', 'b']],
  ['CR, then a line that begins with LF of its own', ['a\r', '\n\nb\n'], ['a', '', 'b']],
  ['a line across three chunks', ['G0', ' X1', '0\nM30\n'], ['G0 X10', 'M30']],
  ['a CRLF behind a carried line', ['ab', 'c\r', '\nd\n'], ['abc', 'd']],
  ['empty chunks between', ['a', '', '\r', '', '\n', '', 'b\n'], ['a', 'b']],
  ['a byte-order mark', ['\ufeffa\n'], ['a']],
  ['a mark and nothing else', ['\ufeff'], []],
  ['a mark that is not at the start', ['a\n\ufeffb\n'], ['a', '\ufeffb']],
  ['next-line characters of other worlds', ['a\u2028b\u0085c\n'], ['a\u2028b\u0085c']],
])('reads %s', (_what, chunks, lines) => {
  expect(linesOf(chunks)).toEqual(lines);
});

test('takes a byte-order mark in pieces, and gives back what only looked like one', () => {
  const bytes = (...values: number[]) => Uint8Array.from(values);
  expect(linesOf([bytes(0xef), bytes(0xbb), bytes(0xbf), 'a\n'])).toEqual(['a']);
  expect(linesOf([bytes(0xef, 0xbb), 'a\n'])[0]).toHaveLength(2);
  expect(linesOf([bytes(0xef)])).toEqual(['~\ufffd']);
});

test('keeps at most so much of a line that crosses chunks, and counts the rest', () => {
  const piece = 'X'.repeat(10_000);
  expect(linesOf([...Array<string>(30).fill(piece), '\nM30\n'])).toEqual(['<300000>', 'M30']);
  expect(linesOf(Array<string>(30).fill(piece))).toEqual(['<300000>']);
  const most = 'X'.repeat(LONGEST_LINE);
  expect(linesOf([most.slice(0, 5), `${most.slice(5)}\n`])).toEqual([most]);
});
