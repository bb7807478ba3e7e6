import type { ValidSetup } from '#contracts';
import { setupSchema } from '#contracts';
import type { WrongFact } from '../ui/facts/fact-form';
import { wordIssues } from '../ui/facts/wrong-facts';

export type ReadSetup =
  | { readonly kind: 'no-json'; readonly sentence: string }
  | { readonly kind: 'wrong'; readonly wrong: readonly WrongFact[] }
  | { readonly kind: 'setup'; readonly setup: ValidSetup };

/** Reads a setup file: what it holds, or everything that is wrong in it, each with its path. */
export function readSetup(text: string): ReadSetup {
  let document: unknown;
  try {
    document = JSON.parse(text);
  } catch (error) {
    if (!(error instanceof SyntaxError)) throw error;
    return { kind: 'no-json', sentence: wordSyntax(error, text) };
  }
  const result = setupSchema.safeParse(document);
  return result.success
    ? { kind: 'setup', setup: result.data }
    : { kind: 'wrong', wrong: wordIssues(result.error.issues) };
}

function wordSyntax(error: SyntaxError, text: string): string {
  if (text.trim() === '') return 'The file is empty.';
  const position = Number(/position (\d+)/.exec(error.message)?.[1] ?? Number.NaN);
  if (Number.isNaN(position)) {
    return 'The file breaks off or is no JSON: a setup file is one JSON document.';
  }
  const before = text.slice(0, position);
  const line = before.split('\n').length;
  const column = position - before.lastIndexOf('\n');
  return `The file is no JSON: it cannot be read on from line ${line}, column ${column}. A comma, a quote or a bracket is missing or one too many there.`;
}
