import { Block, LETTER, type OtherCode } from '../blocks/block';
import { addCode, parseBlock, refuseLineComments } from '../blocks/parse-block';
import { codeName, groupTables } from '../blocks/code-groups';
import type { Bounds } from '../expressions/value';
import { LARGEST_KEPT } from '../flow/limits';
import { LineWords } from '../lexer/line-words';
import { readLine } from '../lexer/read-line';
import type { Shop } from '../shop/shop';
import { readStatement } from '../statements/read-statement';
import type { Statement } from '../statements/statement';
import { LONGEST_LINE, LineSource, type LineReader } from '../source/line-source';
import { callOf, findCall, makeCall, readCall, takeCallOut } from './call-words';
import { findDeclared } from './declared-codes';
import { endProgram } from './ends';
import type { Observer, Place, Problem } from './events';
import { Follower, type Kept, type LineTaker } from './follower';
import { carryOut } from './interpreter';
import { QuietLines } from './quiet/quiet-lines';
import { openRun } from './open-run';
import { tellProblem, type Facts, type Run } from './run';
import { decided, steer } from './steer';
import { carryOutUnknown } from './unknown-codes';
import { forgetUnknownWords } from './unknown-position';
import { carryOutSettingsOf, workOut, workOutArguments } from './work-out';

export interface WalkOptions {
  /** Whether blocks with a `/` in front are skipped. */
  readonly skips: boolean;
  /** For tests: reads every line word by word and tells every motion. */
  readonly isAlwaysLoud?: boolean | undefined;
}

/**
 * One walk of a program: bytes in, events out. It streams for as long as every block is followed by the next one
 * in the text. At the first block that leads elsewhere it pauses, and goes on from there once the whole text
 * is at hand (`follow`), or once it is said that it never will be (`streamOn`).
 */
