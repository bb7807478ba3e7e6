import { travelSeconds } from '../../geometry/kinematics';
import { arcTangent, type MutablePoint } from '../../geometry/path';
import type { Motion } from '../events';
import { independentSeconds, weakest } from '../../shop/motion-seconds';
import type { Setup } from '../../shop/setup';

/**
 * How fast the head goes. Every motion speeds up, cruises and slows down as its axes allow. Under exact
 * stop (G61, G61.1), and for rapids, it begins and ends at rest. Blended (G64), a feed motion hands over to
 * the next at the part of the slower feed that points the new way: all of it straight on, none at a right
 * angle or sharper. What a controller looks ahead beyond one block is not modelled.
 */
export class Pace {
  /** Seconds of feed motion since they were last taken, and the motion that is still open; see Open. */
  readonly state = new Float64Array(Open.count);
  /** Seconds of rapids since they were last taken. */
  rapidSeconds = 0;
  /** The slowest axis's greatest feed, mm/s: up to it no direction needs to be looked at. */
  readonly slowestFeed: number;
  private readonly feedLimits: InverseLimits;
  private readonly rapidLimits: InverseLimits;
  readonly slownesses: InverseLimits;
  /** Greatest feed (mm/s) and one over the acceleration on arcs, by plane: XY, ZX, YZ. */
  private readonly planeFeeds: readonly number[];
  private readonly planeSlownesses: readonly number[];
  private readonly start: MutablePoint = { x: 0.5, y: 0.5, z: 0.5 };
  private readonly end: MutablePoint = { x: 0.5, y: 0.5, z: 0.5 };

  constructor(private readonly setup: Setup) {
    const { maxFeed, rapid, acceleration } = setup.machine;
    const planes = ['xy', 'zx', 'yz'] as const;
    this.planeFeeds = planes.map((plane) => weakest(plane, maxFeed) / 60);
    this.planeSlownesses = planes.map((plane) => 1 / weakest(plane, acceleration));
    this.slowestFeed = Math.min(maxFeed.x, maxFeed.y, maxFeed.z) / 60;
    this.feedLimits = inverse(maxFeed, 60);
    this.rapidLimits = inverse(rapid, 60);
    this.slownesses = inverse(acceleration, 1);
  }

  /** A straight feed motion from rest or from the one before: way (mm), its length, feed (mm/min), whether blended. */
  followLine(
    dx: number,
    dy: number,
    dz: number,
    length: number,
    feed: number,
    isBlended: boolean,
  ): void {
    const part = 1 / length;
    const x = dx * part;
    const y = dy * part;
    const z = dz * part;
    let speed = feed / 60;
    // An unknown feed is no reason to take a cut for instant: it counts as the fastest the axes can do.
    if (!(feed > 0 && speed <= this.slowestFeed)) {
      const most = 1 / shareOf(x, y, z, this.feedLimits);
      if (!(feed > 0 && speed < most)) speed = most;
    }
    this.follow(x, y, z, speed, isBlended);
    this.setOpen(length, shareOf(x, y, z, this.slownesses), x, y, z);
  }

  /** A feed motion on an arc. Every direction of its plane comes up, so the weaker axis decides. */
  followArc(motion: Motion, isBlended: boolean): void {
    const { plane, length, feed } = motion;
    const at = plane === 'xy' ? 0 : plane === 'zx' ? 1 : 2;
    const most = this.planeFeeds[at]!;
    const speed = feed > 0 && feed / 60 < most ? feed / 60 : most;
    const slowness = this.planeSlownesses[at]!;
    if (at !== 0) {
      const { start, end } = this;
      arcTangent(motion, 0, start);
      arcTangent(motion, 1, end);
      this.follow(start.x, start.y, start.z, speed, isBlended);
      return this.setOpen(length, slowness, end.x, end.y, end.z);
    }
    // Nine arcs in ten lie in the XY plane: both tangents of arcTangent in one go.
    const { fromX, fromY, toX, toY, centreU, centreV } = motion;
    const along = (motion.radius * motion.turn) / length;
    const rise = (motion.toZ - motion.fromZ) / length;
    const startU = fromX - centreU;
    const startV = fromY - centreV;
    const starts = along / Math.sqrt(startU * startU + startV * startV);
    this.follow(-startV * starts, startU * starts, rise, speed, isBlended);
    const endU = toX - centreU;
    const endV = toY - centreV;
    const ends = along / Math.sqrt(endU * endU + endV * endV);
    this.setOpen(length, slowness, -endV * ends, endU * ends, rise);
  }

