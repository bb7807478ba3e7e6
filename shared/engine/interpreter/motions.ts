import { LETTER } from '../blocks/block';
import type { Motion } from './events';
import type { Target } from './kept';
import { tellProblem, type Run } from './run';

const { X, Y, Z, A } = LETTER;
const X_BIT = 1 << X;
const Y_BIT = 1 << Y;
const Z_BIT = 1 << Z;
const A_BIT = 1 << A;
const AXIS_BITS = X_BIT | Y_BIT | Z_BIT | A_BIT;
/** In the order in which offsets keep their axes. */
export const AXIS_LETTERS = [X, Y, Z, A] as const;

export const hasAxisWord = (seen: number): boolean => (seen & AXIS_BITS) !== 0;

/** Bit 1 X, 2 Y, 4 Z, 8 A, from a block's letters. */
export const namedAxes = (seen: number): number => ((seen >>> X) & 7) | ((seen & A_BIT) << 3);

/** Every number starts as a fraction, so that the field is kept as a double from the first motion on. */
export function emptyMotion(): Motion {
  return {
    kind: 'rapid',
    by: 'program',
    fromX: 0.5,
    fromY: 0.5,
    fromZ: 0.5,
    fromA: 0,
    toX: 0.5,
    toY: 0.5,
    toZ: 0.5,
    toA: 0,
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
    isAlternative: false,
  };
}

/** Where the block's axis words lead from here. Returns `target`, filled. */
export function readTarget(run: Run, target: Target): Target {
  const { block, machine } = run;
  const { values } = block.words;
  const { wordOf, seen } = block;
  const { unit } = machine;
  const isAbsolute = machine.isAbsolute;
  target.x = machine.x;
  target.y = machine.y;
  target.z = machine.z;
  target.a = machine.a;
  if ((seen & X_BIT) !== 0)
    target.x = values[wordOf[X]!]! * unit + (isAbsolute ? machine.baseX : machine.x);
  if ((seen & Y_BIT) !== 0)
    target.y = values[wordOf[Y]!]! * unit + (isAbsolute ? machine.baseY : machine.y);
  if ((seen & Z_BIT) !== 0)
    target.z = values[wordOf[Z]!]! * unit + (isAbsolute ? machine.baseZ : machine.z);
  if ((seen & A_BIT) !== 0)
    target.a = values[wordOf[A]!]! + (isAbsolute ? machine.baseA : machine.a);
  return target;
}

/** G53: the axis words are machine coordinates, whatever G90 or G91 says. */
export function readMachineTarget(run: Run, target: Target): Target {
  const { block, machine } = run;
  target.x = block.has(X) ? block.value(X) * machine.unit : machine.x;
  target.y = block.has(Y) ? block.value(Y) * machine.unit : machine.y;
  target.z = block.has(Z) ? block.value(Z) * machine.unit : machine.z;
  target.a = block.has(A) ? block.value(A) : machine.a;
  return target;
}

/** Stands at the end of a motion that could not be worked out; nothing is told of the way there. */
export function standAt({ machine, tell }: Run, to: Target): void {
  tell.quiet.ask();
  machine.x = to.x;
  machine.y = to.y;
  machine.z = to.z;
  machine.a = to.a;
}

/**
 * G0 and G1 in program coordinates: the hot path of every check. It is moveStraight and readTarget in one,
 * so that no coordinate leaves a register between a word and the motion.
 */
