import type { Grammar } from '../expressions/grammar';
import { KeptProgram } from './kept-program';
import { keepText } from './program-text';

interface NamedText {
  readonly name: string;
  readonly text: string;
}

/** The subprograms that the setup gives, read when they are first called. */
export class Library {
  private readonly texts = new Map<string, NamedText>();
  private readonly kept = new Map<string, KeptProgram>();

  constructor(
    subprograms: readonly NamedText[],
    private readonly grammar: Grammar,
  ) {
    for (const each of subprograms) this.texts.set(keyOfName(each.name), each);
  }

  /** `key` as labels have it: '100' or '<name>'. */
  find(key: string): KeptProgram | undefined {
    const kept = this.kept.get(key);
    if (kept) return kept;
    const given = this.texts.get(key);
    if (!given) return undefined;
    const program = new KeptProgram(keepText(given.name, given.text), this.grammar);
    this.kept.set(key, program);
    return program;
  }
}

/** `O0100`, `100.nc` and `o100.ngc` are program 100; any other name is `<name>`. */
export function keyOfName(name: string): string {
  const base = name
    .replace(/\.[^.]*$/, '')
    .replace(/[ \t]/g, '')
    .toLowerCase();
  const number = /^o?(\d+)$/.exec(base)?.[1];
  return number === undefined ? `<${base.replace(/^o?<([^>]*)>$/, '$1')}>` : String(Number(number));
}
