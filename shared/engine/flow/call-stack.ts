import type { Value } from '../expressions/value';
import type { KeptProgram } from './kept-program';

/** A loop that is being turned, by its first line; or a jump back, by its own line. */
export interface Turning {
  readonly at: number;
  turns: number;
  idleTurns: number;
  /** What was stored, and how many undecided conditions had been met, when the last turn began. */
  stored: number;
  asked: number;
  /** Turns still to do, of a repeat. */
  left: number;
}

/** What one call does to the parameters, and undoes when it returns. */
export type Locals =
  | { readonly kind: 'shared' }
  | { readonly kind: 'macro'; readonly given: ReadonlyMap<number, Value> }
  | { readonly kind: 'subroutine'; readonly given: readonly Value[] };

/** A program, or a subprogram that is being run. Plain data, so that a walk can be copied. */
export interface Frame {
  readonly program: KeptProgram;
  /** Which text and line was called, to tell a subprogram that calls itself. */
  readonly key: string;
  /** The first line to run, once for each repeat. */
  readonly start: number;
  /** The line to run next. */
  line: number;
  /** How often it is still to be run after this time. */
  repeats: number;
  readonly locals: Locals;
  /** The line of the checked program that findings in a text of the setup are told at. */
  readonly calledAt: number;
  /** Loops being turned, the innermost last. */
  loops: Turning[];
  /** Jumps back, by their lines. */
  readonly jumps: Map<number, Turning>;
  /** Whether an if has not held, and its next branch is to be tried. */
  seeksBranch: boolean;
}

export function openFrame(
  program: KeptProgram,
  start: number,
  more: Partial<Pick<Frame, 'key' | 'repeats' | 'locals' | 'calledAt'>> = {},
): Frame {
  return {
    program,
    key: '',
    start,
    line: start,
    repeats: 0,
    locals: { kind: 'shared' },
    calledAt: 0,
    loops: [],
    jumps: new Map(),
    seeksBranch: false,
    ...more,
  };
}
