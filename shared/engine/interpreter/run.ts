import type { Block } from '../blocks/block';
import type { DeclaredCode, Setup } from '../shop/setup';
import type { Shop } from '../shop/shop';
import type { Broadcaster } from './broadcaster';
import type { Problem, Words } from './events';
import type { Machine } from './machine';
import type { Motion } from './events';
import type { Circle } from './arcs';
import type { Target } from './motions';
import type { WorkOffsets } from './work-offsets';
import type { CycleMemory } from './cycles';

/** What every part of the interpreter works on: one walk of one program over one machine. */
export interface Run {
  readonly shop: Shop;
  readonly controller: Setup['controller'];
  readonly block: Block;
  readonly machine: Machine;
  readonly tell: Broadcaster;
  readonly offsets: WorkOffsets;
  readonly cycle: CycleMemory;
  readonly motion: Motion;
  /** Scratch, so that motion allocates nothing. */
  readonly target: Target;
  readonly circle: Circle;
  readonly declared: ReadonlyMap<string, readonly DeclaredCode[]>;
  /** Offsets whose missing value has been told once. */
  readonly toldUnset: Set<string>;
  /** The end code met, or '' while the program runs. */
  endedBy: '' | 'M2' | 'M30' | 'M99' | '%';
  /** Whether the block has been refused part-way, so that nothing more of it is carried out. */
  refused: boolean;
}

export function tellProblem(
  run: Run,
  problem: Problem,
  words: Words | undefined,
  facts: Readonly<Record<string, string | number | boolean | null>>,
): void {
  run.tell.problem({ problem, place: run.machine.place(words), facts });
}
