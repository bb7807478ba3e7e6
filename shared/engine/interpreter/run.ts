import type { Block } from '../blocks/block';
import type { BlockDialect } from '../blocks/parse-block';
import type { Grammar } from '../expressions/grammar';
import type { ParameterStore } from '../parameters/parameter-store';
import type { DeclaredCode, Point, Setup } from '../shop/setup';
import type { Shop } from '../shop/shop';
import type { Broadcaster } from './broadcaster';
import type { Motion, Place, Problem, Words } from './events';
import type { Circle, CycleMemory, ProbeResult, SavedState, Target } from './kept';
import type { Offset } from './compensation/offset';
import type { Machine } from './machine';
import type { Unknown } from './unknown-position';
import type { WorkOffsets } from './work-offsets';

/** A stored point of G28 or G30 in machine mm; A in degrees, machine zero where nothing has stored another. */
export type Reference = Point & { readonly a?: number };

/** What every part of the interpreter works on: one walk of one program over one machine. */
export interface Run {
  readonly shop: Shop;
  readonly controller: Setup['controller'];
  readonly dialect: BlockDialect;
  readonly block: Block;
  readonly machine: Machine;
  readonly tell: Broadcaster;
  readonly offsets: WorkOffsets;
  /** Length offsets by number, mm; G10 L1 may change them. */
  readonly lengths: Map<number, number>;
  /** Diameter offsets by number, mm; G10 L1 may change them. */
  readonly diameters: Map<number, number>;
  /** The stored points of G28 and G30; their .1 forms change them. */
  readonly references: { g28: Reference | undefined; g30: Reference | undefined };
  readonly grammar: Grammar;
  readonly parameters: ParameterStore;
  readonly probed: ProbeResult;
  /** What is not known of where the head is, and of the block's words; undefined while all is. */
  unknown: Unknown | undefined;
  /** Whether any motion was carried out at such bounds. */
  movesAtBounds: boolean;
  /** Cutter compensation, where the machine `isOffset`. */
  readonly offset: Offset;
  readonly cycle: CycleMemory;
  /** Scratch, so that motion allocates nothing. */
  readonly motion: Motion;
  readonly target: Target;
  readonly circle: Circle;
  readonly declared: ReadonlyMap<string, readonly DeclaredCode[]>;
  readonly saved: SavedState[];
  /** Work offsets whose missing value has been told. */
  readonly toldUnset: Set<string>;
  /** A G53 or G28 that stood without axis words in the block before, until the next block is known. */
  loneMachineMove: { readonly code: string; readonly place: Place } | undefined;
  /** Whether anything was called, so that blocks after the end may be what was called. */
  callsMade: boolean;
  /** Whether a subprogram is being run, so that M99 returns to what called it. */
  isCalled: boolean;
  /** The end code met, or '' while the program runs; 'endless' where a loop is never left. */
  endedBy: '' | 'M2' | 'M30' | 'M99' | '%' | 'alarm' | 'endless';
  /** Whether the block has been refused part-way, so that nothing more of it is carried out. */
  refused: boolean;
}

export type Facts = Readonly<Record<string, string | number | boolean | null>>;

export function tellProblem(
  run: Run,
  problem: Problem,
  words: Words | undefined,
  facts: Facts,
): void {
  run.tell.problem({ problem, place: run.machine.place(words), facts });
}

/** Tells it and leaves the rest of the block undone. */
export function refuse(run: Run, problem: Problem, words: Words | undefined, facts: Facts): void {
  tellProblem(run, problem, words, facts);
  run.refused = true;
}
