import { Block } from '../blocks/block';
import { addCode, parseBlock, refuseLineComments } from '../blocks/parse-block';
import { codeName, groupTables } from '../blocks/code-groups';
import { LineWords } from '../lexer/line-words';
import { readLine } from '../lexer/read-line';
import type { Shop } from '../shop/shop';
import { readStatement } from '../statements/read-statement';
import type { Statement } from '../statements/statement';
import { LONGEST_LINE, LineSource, type LineReader } from '../source/line-source';
import { findDeclared } from './declared-codes';
import { endProgram } from './ends';
import type { Observer, Place } from './events';
import { carryOut } from './interpreter';
import { QuietLines } from './quiet/quiet-lines';
import { openRun } from './open-run';
import { tellProblem, type Run } from './run';
import { carryOutUnknown } from './unknown-codes';
import { forgetUnknownWords } from './unknown-position';
import { workOut } from './work-out';

export interface WalkOptions {
  /** Whether blocks with a `/` in front are skipped. */
  readonly skips: boolean;
  /** For tests: reads every line word by word and tells every motion. */
  readonly isAlwaysLoud?: boolean | undefined;
}

/** One reading of a program: bytes in, events out. */
export class Walk implements LineReader {
  /** Lines begun so far. */
  linesRead = 0;
  /** Lines with at least one word, run or not. */
  blocks = 0;
  /** The first block with a `/` in front. */
  firstSkippable: Place | undefined;
  private readonly source = new LineSource(this);
  private readonly words = new LineWords();
  private readonly block = new Block(this.words);
  private readonly run: Run;
  private readonly isAlwaysLoud: boolean;
  private readonly builtIn: ReturnType<typeof groupTables>;
  private readonly longestBlock: number;
  private readonly quietLines: QuietLines;
  private isDone = false;
  /** Whether a comment stood on a line of its own since the last block, which is told with the next. */
  private isCommentWaiting = false;
  private isFramed = false;
  private isTextAfterTold = false;
  /** Whether any block said more than a number. */
  private isEmpty = true;
  private lastWritten = 1;

  constructor(
    shop: Shop,
    observers: readonly Observer[],
    private readonly options: WalkOptions,
  ) {
    this.run = openRun(shop, this.block, observers);
    this.quietLines = new QuietLines(this.run, this.run.tell.quiet);
    this.isAlwaysLoud = options.isAlwaysLoud === true;
    this.builtIn = groupTables(this.run.dialect.isStrict);
    this.longestBlock = shop.setup.controller.longestBlock;
  }

  /** Whether some motion was carried out at the bounds of what is not known. */
  get movesAtBounds(): boolean {
    return this.run.movesAtBounds;
  }

  push(bytes: Uint8Array): void {
    this.source.push(bytes);
  }

  /** Tells what is only known once the text is over. */
  endOfText(): void {
    this.source.end();
    this.run.tell.quiet.flush();
    const { run } = this;
    const { machine, tell, endedBy } = run;
    this.words.clear();
    machine.line = this.lastWritten;
    const place = machine.place();
    if (this.isEmpty) tell.problem({ problem: 'empty-program', place, facts: {} });
    else if (endedBy === '' && this.isFramed)
      tell.problem({ problem: 'cut-short', place, facts: { reason: 'percent' } });
    if (!this.isEmpty && (endedBy === '' || endedBy === '%'))
      tell.problem({ problem: 'missing-end', place, facts: { percent: endedBy === '%' } });
    if (endedBy === '') tell.programEnd({ code: 'end-of-text', place });
  }

  readLines(bytes: Uint8Array, at: number, end: number): void {
    const { words } = this;
    words.bytes = bytes;
    this.quietLines.forget();
    while (at < end) {
      if (!this.isLoud && this.quietLines.isOpen()) {
        at = this.readQuietLines(bytes, at, end);
        if (at >= end) break;
      }
      this.run.tell.quiet.flush();
      const next = readLine(bytes, at, words);
      this.linesRead++;
      if (words.end - at > LONGEST_LINE) this.tellOverlong(words.end - at);
      else this.takeLine();
      at = next;
    }
  }

  private readQuietLines(bytes: Uint8Array, at: number, end: number): number {
    const { quietLines, linesRead } = this;
    const next = quietLines.read(bytes, at, end, linesRead);
    this.linesRead += quietLines.lines;
    this.blocks += quietLines.blocks;
    if (quietLines.lastWritten > 0) this.lastWritten = linesRead + quietLines.lastWritten;
    if (quietLines.blocks > 0) this.isEmpty = false;
    return next;
  }

  /** Whether the next line is to be read word by word whatever it holds: a block waits for it, or none may follow. */
  private get isLoud(): boolean {
    return this.isDone || this.isCommentWaiting || !this.words.ended || this.isAlwaysLoud;
  }

  readOverlong(_bytes: Uint8Array, length: number): void {
    this.linesRead++;
    this.tellOverlong(length);
  }

  readLast(bytes: Uint8Array, end: number): void {
    this.words.ended = false;
    this.readLines(bytes, 0, end);
  }

  private tellOverlong(length: number): void {
    const { words, run } = this;
    words.clear();
    this.lastWritten = run.machine.line = this.linesRead;
    this.blocks++;
    this.isEmpty = false;
    if (this.isDone) return;
    const facts = { reason: 'too-long', length, most: LONGEST_LINE };
    tellProblem(run, 'unreadable-block', undefined, facts);
    run.tell.block();
  }

