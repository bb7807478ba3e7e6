import type { Grammar } from '../expressions/grammar';
import { CLASS_OF, BLANK, COLON, SLASH } from '../lexer/bytes';
import { LineWords } from '../lexer/line-words';
import { readLine } from '../lexer/read-line';
import { readStatement } from '../statements/read-statement';
import type { Flow } from '../statements/statement';
import { NumberIndex } from './number-index';
import type { ProgramText } from './program-text';

/** What shapes a text: where programs, subroutines, conditions and loops begin and end. */
export type Shape = Exclude<Flow, { readonly kind: 'goto' | 'then' }>;

/** One of them, at its line. */
export interface Mark {
  readonly line: number;
  readonly flow: Shape;
}

export interface Marks {
  /** In the order of their lines. */
  readonly marks: readonly Mark[];
  readonly numbers: NumberIndex;
  /** Lines with at least one word. */
  readonly blocks: number;
  /** The first of them; one past the last line where there is none. */
  readonly firstBlock: number;
}

const LETTER_N = 13;
/** O, and the letters that WHILE, DO and END begin with, in lower case. */
const FIRST_LETTERS: readonly number[] = [111, 119, 100, 101];

/** Reads a whole text once for what shapes it; nothing is worked out. */
export function findMarks(text: ProgramText, grammar: Grammar): Marks {
  const line = new LineWords();
  line.bytes = text.bytes;
  const numbers = new NumberIndex(text.lines);
  const marks: Mark[] = [];
  let blocks = 0;
  let firstBlock = text.lines + 1;
  const noteBlock = (at: number) => {
    if (blocks++ === 0) firstBlock = at;
  };
  for (let number = 1; number <= text.lines; number++) {
    if (text.overlongLength(number) > 0) {
      noteBlock(number);
      continue;
    }
    readLine(text.bytes, text.startOf(number), line);
    if (line.count === 0 && !line.isRare) continue;
    if (line.count > 0 || line.faults.length > 0 || line.isStatement) noteBlock(number);
    if (line.count > 0 && line.letters[0] === LETTER_N) numbers.note(line.values[0]!, number);
    if (!line.isStatement || !mayShape(line)) continue;
    const { flow } = readStatement(line, grammar);
    if (flow && !line.isVoid && flow.kind !== 'goto' && flow.kind !== 'then')
      marks.push({ line: number, flow });
  }
  return { marks, numbers: numbers.sort(), blocks, firstBlock };
}

/** Whether the first letter behind slash and line number can begin what shapes a text. */
function mayShape({ bytes, start }: LineWords): boolean {
  let at = start;
  while (CLASS_OF[bytes[at]!] === BLANK || CLASS_OF[bytes[at]!] === SLASH) at++;
  while (isDigit(bytes[at]!)) at++;
  while (CLASS_OF[bytes[at]!] === BLANK) at++;
  if ((bytes[at]! | 32) === LOWER_N) {
    at++;
    while (CLASS_OF[bytes[at]!] === BLANK || isDigit(bytes[at]!)) at++;
    while (CLASS_OF[bytes[at]!] === SLASH || CLASS_OF[bytes[at]!] === BLANK || isDigit(bytes[at]!))
      at++;
  }
  return CLASS_OF[bytes[at]!] === COLON || FIRST_LETTERS.includes(bytes[at]! | 32);
}
const LOWER_N = 110;
const isDigit = (byte: number): boolean => 48 <= byte && byte <= 57;