export function moveByWords(run: Run, isRapid: boolean, feed: number): void {
  const { block, machine, motion } = run;
  const { values } = block.words;
  const { wordOf, seen } = block;
  const { unit, isAbsolute } = machine;
  const fromX = machine.x;
  const fromY = machine.y;
  const fromZ = machine.z;
  let x = fromX;
  let y = fromY;
  let z = fromZ;
  if ((seen & X_BIT) !== 0) x = values[wordOf[X]!]! * unit + (isAbsolute ? machine.baseX : fromX);
  if ((seen & Y_BIT) !== 0) y = values[wordOf[Y]!]! * unit + (isAbsolute ? machine.baseY : fromY);
  if ((seen & Z_BIT) !== 0) z = values[wordOf[Z]!]! * unit + (isAbsolute ? machine.baseZ : fromZ);
  machine.x = x;
  machine.y = y;
  machine.z = z;
  motion.kind = isRapid ? 'rapid' : 'feed';
  motion.by = 'program';
  motion.fromX = fromX;
  motion.fromY = fromY;
  motion.fromZ = fromZ;
  motion.toX = x;
  motion.toY = y;
  motion.toZ = z;
  motion.minX = fromX < x ? fromX : x;
  motion.maxX = fromX < x ? x : fromX;
  motion.minY = fromY < y ? fromY : y;
  motion.maxY = fromY < y ? y : fromY;
  motion.minZ = fromZ < z ? fromZ : z;
  motion.maxZ = fromZ < z ? z : fromZ;
  const dx = x - fromX;
  const dy = y - fromY;
  const dz = z - fromZ;
  const length = Math.sqrt(dx * dx + dy * dy + dz * dz);
  motion.moves = length !== 0;
  motion.length = length;
  motion.feed = feed;
  if ((seen & A_BIT) !== 0 || motion.fromA !== motion.toA) turnByWord(run, length);
  if (machine.feedMode === 'inverse-time') motion.feed = feed * motion.length;
  run.tell.motion(motion);
}

/** The rotary part of a motion; its length counts degrees where nothing else moves. */
function turnByWord({ block, machine, motion }: Run, length: number): void {
  motion.fromA = machine.a;
  if (block.has(A)) machine.a = block.value(A) + (machine.isAbsolute ? machine.baseA : machine.a);
  motion.toA = machine.a;
  if (length === 0) motion.length = Math.abs(motion.toA - motion.fromA);
}

/** Moves in a straight line, tells it, and stands at its end. `feed` is NaN on rapids. */
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
  const { x, y, z } = to;
  motion.kind = kind;
  motion.by = by;
  motion.fromX = fromX;
  motion.fromY = fromY;
  motion.fromZ = fromZ;
  motion.fromA = machine.a;
  motion.toX = x;
  motion.toY = y;
  motion.toZ = z;
  motion.toA = to.a;
  motion.minX = fromX < x ? fromX : x;
  motion.maxX = fromX < x ? x : fromX;
  motion.minY = fromY < y ? fromY : y;
  motion.maxY = fromY < y ? y : fromY;
  motion.minZ = fromZ < z ? fromZ : z;
  motion.maxZ = fromZ < z ? z : fromZ;
  const dx = x - fromX;
  const dy = y - fromY;
  const dz = z - fromZ;
  const squared = dx * dx + dy * dy + dz * dz;
  const moves = squared !== 0;
  const length = moves ? Math.sqrt(squared) : Math.abs(to.a - machine.a);
  motion.moves = moves;
  motion.length = length;
  // Under G93 the F word is the inverse of the minutes the move takes.
  motion.feed = machine.feedMode === 'inverse-time' ? feed * length : feed;
  machine.x = x;
  machine.y = y;
  machine.z = z;
  machine.a = to.a;
  run.tell.motion(motion);
}

/** A program coordinate on an axis whose offset has no value: told once an offset. */
export function tellIfUnset(run: Run, named: number): void {
  const { machine, toldUnset } = run;
  const unset = machine.unsetAxes & named;
  if (unset === 0 || toldUnset.has(machine.workOffset)) return;
  toldUnset.add(machine.workOffset);
  const letters = (unset & 1 ? 'X' : '') + (unset & 2 ? 'Y' : '') + (unset & 4 ? 'Z' : '');
  tellProblem(run, 'work-offset-unset', { letters }, { offset: machine.workOffset, axes: letters });
}
