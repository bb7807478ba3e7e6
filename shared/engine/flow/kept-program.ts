import type { Grammar } from '../expressions/grammar';
import type { LineWords } from '../lexer/line-words';
import { readLine } from '../lexer/read-line';
import type { Statement } from '../statements/statement';
import { findMarks, type Mark } from './find-marks';
import type { NumberIndex } from './number-index';
import { labelKey, pairShapes, type LoopRange, type Shapes } from './pair-shapes';
import type { ProgramText } from './program-text';

/** Statements that are kept once read; beyond it they are read anew. */
const MOST_STATEMENTS = 20_000;

/** A kept text with what is known of its shape. */
export class KeptProgram {
  readonly shapes: Shapes;
  /** Lines with at least one word. */
  readonly blocks: number;
  /** The first of them. */
  readonly firstBlock: number;
  readonly statements = new Map<number, Statement>();
  private readonly numbers: NumberIndex;
  private readonly outer: Int32Array;
  /** Lines of program numbers and names, in order. */
  private readonly programs: readonly Mark[];
  private readonly lineOfProgram = new Map<string, number>();

  constructor(
    readonly text: ProgramText,
    grammar: Grammar,
  ) {
    const { marks, numbers, blocks, firstBlock } = findMarks(text, grammar);
    this.shapes = pairShapes(marks);
    this.outer = outerLoops(this.shapes.loops);
    this.numbers = numbers;
    this.blocks = blocks;
    this.firstBlock = firstBlock;
    this.programs = marks.filter(
      ({ flow }) => flow.kind === 'labelled' && flow.keyword === 'program',
    );
    for (const { line, flow } of this.programs) {
      const key = flow.kind === 'labelled' ? labelKey(flow.label) : undefined;
      if (key !== undefined && !this.lineOfProgram.has(key)) this.lineOfProgram.set(key, line);
    }
  }

  /** Reads a line into `words`, as the walk that streams does. */
  readLine(line: number, words: LineWords): void {
    words.bytes = this.text.bytes;
    words.ended = this.text.isEnded(line);
    readLine(words.bytes, this.text.startOf(line), words);
  }

  keep(line: number, statement: Statement): void {
    if (this.statements.size >= MOST_STATEMENTS) this.statements.clear();
    this.statements.set(line, statement);
  }

  /** The line of this label: a program's number or name. */
  findProgram(key: string): number | undefined {
    return this.lineOfProgram.get(key);
  }

  findSub(key: string): number | undefined {
    return this.shapes.subs.get(key);
  }

  /** The line of an N number in the program that holds `from`, looking ahead first. */
  findNumber(number: number, from: number): number | undefined {
    const at = lastUpTo(this.programs, from, ({ line }) => line);
    const first = this.programs[at]?.line ?? 1;
    const last = (this.programs[at + 1]?.line ?? this.text.lines + 1) - 1;
    return this.numbers.find(number, from, first, last);
  }

  /** Whether a jump would end up inside a loop that does not hold where it begins. */
  entersLoop(from: number, to: number): boolean {
    const { loops } = this.shapes;
    let at = lastUpTo(loops, to - 1, ({ begin }) => begin);
    // Loops stand beside or inside one another, so the innermost one that holds the target decides.
    while (at >= 0 && loops[at]!.end < to) at = this.outer[at]!;
    const loop = loops[at];
    return loop !== undefined && !(loop.begin <= from && from <= loop.end);
  }
}

/** For each loop the one that it stands in, or -1. */
function outerLoops(loops: readonly LoopRange[]): Int32Array {
  const outer = new Int32Array(loops.length);
  loops.forEach(({ begin }, at) => {
    let around = at - 1;
    while (around >= 0 && loops[around]!.end < begin) around = outer[around]!;
    outer[at] = around;
  });
  return outer;
}

/** Where the last entry stands whose line is not beyond `line`, or -1. */
function lastUpTo<Entry>(
  entries: readonly Entry[],
  line: number,
  lineOf: (entry: Entry) => number,
): number {
  let low = 0;
  let high = entries.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if (lineOf(entries[middle]!) <= line) low = middle + 1;
    else high = middle;
  }
  return low - 1;
}
