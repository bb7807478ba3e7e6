import { openFrame, type Frame, type Locals, type Turning } from '../flow/call-stack';
import type { Decisions } from '../flow/decisions';
import type { KeptProgram } from '../flow/kept-program';
import type { Library } from '../flow/library';
import { DEEPEST_CALL, MOST_IDLE_TURNS, MOST_REPEATED, MOST_TURNS } from '../flow/limits';
import type { ShapeFault } from '../flow/pair-shapes';
import type { Statement } from '../statements/statement';
import type { Place, Words } from './events';
import { endProgram } from './ends';
import { tellProblem, type Facts, type Run } from './run';

/** What carries out the lines that a follower comes to. */
export interface LineTaker {
  /** The line now in the run's words. */
  takeLine(): void;
  tellOverlong(length: number): void;
}

/** What a walk over kept text goes by. */
export interface Kept {
  readonly program: KeptProgram;
  readonly library: Library;
  readonly decisions: Decisions;
}

/** What is called: where it stands and how it begins. */
export interface Callee {
  readonly program: KeptProgram;
  readonly start: number;
  readonly key: string;
  readonly times: number;
  readonly locals: Locals;
}

interface GivenUp {
  readonly reason: 'idle' | 'turns' | 'blocks';
  readonly line: number;
  readonly program: KeptProgram;
  /** Whether it hangs on what is not known before the run. */
  readonly isUnknown: boolean;
}

/**
 * Walks a kept text in the order in which its blocks are run: calls and returns, jumps and loops. It decides
 * which line comes next; what a line does is carried out as in a walk that streams.
 */
export class Follower {
  readonly frames: Frame[];
  readonly decisions: Decisions;
  /** Where a loop that is never left hangs on what is not known, and was left out of the findings. */
  waitsAt: { readonly place: Place; readonly facts: Facts } | undefined;
  private gaveUp: GivenUp | undefined;
  private readonly toldShapes = new Set<KeptProgram>();
  private readonly main: KeptProgram;
  private readonly library: Library;
  private readonly visited: Uint8Array;
  private blocksLeft: number;

  constructor(
    private readonly run: Run,
    private readonly taker: LineTaker,
    { program, library, decisions }: Kept,
    from: number,
  ) {
    this.main = program;
    this.library = library;
    this.decisions = decisions;
    this.frames = [openFrame(program, from)];
    this.visited = new Uint8Array((program.text.lines >> 3) + 1);
    this.blocksLeft = program.text.lines + MOST_REPEATED;
  }

  /** Walks to the program's end, or to where it is given up. */
  walk(): void {
    const { run } = this;
    while (run.endedBy === '') {
      const { frame } = this;
      const { line, program } = frame;
      if (--this.blocksLeft < 0) this.giveUp('blocks', this.outermostLoop() ?? this.line, false);
      else if (line <= program.text.lines) {
        frame.line++;
        this.takeLine(program, line);
      } else if (this.frames.length > 1) this.endWithoutReturn();
      else break;
    }
    if (this.gaveUp) this.tellGivenUp(this.gaveUp);
  }

  private takeLine(program: KeptProgram, line: number): void {
    if (!this.toldShapes.has(program)) this.tellShapes(program);
    this.readLine(program, line);
    if (program === this.main) this.visit(line);
    const overlong = program.text.overlongLength(line);
    if (overlong > 0) this.taker.tellOverlong(overlong);
    else this.taker.takeLine();
    this.takeReturn();
  }

  /** Blocks carried out, those done again counted again. */
  get blocksRun(): number {
    return this.main.text.lines + MOST_REPEATED - this.blocksLeft;
  }

  /** Whether the walk was given up because it carried out more blocks than any program has. */
  get isExhausted(): boolean {
    return this.blocksLeft < 0;
  }

  get frame(): Frame {
    return this.frames[this.frames.length - 1]!;
  }

  /** The line that is now carried out. */
  get line(): number {
    return this.frame.line - 1;
  }

  /** The statement of this line, if it has been read before. */
  keptStatement(): Statement | undefined {
    return this.frame.program.statements.get(this.line);
  }

  keepStatement(statement: Statement): void {
    const { words } = this.run.block;
    const isPlain = words.comments.length === 0 && words.faults.length === 0 && !words.skippable;
    if (isPlain && words.percentAt < 0) this.frame.program.keep(this.line, statement);
  }

  /** Whether a block of the program stands unrun right behind where it ended; the line is then at hand. */
  findTextAfterEnd(): boolean {
    const { text } = this.main;
    const { words } = this.run.block;
    if (this.frames.length > 1) return false;
    for (let line = this.frame.line; line <= text.lines; line++) {
      this.readLine(this.main, line);
      const isBlock = words.count > 0 || words.faults.length > 0 || words.isStatement;
      if (isBlock) return !this.hasVisited(line);
    }
    return false;
  }

  /** A percent sign met while something is called: it opens a text, or closes it. */
  takePercent(): void {
    if (this.line > this.frame.program.firstBlock) this.endWithoutReturn();
  }