export class Walk implements LineReader, LineTaker {
  /** Lines begun so far. */
  linesRead = 0;
  /** Lines with at least one word, run or not. */
  blocks = 0;
  /** The first block with a `/` in front. */
  firstSkippable: Place | undefined;
  /** The line at which the walk waits for the whole text, else 0. */
  pausedAt = 0;
  /** What is followed over kept text, once it is. */
  follower: Follower | undefined;
  private source = new LineSource(this);
  /** The line of an M99 P that was carried out before the walk paused. */
  private returnsTo: number | undefined;
  /** Where a walk that cannot follow takes up its streaming, and what it counted before. */
  private streamsOnAt = 0;
  private blocksBefore = 0;
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
    if (this.pausedAt > 0) return;
    if (this.streamsOnAt > 0) this.blocks = this.blocksBefore;
    this.tellEnd();
  }

  /** Walks on over the whole text, from where it paused or from its beginning, and tells its end. */
  follow(kept: Kept): void {
    const { run } = this;
    const follower = new Follower(run, this, kept, Math.max(1, this.pausedAt));
    this.follower = follower;
    this.isDone = false;
    this.pausedAt = 0;
    if (this.returnsTo !== undefined) follower.goRoundFromHere(this.returnsTo);
    follower.walk();
    this.blocks = kept.program.blocks;
    this.linesRead = kept.program.text.lines;
    this.lastWritten = kept.program.text.lastWritten;
    const mayNotRun = run.endedBy !== '' && !SILENT_ENDS.includes(run.endedBy) && !run.callsMade;
    if (mayNotRun && follower.findTextAfterEnd()) tellProblem(run, 'text-after-end', undefined, {});
    run.machine.within = undefined;
    this.tellEnd();
  }

  /** The text is too long to be kept: once it is pushed again, the walk goes on without following anything. */
  streamOn(): void {
    this.source = new LineSource(this);
    this.streamsOnAt = this.pausedAt;
    this.blocksBefore = this.blocks;
    this.linesRead = 0;
    this.pausedAt = 0;
    this.isDone = false;
  }

  /** Tells what is only known once other walks of the program are over. */
  tellLater(problem: Problem, place: Place, facts: Facts): void {
    this.run.tell.problem({ problem, place, facts });
  }

  private tellEnd(): void {
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
    if (this.linesRead + 1 < this.streamsOnAt) at = this.passOver(bytes, at, end);
    while (at < end) {
      if (!this.isLoud && this.quietLines.isOpen()) {
        at = this.readQuietLines(bytes, at, end);
        if (at >= end) break;
      }
      this.run.tell.quiet.flush();
      const next = readLine(bytes, at, words);
      this.run.machine.line = ++this.linesRead;
      this.takeLine();
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
    this.run.machine.line = ++this.linesRead;
    if (this.linesRead >= this.streamsOnAt) this.tellOverlong(length);
  }

  readLast(bytes: Uint8Array, end: number): void {
    this.words.ended = false;
    this.readLines(bytes, 0, end);
  }

  /** Passes over what was walked before the walk paused. */
  private passOver(bytes: Uint8Array, at: number, end: number): number {
    while (at < end && this.linesRead + 1 < this.streamsOnAt) {
      at = readLine(bytes, at, this.words);
      this.linesRead++;
    }
    return at;
  }

  tellOverlong(length: number): void {
    const { words, run } = this;
    words.clear();
    this.lastWritten = run.machine.line;
    this.blocks++;
    this.isEmpty = false;
    if (this.isDone) return;
    const facts = { reason: 'too-long', length, most: LONGEST_LINE };
    tellProblem(run, 'unreadable-block', undefined, facts);
    run.tell.block();
  }

  takeLine(): void {
    const { words, run } = this;
    if (words.end === words.start) return;
    if (words.end - words.start > LONGEST_LINE) return this.tellOverlong(words.end - words.start);
    this.lastWritten = run.machine.line;
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
    if (run.endedBy !== '') this.end();
  }

  /** A return that names a line leads elsewhere, even in a main program. */
  private end(): void {
    const { run, block } = this;
    if (this.follower) return;
    this.isDone = true;
    if (run.endedBy !== 'M99' || !block.has(LETTER.P)) return;
    if (this.streamsOnAt > 0) {
      this.tellNotFollowed('M99');
      endProgram(run, 'M99');
      return;
    }
    run.endedBy = '';
    this.returnsTo = Math.round(block.value(LETTER.P));
    this.pause();
  }

  private pause(): void {
    this.pausedAt = this.run.machine.line;
    this.isDone = true;
  }

  private get canFollow(): boolean {
    return this.streamsOnAt === 0 && !this.run.dialect.isStrict;
  }

  private takeRareLine(): void {
    const { words, run } = this;
    const statement = words.isStatement ? this.readStatement() : undefined;
    if (words.percentAt >= 0) this.takePercent();
    if (words.comments.length > 0 && run.dialect.isStrict) refuseLineComments(words);
    const hasWords = words.count > 0 || words.faults.length > 0 || words.isStatement;
    if (hasWords) this.takeRareBlock(statement);
    else if (words.comments.length > 0 && !this.isDone) {
      this.tellComments();
      this.isCommentWaiting = true;
    }
  }

  private readStatement(): Statement {
    const { words, run, follower } = this;
    const kept = follower?.keptStatement();
    if (kept) return kept;
    const statement = readStatement(words, run.grammar);
    follower?.keepStatement(statement);
    return statement;
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
    if (statement && !words.isVoid && this.steers(statement)) return;
    const bounded = statement ? this.takeStatement(statement) : undefined;
    if (this.pausedAt > 0) return;
    parseBlock(words, this.block, run.dialect);
    if (words.count > 0 || words.faults.length > 0) this.isEmpty = false;
    this.finishRareBlock(bounded);
  }

  /** Whether the line says which block comes next, and has been seen to. */
  private steers({ flow }: Statement): boolean {
    const { words, run, follower } = this;
    if (!flow) return false;
    if (flow.kind === 'labelled' && flow.keyword === 'program')
      return follower?.takeProgramLabel() ?? false;
    if (!this.canFollow) return false;
    this.isEmpty = false;
    if (follower) steer(run, follower, flow);
    // A setting behind a decided condition needs no other line of the text.
    else if (flow.kind !== 'then' || decided(run, flow.condition) === undefined) {
      this.pause();
      return true;
    } else if (decided(run, flow.condition)) carryOutSettingsOf(run, flow.settings);
    words.count = 0;
    if (words.faults.length > 0) this.tellFaults();
    if (words.comments.length > 0) this.tellComments();
    run.tell.block();
    if (run.endedBy !== '') this.end();
    return true;
  }

  /** Works out what computes; gives the words of a call that are only known within bounds. */
  private takeStatement(statement: Statement): ReadonlyMap<number, Bounds> | undefined {
    const { words, run } = this;
    const { flow, settings } = statement;
    const isLabel = flow?.kind === 'labelled' && flow.keyword === 'program';
    let bounded: ReadonlyMap<number, Bounds> | undefined;
    if (settings.length > 0) this.isEmpty = false;
    if (flow && !isLabel)
      words.fault({
        problem: 'not-modelled',
        from: words.start + flow.from,
        to: words.start + flow.to,
        facts: {
          what: words.text(words.start + flow.from, words.start + flow.to),
          ...this.notFollowedFacts(),
        },
        voids: true,
      });
    else if (!words.isVoid) {
      const code = callOf(run, statement);
      if (code !== '' && this.canFollow && !this.follower) this.pause();
      else if (code === 'G65') bounded = workOutArguments(run, statement);
      else workOut(run, statement);
    }
    // Of a block that is not carried out, words without a value would only be found faulty again.
    if (words.isVoid) words.count = 0;
    return bounded;
  }

  /** Why what steers is not followed: the published language does not know it, or the text is too long. */
  private notFollowedFacts(): Readonly<Record<string, string | number>> {
    if (this.streamsOnAt === 0) return { reason: 'flow' };
    return { reason: 'flow-size', most: LARGEST_KEPT / (1024 * 1024) };
  }

  private tellNotFollowed(code: string): void {
    tellProblem(this.run, 'not-modelled', { code }, { what: code, ...this.notFollowedFacts() });
  }

  private finishRareBlock(bounded?: ReadonlyMap<number, Bounds>): void {
    const { words, run, block } = this;
    const call = block.others.length > 0 ? findCall(run) : undefined;
    if (call && this.canFollow) {
      if (this.follower) this.takeCall(call, bounded);
      else this.pause();
      return;
    }
    if (call) this.passCall(call);
    if (block.others.length > 0) this.resolveOthers();
    if (words.faults.length > 0) this.tellFaults();
    if (words.comments.length > 0) this.tellComments();
    if (words.isVoid) {
      forgetUnknownWords(run);
      run.tell.block();
    } else this.finishBlock();
  }

  /** A call in a text that is too long to be followed. */
  private passCall(call: OtherCode): void {
    const { run } = this;
    this.tellNotFollowed(codeName(call.letter, call.tenths));
    run.callsMade = true;
    takeCallOut(run, call);
  }

  /** A block that calls: what else stands in it is carried out first. */
  private takeCall(code: OtherCode, bounded: ReadonlyMap<number, Bounds> | undefined): void {
    const { words, run, block } = this;
    const follower = this.follower!;
    // Several sets of I, J and K are how a macro is given more than its letters hold.
    const { faults } = words;
    if (code.letter === 'G')
      for (let at = faults.length - 1; at >= 0; at--)
        if (faults[at]!.problem === 'repeated-word') faults.splice(at, 1);
    const call = words.isVoid
      ? undefined
      : readCall(run, code, (word) => bounded?.get(word) ?? words.values[word]!);
    takeCallOut(run, code);
    if (block.others.length > 0) this.resolveOthers();
    if (faults.length > 0) this.tellFaults();
    if (words.comments.length > 0) this.tellComments();
    if (words.isVoid) forgetUnknownWords(run);
    else carryOut(run);
    if (call && run.endedBy === '') makeCall(run, follower, call);
    run.tell.block();
    if (run.endedBy !== '') this.end();
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
    if (run.isCalled) return this.follower!.takePercent();
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
    if (this.isTextAfterTold || this.run.callsMade || this.pausedAt > 0) return;
    if (this.run.endedBy === 'alarm') return;
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

/** Ends behind which nobody expects the text to be run. */
const SILENT_ENDS: readonly string[] = ['alarm', 'endless'];

/** NISTIR 6556 3.2.4: `MSG,` in any case, blanks allowed between. */
const MESSAGE = /^[ \t]*m[ \t]*s[ \t]*g[ \t]*,/i;
