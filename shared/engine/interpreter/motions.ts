import { LETTER } from '../blocks/block';
import type { Motion } from './events';
import { PLANES } from './machine';
import { tellProblem, type Run } from './run';

const { X, Y, Z, A } = LETTER;
const AXIS_BITS = (1 << X) | (1 << Y) | (1 << Z) | (1 << A);

export const hasAxisWord = (seen: number): boolean => (seen & AXIS_BITS) !== 0;

/** Bit 1 X, 2 Y, 4 Z, 8 A, from a block's letters. */
export const namedAxes = (seen: number): number => ((seen >>> X) & 7) | ((seen & 1) << 3);

export function emptyMotion(): Motion {
  // Fractions, so that every field is kept as a double from the start.
  return {
    kind: 'rapid',
    by: 'program',
    fromX: 0.5,
    fromY: 0.5,
    fromZ: 0.5,
    fromA: 0.5,
    toX: 0.5,
    toY: 0.5,
    toZ: 0.5,
    toA: 0.5,
    minX: 0.5,
    minY: 0.5,
    minZ: 0.5,
    maxX: 0.5,
    maxY: 0.5,
    maxZ: 0.5,
    plane: 'xy',
    centreU: 0.5,
    centreV: 0.5,
    radius: 0.5,
    turn: 0.5,
    feed: 0.5,
    length: 0.5,
    moves: false,
    inHole: false,
    named: 0,
    endUnknown: false,
  };
}

/** Where the block's axis words lead, in machine mm. Reused; read at once. */
export const readTarget = (run: Run, target: Target): Target => {
  const { block, machine } = run;
  const { values } = block.words;
  const { unit } = machine;
  const { seen } = block;
  if (machine.isAbsolute) {
    target.x =
      (seen & (1 << X)) !== 0 ? values[block.wordOf[X]!]! * unit + machine.baseX : machine.x;
    target.y =
      (seen & (1 << Y)) !== 0 ? values[block.wordOf[Y]!]! * unit + machine.baseY : machine.y;
    target.z =
      (seen & (1 << Z)) !== 0 ? values[block.wordOf[Z]!]! * unit + machine.baseZ : machine.z;
    target.a = (seen & 1) !== 0 ? values[block.wordOf[A]!]! + machine.baseA : machine.a;
  } else {
    target.x = (seen & (1 << X)) !== 0 ? values[block.wordOf[X]!]! * unit + machine.x : machine.x;
    target.y = (seen & (1 << Y)) !== 0 ? values[block.wordOf[Y]!]! * unit + machine.y : machine.y;
    target.z = (seen & (1 << Z)) !== 0 ? values[block.wordOf[Z]!]! * unit + machine.z : machine.z;
    target.a = (seen & 1) !== 0 ? values[block.wordOf[A]!]! + machine.a : machine.a;
  }
  return target;
};

export interface Target {
  x: number;
  y: number;
  z: number;
  a: number;
}

/** Moves in a straight line, tells it, and stands at its end. */
export function moveStraight(
  run: Run,
  kind: Motion['kind'],
  by: Motion['by'],
  to: Target,
  feed: number,
): void {
  const { machine, motion } = run;
  const fromX = machine.x;
  const fromY = machine.y;
  const fromZ = machine.z;
  motion.kind = kind;
  motion.by = by;
  motion.fromX = fromX;
  motion.fromY = fromY;
  motion.fromZ = fromZ;
  motion.fromA = machine.a;
  motion.toX = to.x;
  motion.toY = to.y;
  motion.toZ = to.z;
  motion.toA = to.a;
  motion.minX = fromX < to.x ? fromX : to.x;
  motion.maxX = fromX < to.x ? to.x : fromX;
  motion.minY = fromY < to.y ? fromY : to.y;
  motion.maxY = fromY < to.y ? to.y : fromY;
  motion.minZ = fromZ < to.z ? fromZ : to.z;
  motion.maxZ = fromZ < to.z ? to.z : fromZ;
  const dx = to.x - fromX;
  const dy = to.y - fromY;
  const dz = to.z - fromZ;
  const squared = dx * dx + dy * dy + dz * dz;
  motion.moves = squared !== 0;
  motion.length = squared !== 0 ? Math.sqrt(squared) : Math.abs(to.a - machine.a);
  motion.feed = feed;
  machine.x = to.x;
  machine.y = to.y;
  machine.z = to.z;
  machine.a = to.a;
  run.tell.motion(motion);
}

export function setArcParts(motion: Motion, planeIndex: number): void {
  motion.plane = PLANES[planeIndex]!;
}

/** A program coordinate in an offset that has no value: told once an offset. */
export function tellUnsetOffset(run: Run): void {
  const { machine } = run;
  if (run.toldUnset.has(machine.workOffset)) return;
  run.toldUnset.add(machine.workOffset);
  tellProblem(run, 'work-offset-unset', { letters: 'XYZ' }, { offset: machine.workOffset });
}