  /** A program's own label behind which another program begins; gives whether it ends the subprogram. */
  takeProgramLabel(): boolean {
    const { start, program } = this.frame;
    if (this.frames.length === 1 || this.line === start || this.line <= program.firstBlock)
      return false;
    this.endWithoutReturn();
    return true;
  }

  /** `words`: what of the block to underline where the call goes too deep. */
  call(callee: Callee, words: Words): void {
    if (callee.times <= 0) return;
    if (this.frames.length > DEEPEST_CALL) return this.refuseCall(callee, words);
    const isOwn = this.frame.program === this.main;
    const { program, start, key, times, locals } = callee;
    // The line of a sub is passed over by its calls, and is no text that never runs.
    if (program === this.main && program.shapes.links.get(start - 1)?.kind === 'sub')
      this.visit(start - 1);
    const calledAt = isOwn ? this.line : this.frame.calledAt;
    this.frames.push(openFrame(program, start, { key, repeats: times - 1, locals, calledAt }));
    this.run.isCalled = true;
    this.enter(locals);
  }

  /** Leaves the subprogram, or runs it once more where the call says so. */
  return(): void {
    const { frame, frames } = this;
    if (frames.length === 1) return;
    if (frame.locals.kind !== 'shared') this.run.parameters.leave();
    if (frame.repeats > 0) {
      frame.repeats--;
      frame.line = frame.start;
      frame.loops = [];
      frame.jumps.clear();
      frame.seeksBranch = false;
      this.enter(frame.locals);
      return;
    }
    frames.pop();
    this.run.isCalled = frames.length > 1;
  }

  /**
   * Where a label of a program or a subroutine stands: here, in the program checked, or in the setup. An o-word
   * calls a sub first, M98 and G65 a program.
   */
  findCallee(
    key: string,
    first: 'program' | 'sub',
  ): { readonly program: KeptProgram; readonly start: number } | undefined {
    for (const program of new Set([this.frame.program, this.main])) {
      const label = program.findProgram(key);
      const sub = program.findSub(key);
      if (sub !== undefined && (first === 'sub' || label === undefined))
        return { program, start: sub + 1 };
      if (label !== undefined) return { program, start: label };
    }
    const program = this.library.find(key);
    if (!program) return undefined;
    const sub = program.findSub(key);
    const start = sub === undefined ? (program.findProgram(key) ?? 1) : sub + 1;
    return { program, start };
  }

  /**
   * Whether a subroutine of the program checked is called before the walk has come by its first line. Such a
   * controller does not know it yet (facts sheet 12.2.1).
   */
  isBehind({ program, start }: Pick<Callee, 'program' | 'start'>): boolean {
    const isHere = program === this.main && this.frame.program === this.main;
    const isSub = program.shapes.links.get(start - 1)?.kind === 'sub';
    return isHere && isSub && !this.hasVisited(start - 1);
  }

  private hasVisited(line: number): boolean {
    return (this.visited[line >> 3]! & (1 << (line & 7))) !== 0;
  }

  private visit(line: number): void {
    this.visited[line >> 3] = this.visited[line >> 3]! | (1 << (line & 7));
  }

  /** A jump; loops that it leads out of are left. Tells where it cannot lead. */
  jump(to: number, isBackward: boolean): void {
    const { frame, line } = this;
    frame.loops = frame.loops.filter(({ at }) => {
      const link = frame.program.shapes.links.get(at);
      return link !== undefined && 'end' in link && at <= to && to <= link.end;
    });
    frame.seeksBranch = false;
    frame.line = to;
    if (!isBackward) return;
    let turning = frame.jumps.get(line);
    if (!turning) frame.jumps.set(line, (turning = openTurning(line)));
    this.countTurn(turning);
  }

  /** Begins a loop or its next turn; `left`: turns still to do, of one that counts them. */
  turn(at: number, left = 0): void {
    let turning = this.turningAt(at);
    if (!turning) this.frame.loops.push((turning = openTurning(at)));
    turning.left = left;
    this.countTurn(turning);
  }

  /** The loop that begins here, if it is being turned; inner ones that a jump has left are forgotten. */
  turningAt(at: number): Turning | undefined {
    const { loops } = this.frame;
    const index = loops.findLastIndex((each) => each.at === at);
    if (index < 0) return undefined;
    loops.length = index + 1;
    return loops[index];
  }

  leaveLoop(at: number): void {
    if (this.turningAt(at)) this.frame.loops.pop();
  }

  private countTurn(turning: Turning): void {
    const { fingerprint } = this.run.parameters;
    const { asked } = this.decisions;
    turning.turns++;
    turning.idleTurns = fingerprint === turning.stored ? turning.idleTurns + 1 : 0;
    const isUnknown = asked !== turning.asked;
    turning.stored = fingerprint;
    turning.asked = asked;
    // A repeat ends by itself, however many turns it says.
    if (turning.left > 0) return;
    if (turning.idleTurns >= MOST_IDLE_TURNS) this.giveUp('idle', turning.at, isUnknown);
    else if (turning.turns >= MOST_TURNS) this.giveUp('turns', turning.at, isUnknown);
  }

