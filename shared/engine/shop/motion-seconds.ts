import { alongDirection, travelSeconds } from '../geometry/kinematics';
import type { Path } from '../geometry/path';
import type { Machine, PerAxis } from './setup';

/** What of a motion its time depends on. */
export interface TimedMotion extends Path {
  /** Path length, mm. */
  readonly length: number;
  /** mm/min; NaN for rapids and where none is known. */
  readonly feed: number;
  readonly moves: boolean;
  /** Degrees. */
  readonly fromA: number;
  readonly toA: number;
}

/** Greatest speed (mm/s) and acceleration (mm/s²) along a path, as the axes allow it. */
export interface PathLimits {
  speed: number;
  acceleration: number;
}

/**
 * Works out the limits of a motion. A straight path shares its speed among the axes, so the first axis
 * to reach its own limit decides; on an arc every direction of its plane comes up, so the weaker does.
 */
export function findPathLimits(motion: TimedMotion, machine: Machine, out: PathLimits): PathLimits {
  const isRapid = motion.kind === 'rapid';
  const fastest = isRapid ? machine.rapid : machine.maxFeed;
  if (motion.kind === 'arc') {
    out.speed = weakest(motion.plane, fastest) / 60;
    out.acceleration = weakest(motion.plane, machine.acceleration);
  } else {
    const x = (motion.toX - motion.fromX) / motion.length;
    const y = (motion.toY - motion.fromY) / motion.length;
    const z = (motion.toZ - motion.fromZ) / motion.length;
    out.speed = alongDirection(x, y, z, fastest) / 60;
    out.acceleration = alongDirection(x, y, z, machine.acceleration);
  }
  // An unknown feed is no reason to take a cut for instant: it counts as the fastest the axes can do.
  if (!isRapid && motion.feed > 0) out.speed = Math.min(out.speed, motion.feed / 60);
  return out;
}

/** Seconds for the motion alone, from standstill to standstill. */
export function aloneSeconds(motion: TimedMotion, machine: Machine): number {
  if (!motion.moves) return turnSeconds(motion);
  const { speed, acceleration } = findPathLimits(motion, machine, { speed: 0, acceleration: 0 });
  return travelSeconds(motion.length, acceleration, speed, 0, 0);
}

/**
 * Seconds of a feed that turns A alone: its F counts degrees a minute (NISTIR 6556, chapter 2, from memory). The description gives no
 * speed or acceleration of A, so that a rapid turn is taken for instant and a feed turn has no ramps.
 */
export function turnSeconds({ kind, feed, fromA, toA }: TimedMotion): number {
  if (kind === 'rapid' || !(feed > 0)) return 0;
  return (Math.abs(toA - fromA) / feed) * 60;
}

/** A rapid whose axes each run at their own speed lasts as long as the slowest of them. */
export function independentSeconds(motion: TimedMotion, machine: Machine): number {
  const { rapid, acceleration } = machine;
  return Math.max(
    axisSeconds(motion.toX - motion.fromX, rapid.x, acceleration.x),
    axisSeconds(motion.toY - motion.fromY, rapid.y, acceleration.y),
    axisSeconds(motion.toZ - motion.fromZ, rapid.z, acceleration.z),
  );
}
function axisSeconds(way: number, perMinute: number, acceleration: number): number {
  return travelSeconds(Math.abs(way), acceleration, perMinute / 60, 0, 0);
}

/** The lesser limit of the two axes of a plane. */
export function weakest(plane: Path['plane'], limits: PerAxis): number {
  switch (plane) {
    case 'xy':
      return Math.min(limits.x, limits.y);
    case 'zx':
      return Math.min(limits.z, limits.x);
    case 'yz':
      return Math.min(limits.y, limits.z);
  }
}