  private takeLine(): void {
    const { words, run } = this;
    if (words.end === words.start) return;
    run.machine.line = this.linesRead;
    this.lastWritten = this.linesRead;
    if (words.isRare) this.takeRareLine();
    else if (words.count > 0) {
      this.blocks++;
      if (this.isDone) return this.tellTextAfter();
      parseBlock(words, this.block, run.dialect);
      this.isEmpty = false;
      // Sorting may find conflicts, and codes that no table places.
      if (words.isRare || this.block.others.length > 0) this.finishRareBlock();
      else this.finishBlock();
    }
    if (words.end - words.start > this.longestBlock && !this.isDone) this.tellLong();
  }

  private finishBlock(): void {
    const { run } = this;
    carryOut(run);
    run.tell.block();
    this.isCommentWaiting = false;
    if (run.endedBy !== '') this.isDone = true;
  }

  private takeRareLine(): void {
    const { words, run } = this;
    const statement = words.isStatement ? readStatement(words, run.grammar) : undefined;
    if (words.percentAt >= 0) this.takePercent();
    if (words.comments.length > 0 && run.dialect.isStrict) refuseLineComments(words);
    const hasWords = words.count > 0 || words.faults.length > 0 || words.isStatement;
    if (hasWords) this.takeRareBlock(statement);
    else if (words.comments.length > 0 && !this.isDone) {
      this.tellComments();
      this.isCommentWaiting = true;
    }
  }

  private takeRareBlock(statement: Statement | undefined): void {
    const { words, run } = this;
    this.blocks++;
    if (this.isDone) return this.tellTextAfter();
    if (words.skippable) {
      const at = words.skipAt - words.start;
      this.firstSkippable ??= run.machine.place({ bytes: [at, at + 1] });
      if (this.options.skips) return;
    }
    if (statement) this.takeStatement(statement);
    parseBlock(words, this.block, run.dialect);
    if (words.count > 0 || words.faults.length > 0) this.isEmpty = false;
    this.finishRareBlock();
  }

  /** What computes is worked out into the block's words; what steers is named, and not followed yet. */
  private takeStatement(statement: Statement): void {
    const { words, run } = this;
    const { flow, settings } = statement;
    const isLabel = flow?.kind === 'labelled' && flow.keyword === 'program';
    if (settings.length > 0) this.isEmpty = false;
    if (flow && !isLabel)
      words.fault({
        problem: 'not-modelled',
        from: words.start + flow.from,
        to: words.start + flow.to,
        facts: { what: words.text(words.start + flow.from, words.start + flow.to), reason: 'flow' },
        voids: true,
      });
    else if (!words.isVoid) workOut(run, statement);
    // Of a block that is not carried out, words without a value would only be found faulty again.
    if (words.isVoid) words.count = 0;
  }

  private finishRareBlock(): void {
    const { words, run } = this;
    if (this.block.others.length > 0) this.resolveOthers();
    if (words.faults.length > 0) this.tellFaults();
    if (words.comments.length > 0) this.tellComments();
    if (words.isVoid) {
      forgetUnknownWords(run);
      run.tell.block();
    } else this.finishBlock();
  }

  /** A declared code whose conditions do not hold here keeps its built-in meaning. */
  private resolveOthers(): void {
    const { run, block, builtIn } = this;
    const others = block.others.splice(0);
    for (const other of others) {
      const { letter, tenths, word } = other;
      if (findDeclared(run, codeName(letter, tenths))) block.others.push(other);
      else {
        const group = (letter === 'G' ? builtIn.g : builtIn.m)[tenths] ?? -1;
        if (group >= 0) addCode(block, group, tenths, word, run.dialect.isStrict);
        else {
          block.others.push(other);
          carryOutUnknown(run, other);
        }
      }
    }
  }

  /** The opening sign may follow comments; any later one ends the program. */
  private takePercent(): void {
    if (this.isDone) return;
    const { run } = this;
    if (!this.isFramed && this.blocks === 0) {
      this.isFramed = true;
      return;
    }
    if (!this.isFramed && run.dialect.isStrict)
      tellProblem(
        run,
        'unreadable-block',
        { bytes: this.percentBytes() },
        { reason: 'percent', what: '%' },
      );
    endProgram(run, '%');
    this.isDone = true;
  }

  private percentBytes(): readonly [number, number] {
    const from = this.words.percentAt - this.words.start;
    return [from, from + 1];
  }

  private tellLong(): void {
    const { words, run } = this;
    const length = words.end - words.start;
    tellProblem(
      run,
      'long-block',
      { letters: 'none' },
      { length, limit: this.longestBlock, by: length },
    );
  }

  private tellTextAfter(): void {
    // What stands behind an alarm is not behind the program's end.
    if (this.isTextAfterTold || this.run.callsMade || this.run.endedBy === 'alarm') return;
    this.isTextAfterTold = true;
    tellProblem(this.run, 'text-after-end', undefined, {});
  }

  private tellFaults(): void {
    const { words, run } = this;
    for (const { problem, from, to, facts, voids } of words.faults) {
      const bytes = [from - words.start, to - words.start] as const;
      // A last line that breaks off where a word should go on is a file that was cut.
      const isCut = !words.ended && voids && to >= words.end && problem === 'unreadable-block';
      if (isCut) tellProblem(run, 'cut-short', { bytes }, { ...facts, reason: 'last-block' });
      else tellProblem(run, problem, { bytes }, facts);
    }
  }

  private tellComments(): void {
    const { words, run } = this;
    if (!run.tell.wantsComments) return;
    for (const { from, to } of words.comments) {
      const text = words.decode(from, to);
      const message = MESSAGE.exec(text);
      run.tell.comment({
        text: message ? text.slice(message[0].length) : text,
        message: message !== null,
        place: run.machine.place({ bytes: [from - words.start, to - words.start] }),
      });
    }
  }
}

/** NISTIR 6556 3.2.4: `MSG,` in any case, blanks allowed between. */
const MESSAGE = /^[ \t]*m[ \t]*s[ \t]*g[ \t]*,/i;