  /** Nothing behind a loop that is never left is ever reached. Told once the line at hand is done with. */
  private giveUp(reason: GivenUp['reason'], line: number, isUnknown: boolean): void {
    this.gaveUp ??= { reason, line, program: this.frame.program, isUnknown };
    this.run.endedBy = 'endless';
  }

  private tellGivenUp({ reason, line, program, isUnknown }: GivenUp): void {
    const { run } = this;
    this.readLine(program, line);
    const most = reason === 'blocks' ? MOST_REPEATED : MOST_TURNS;
    const facts: Facts = { reason, what: this.textOfLine(), most };
    const bytes = this.bytesOfLine();
    if (isUnknown) this.waitsAt = { place: run.machine.place({ bytes }), facts };
    else tellProblem(run, 'never-ends', { bytes }, facts);
  }

  private outermostLoop(): number | undefined {
    const { loops, jumps } = this.frame;
    return loops[0]?.at ?? jumps.keys().next().value;
  }

  private refuseCall({ key, program }: Callee, words: Words): void {
    const { run, frames } = this;
    const first = frames.findIndex((each) => each.key === key && each.program === program);
    const facts = { what: key, most: DEEPEST_CALL, reason: first < 0 ? 'depth' : 'recursion' };
    tellProblem(run, 'subprogram-loop', words, facts);
    // What calls itself is left as a whole: its callers on the way would only call it again.
    while (first > 0 && frames.length > first) {
      this.frame.repeats = 0;
      this.return();
    }
  }

  private endWithoutReturn(): void {
    const { run, frame } = this;
    run.block.words.clear();
    tellProblem(run, 'missing-end', { letters: 'none' }, { reason: 'subprogram', what: frame.key });
    this.return();
  }

  /** M99: to the block behind the call, or to the line its P word names. */
  private takeReturn(): void {
    const { run } = this;
    if (run.endedBy !== 'M99') return;
    const { block } = run;
    const target = block.has(LETTER_P) ? Math.round(block.value(LETTER_P)) : undefined;
    if (!run.isCalled && target === undefined) return;
    run.endedBy = '';
    if (target === undefined) return this.return();
    if (run.isCalled) {
      this.frame.repeats = 0;
      this.return();
      return this.returnTo(target);
    }
    this.goRound(target);
  }

  private returnTo(target: number): void {
    const { frame } = this;
    const line = frame.program.findNumber(target, frame.line);
    if (line === undefined)
      tellProblem(
        this.run,
        'subprogram-missing',
        { letters: 'P' },
        { what: `N${target}`, reason: 'return' },
      );
    else this.jump(line, line < frame.line);
  }

  /** As goRound, where the line at hand has been carried out by a walk that then paused. */
  goRoundFromHere(target: number): void {
    const { frame } = this;
    this.readLine(frame.program, frame.line++);
    this.goRound(target);
  }

  /** A main program that says where its next turn begins: only what stands ahead has not been walked yet. */
  private goRound(target: number): void {
    const { run, frame } = this;
    const line = frame.program.findNumber(target, frame.line);
    if (line === undefined)
      tellProblem(
        run,
        'subprogram-missing',
        { letters: 'P' },
        { what: `N${target}`, reason: 'return' },
      );
    if (line !== undefined && line >= frame.line) this.jump(line, false);
    else endProgram(run, 'M99');
  }

  private enter(locals: Locals): void {
    if (locals.kind === 'macro') this.run.parameters.enterMacro(locals.given);
    else if (locals.kind === 'subroutine') this.run.parameters.enterSubroutine(locals.given);
  }

  /** Tells what of a text's shape is wrong, each at its line. */
  private tellShapes(program: KeptProgram): void {
    this.toldShapes.add(program);
    const { machine } = this.run;
    const { line, within } = machine;
    for (const fault of program.shapes.faults) this.tellShape(program, fault);
    machine.line = line;
    machine.within = within;
  }

  private tellShape(program: KeptProgram, { line, from, to, reason, other }: ShapeFault): void {
    this.readLine(program, line);
    const { words } = this.run.block;
    const what = words.text(words.start + from, words.start + to);
    tellProblem(this.run, 'unreadable-block', { bytes: [from, to] }, { reason, what, other });
  }

  private readLine(program: KeptProgram, line: number): void {
    const { machine, block } = this.run;
    program.readLine(line, block.words);
    if (program === this.main) {
      machine.line = line;
      machine.within = undefined;
    } else {
      machine.line = this.frame.program === this.main ? this.line : this.frame.calledAt;
      machine.within = { text: program.text.name, line };
    }
  }

  private bytesOfLine(): readonly [number, number] {
    const { words } = this.run.block;
    const text = words.text(words.start, words.end);
    return [text.length - text.trimStart().length, text.trimEnd().length];
  }

  private textOfLine(): string {
    const { words } = this.run.block;
    return words.text(words.start, Math.min(words.end, words.start + SHOWN)).trim();
  }
}

const LETTER_P = 15;
/** Characters of a line that a finding shows. */
const SHOWN = 40;

const openTurning = (at: number): Turning => ({
  at,
  turns: 0,
  idleTurns: 0,
  stored: NaN,
  asked: 0,
  left: 0,
});