  /** A rapid, from standstill to standstill. */
  rapid(motion: Motion): void {
    this.rest();
    const dx = motion.toX - motion.fromX;
    const dy = motion.toY - motion.fromY;
    const dz = motion.toZ - motion.fromZ;
    if (this.setup.controller.rapids === 'independent') {
      this.rapidSeconds += independentSeconds(motion, this.setup.machine);
      return;
    }
    const { length } = motion;
    const part = 1 / length;
    const share = shareOf(dx * part, dy * part, dz * part, this.rapidLimits);
    const slowness = shareOf(dx * part, dy * part, dz * part, this.slownesses);
    this.rapidSeconds += travelSeconds(length, 1 / slowness, 1 / share, 0, 0);
  }

  takeFeedSeconds(): number {
    const seconds = this.state[Open.seconds]!;
    this.state[Open.seconds] = 0;
    return seconds;
  }

  /** Ends the open motion at standstill. */
  rest(): void {
    this.settle(0);
  }

  private follow(x: number, y: number, z: number, speed: number, isBlended: boolean): void {
    const { state } = this;
    const handed = isBlended ? handOver(state, x, y, z, speed) : 0;
    this.settle(handed);
    state[Open.speed] = speed;
    state[Open.perSpeed] = 1 / speed;
    state[Open.enter] = handed < speed ? handed : speed;
  }

  private setOpen(length: number, slowness: number, x: number, y: number, z: number): void {
    const { state } = this;
    state[Open.length] = length;
    state[Open.slowness] = slowness;
    state[Open.acceleration] = 1 / slowness;
    state[Open.endX] = x;
    state[Open.endY] = y;
    state[Open.endZ] = z;
  }

  private settle(leave: number): void {
    const { state } = this;
    if (state[Open.length] === 0) return;
    state[Open.seconds]! += openSeconds(state, leave);
    state[Open.length] = 0;
  }
}

/**
 * Places in the state of a pace. The feed motion last followed stays open, because the next one decides how
 * fast it is left: its length (mm; 0 for none), the speeds at which it was entered and runs at most (mm/s),
 * its acceleration and one over that, and where it points at its end. An array, so that figures stay unboxed between
 * here and the reader of quiet lines.
 */
export const enum Open {
  seconds,
  length,
  enter,
  speed,
  /** One over the speed. */
  perSpeed,
  slowness,
  acceleration,
  endX,
  endY,
  endZ,
  count,
}

/** One over each axis's own limit, per second. */
export interface InverseLimits {
  readonly x: number;
  readonly y: number;
  readonly z: number;
}

function inverse(
  limits: { readonly x: number; readonly y: number; readonly z: number },
  seconds: number,
): InverseLimits {
  return { x: seconds / limits.x, y: seconds / limits.y, z: seconds / limits.z };
}

/** One over the greatest value along a direction: what of it the axis takes that is used up first. */
function shareOf(x: number, y: number, z: number, limits: InverseLimits): number {
  return Math.max(Math.abs(x) * limits.x, Math.abs(y) * limits.y, Math.abs(z) * limits.z);
}

/** Speed at which the next motion is entered: what points its way, and can be reached on the open one. */
export function handOver(
  state: Float64Array,
  x: number,
  y: number,
  z: number,
  nextSpeed: number,
): number {
  const length = state[Open.length]!;
  if (length === 0) return 0;
  const along = state[Open.endX]! * x + state[Open.endY]! * y + state[Open.endZ]! * z;
  if (!(along > 0)) return 0;
  const speed = state[Open.speed]!;
  const slower = speed < nextSpeed ? speed : nextSpeed;
  const handed = along < 1 ? slower * along : slower;
  const enter = state[Open.enter]!;
  const reached = enter * enter + 2 * state[Open.acceleration]! * length;
  return handed * handed <= reached ? handed : Math.sqrt(reached);
}

/**
 * Seconds of the open motion if it is left at this speed: travelSeconds without its divisions. It is neither
 * entered nor left faster than it runs.
 */
export function openSeconds(state: Float64Array, leave: number): number {
  const length = state[Open.length]!;
  const slowness = state[Open.slowness]!;
  const enter = state[Open.enter]!;
  const most = state[Open.speed]!;
  const squares = 0.5 * (enter * enter + leave * leave);
  const ramps = (most * most - squares) * slowness;
  if (ramps <= length)
    return (2 * most - enter - leave) * slowness + (length - ramps) * state[Open.perSpeed]!;
  const acceleration = state[Open.acceleration]!;
  const peak = Math.sqrt(acceleration * length + squares);
  const faster = enter > leave ? enter : leave;
  if (peak < faster) return (2 * length) / (enter + leave);
  return (2 * peak - enter - leave) * slowness;
}
