import { Block } from '../blocks/block';
import { G_GROUP_OF, M_GROUP_OF } from '../blocks/code-groups';
import { parseBlock, type CodeTable } from '../blocks/parse-block';
import { LineWords } from '../lexer/line-words';
import { readLine } from '../lexer/read-line';
import type { Shop } from '../shop/shop';
import { LONGEST_LINE, LineSource, type LineReader } from '../source/line-source';
import { Broadcaster } from './broadcaster';
import { emptyCycle } from './cycles';
import { endProgram } from './ends';
import type { Observer, Place } from './events';
import { carryOut } from './interpreter';
import { Machine, NO_MOTION } from './machine';
import { emptyMotion } from './motions';
import { placeProgramZero } from './offset-words';
import type { Run } from './run';
import { hold } from './tool-change';
import { WorkOffsets } from './work-offsets';

export interface WalkOptions {
  /** Whether blocks with a `/` in front are skipped. */
  readonly skips: boolean;
}

/** One reading of a program: bytes in, events out. */
export class Walk implements LineReader {
  /** Lines begun so far. */
  linesRead = 0;
  /** Lines with at least one word. */
  blocks = 0;
  /** The first block with a `/` in front. */
  firstSkippable: Place | undefined;
  private readonly source = new LineSource(this);
  private readonly words = new LineWords();
  private readonly block = new Block(this.words);
  private readonly table: CodeTable;
  private readonly run: Run;
  private isDone = false;
  private percentSeen = false;
  private lastWritten = 1;

  constructor(
    shop: Shop,
    observers: readonly Observer[],
    private readonly options: WalkOptions,
  ) {
    this.table = codeTable(shop);
    this.run = openRun(shop, this.block, observers);
  }

  push(bytes: Uint8Array): void {
    this.source.push(bytes);
  }

  endOfText(): void {
    this.source.end();
    const { machine, tell, endedBy } = this.run;
    this.words.clear(new Uint8Array(0), 0);
    machine.line = this.lastWritten;
    if (this.blocks === 0)
      tell.problem({ problem: 'empty-program', place: machine.place(), facts: {} });
    else if (endedBy === '' || endedBy === '%')
      tell.problem({ problem: 'missing-end', place: machine.place(), facts: {} });
    if (endedBy === '') tell.programEnd({ code: 'end-of-text', place: machine.place() });
  }

  readLines(bytes: Uint8Array, at: number, end: number): void {
    const { words } = this;
    while (at < end) {
      const next = readLine(bytes, at, words);
      this.linesRead++;
      if (words.end - at > LONGEST_LINE) this.tellOverlong(words.end - at);
      else this.takeLine();
      at = next;
    }
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
    const { machine, tell } = this.run;
    this.lastWritten = machine.line = this.linesRead;
    this.words.clear(this.words.bytes, 0);
    this.words.end = 0;
    this.blocks++;
    tell.problem({
      problem: 'unreadable-block',
      place: machine.place(),
      facts: { reason: 'too-long', length, most: LONGEST_LINE },
    });
    tell.block();
  }

  private takeLine(): void {
    const { words, run } = this;
    run.machine.line = this.linesRead;
    if (words.end > words.start) this.lastWritten = this.linesRead;
    if (words.percentAt >= 0) this.takePercent();
    if (words.count === 0 && words.faults.length === 0) {
      if (words.comments.length > 0 && !this.isDone) this.tellComments();
      return;
    }
    this.blocks++;
    if (this.isDone) return;
    if (words.skippable) {
      this.firstSkippable ??= { line: this.linesRead };
      if (this.options.skips) return;
    }
    parseBlock(words, this.block, this.table);
    if (words.faults.length > 0) this.tellFaults();
    if (words.comments.length > 0) this.tellComments();
    for (const { letter, tenths } of this.block.others) {
      const what = letter + String(tenths / 10);
      run.tell.problem({
        problem: 'not-modelled',
        place: run.machine.place({ code: what }),
        facts: { what },
      });
    }
    if (!words.isVoid) carryOut(run);
    run.tell.block();
    if (run.endedBy !== '') this.isDone = true;
  }

  private takePercent(): void {
    if (this.isDone) return;
    if (!this.percentSeen && this.blocks === 0) this.percentSeen = true;
    else {
      endProgram(this.run, '%');
      this.isDone = true;
    }
  }

  private tellFaults(): void {
    const { words, run } = this;
    for (const { problem, from, to, facts } of words.faults) {
      const bytes = [from - words.start, to - words.start] as const;
      run.tell.problem({ problem, place: run.machine.place({ bytes }), facts });
    }
  }

  private tellComments(): void {
    const { words, run } = this;
    if (!run.tell.wantsComments) return;
    for (const { from, to } of words.comments) {
      const text = words.text(from, to);
      const message = /^\s*msg\s*,/i.test(text);
      run.tell.comment({
        text: message ? text.slice(text.indexOf(',') + 1) : text,
        message,
        place: run.machine.place({ bytes: [from - words.start, to - words.start] }),
      });
    }
  }
}

function codeTable(shop: Shop): CodeTable {
  const { controller } = shop.setup;
  return { g: G_GROUP_OF, m: M_GROUP_OF, isStrict: controller.switches.strict };
}

function openRun(shop: Shop, block: Block, observers: readonly Observer[]): Run {
  const { controller, machine: description, loading, offsets } = shop.setup;
  const machine = new Machine(block);
  const { defaults } = controller;
  const { travel, start } = description;
  machine.unit = defaults.units === 'mm' ? 1 : 25.4;
  machine.planeIndex = defaults.plane === 'xy' ? 0 : defaults.plane === 'zx' ? 1 : 2;
  machine.isAbsolute = defaults.distance === 'absolute';
  machine.isArcCentreAbsolute = defaults.arcCentre === 'absolute';
  machine.feedMode = defaults.feed;
  machine.workOffset = defaults.workOffset;
  machine.returnTo = defaults.return;
  machine.path = defaults.path;
  const { startMotion } = controller.switches;
  machine.motionCode = startMotion === 'none' ? NO_MOTION : startMotion === 'rapid' ? 0 : 10;
  machine.x = start?.x ?? travel.x[0];
  machine.y = start?.y ?? travel.y[0];
  machine.z = start?.z ?? travel.z[1];
  machine.a = 0;
  machine.lengthOffset = 0;
  machine.speed = 0;
  machine.feed = NaN;
  const run: Run = {
    shop,
    controller,
    block,
    machine,
    tell: new Broadcaster(observers, machine),
    offsets: new WorkOffsets(offsets),
    cycle: emptyCycle(),
    motion: emptyMotion(),
    target: { x: 0.5, y: 0.5, z: 0.5, a: 0.5 },
    circle: { u: 0.5, v: 0.5, radius: 0.5 },
    declared: new Map(),
    toldUnset: new Set(),
    endedBy: '',
    refused: false,
  };
  hold(run, loading.inSpindle === 'unknown' ? null : (loading.inSpindle ?? 0));
  placeProgramZero(run);
  return run;
}
