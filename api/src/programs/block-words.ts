import { parseLine } from 'gcode-parser';
import type { BlockWords } from '#contracts';

/**
 * The words of one block for a person who asks what stands there. The tokeniser is lax: it passes over
 * expressions, parameters and anything it does not know. What it passed over is told by `isPlain`, so that
 * nobody takes its words for the whole block; checks never rest on it.
 */
export function readBlockWords(line: number, text: string): BlockWords {
  const { words, comments = [] } = parseLine(text);
  return {
    line,
    words: words.flatMap(([letter, value]) =>
      typeof value === 'number' ? [{ letter, value }] : [],
    ),
    comments: [...comments],
    isPlain: PLAIN_BLOCK.test(withoutComments(text)),
  };
}

/** Block delete, a line number, then letters each with a decimal number; or a lone percent sign. */
const PLAIN_BLOCK = /^(\/?(N\d+)?([A-MO-Z][+-]?(\d+\.?\d*|\.\d+))*|%)$/i;

function withoutComments(text: string): string {
  return text
    .replace(/\([^()]*\)/g, '')
    .replace(/;.*$/, '')
    .replace(/\s/g, '');
}
