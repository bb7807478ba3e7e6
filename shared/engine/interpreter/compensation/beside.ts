import { tellArc } from '../arcs';
import type { Motion } from '../events';
import type { Circle, Target } from '../kept';
import { moveStraight, standAt } from '../motions';
import { refuse, tellProblem, type Facts, type Run } from '../run';
import type { Vector } from './corner';

/** One block's move as the program states it. */
export interface Move {
  /** Of its straight parts. */
  readonly kind: Exclude<Motion['kind'], 'arc'>;
  /** −1 clockwise, 1 counterclockwise, 0 straight. */
  readonly turning: -1 | 0 | 1;
  /** Where the program goes. */
  readonly to: Target;
  /** As feedOf gives it; NaN for rapids. */
  readonly feed: number;
}

/** Sums that should meet differ by less, mm; a shorter move has no direction to speak of. */
const SAME_POINT = 1e-9;
export const isSamePoint = (one: Vector, other: Vector): boolean =>
  Math.abs(one.x - other.x) + Math.abs(one.y - other.y) <= SAME_POINT;

/** No XY move: Z and A go along, the cutter stays at its side. */
export function goAlong(run: Run, { kind, to, feed }: Move): void {
  const { x, y } = run.machine;
  moveStraight(run, kind, 'program', { ...to, x, y }, feed);
}

/** One straight or round part of the way of the cutter's centre. */
export interface Part {
  readonly to: Target;
  readonly arc?: { readonly circle: Circle; readonly turn: number };
}

/** The point so many radii off a point of the program; heights and A are those of `at`. */
export function beside({ offset }: Run, point: Vector, off: Vector, at: Target): Target {
  const { radius } = offset;
  return { x: point.x + radius * off.x, y: point.y + radius * off.y, z: at.z, a: at.a };
}

/** Moves along the parts; under G93 the F word holds for all of them together. */
export function travel(run: Run, move: Move, parts: readonly Part[]): void {
  const { machine } = run;
  const lengths = parts.map((part, index) => lengthOf(part, parts[index - 1]?.to ?? machine));
  const whole = lengths.reduce((sum, length) => sum + length, 0);
  const isInverse = machine.feedMode === 'inverse-time';
  parts.forEach(({ to, arc }, index) => {
    const feed = isInverse ? (move.feed * whole) / lengths[index]! : move.feed;
    if (arc) tellArc(run, to, arc.circle, arc.turn, feed);
    else moveStraight(run, move.kind, 'program', to, feed);
  });
}

function lengthOf({ to, arc }: Part, from: Readonly<Target>): number {
  const along = arc ? arc.circle.radius * arc.turn : Math.hypot(to.x - from.x, to.y - from.y);
  return Math.hypot(along, to.z - from.z);
}

/** The program now stands at the end of the move; `room` is what corners have left of a straight one. */
export function standBeside({ offset }: Run, to: Vector, room: number): void {
  offset.x = to.x;
  offset.y = to.y;
  offset.isEntering = false;
  offset.room = room;
}

/**
 * Tells a move that compensation cannot follow. The published language ends the run there, so a strict controller
 * leaves the block undone and the walk goes on from the given end; whether it is so.
 */
export function tellFault(run: Run, facts: Facts, end: Target): boolean {
  const { isStrict } = run.dialect;
  const tell = isStrict ? refuse : tellProblem;
  tell(run, 'compensation-entry', { letters: 'XYIJR' }, facts);
  if (isStrict) standAt(run, end);
  return isStrict;
}
