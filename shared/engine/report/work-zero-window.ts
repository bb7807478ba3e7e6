import { ownGreatest, ownLeast } from '../geometry/path';
import type { MachineState, Motion, Observer } from '../interpreter/events';
import type { Interval } from '../shop/setup';
import type { Shop } from '../shop/shop';
import type { Window } from './report';

export type WorkZeroWindows = Readonly<
  Record<string, { readonly x: Window; readonly y: Window; readonly z: Window }>
>;
/** Least and greatest distance from work zero that a program goes to on one axis. */
interface Reach {
  least: number;
  greatest: number;
}
interface Reaches {
  readonly x: Reach;
  readonly y: Reach;
  readonly z: Reach;
}
const X = 1;
const Y = 2;
const Z = 4;
const ALL = X | Y | Z;

/**
 * The values that each work offset may take so that every motion placed by it stays inside the travel:
 * W between A_min − min p and A_max − max p, where p is how far from work zero the gauge point goes; on Z
 * the length of each tool is in p, so all tools are met at once. Travel alone: the rack, zones and the
 * board are judged elsewhere. Lower bound above the upper: no value fits. Null: the axis is not used.
 *
 * An axis counts from when a program coordinate places it. Machine coordinates and home positions take
 * it out of the offset's hands, and so does G92, which sets zero from where the head stands.
 */
export function watchWorkZeroWindow(shop: Shop): Observer & { result(): WorkZeroWindows } {
  const { travel } = shop.setup.machine;
  const byOffset = new Map<string, Reaches>();
  let reaches: Reaches | undefined;
  let workOffset = '';
  let placed = 0;
  /** Axes whose present coordinate is in `reaches` already, as long as the origin stays where it is. */
  let counted = 0;
  const origin = { x: NaN, y: NaN, z: NaN };
  /** Where the last motion ended; a motion that could not be worked out moves the head untold. */
  const last = { x: NaN, y: NaN, z: NaN };
  let isPreset = false;
  return {
    localShift({ code, withAxes }) {
      if (!code.startsWith('G92')) return;
      isPreset = code === 'G92' ? isPreset || withAxes : code === 'G92.3';
    },
    toolChanged() {
      if (shop.setup.machine.changePoint) placed = 0;
    },
    quiet(quiet, state) {
      if (isPreset) return;
      const isCounted =
        counted === ALL && placed === ALL && isAt(origin, state) && isThere(last, state);
      if (!isCounted || workOffset !== state.workOffset) quiet.close();
    },
    stretch(stretch, state) {
      if (isPreset || !reaches) {
        counted = 0;
        return;
      }
      const { x, y, z } = reaches;
      take(x, stretch.minX, stretch.maxX, state.originX ?? 0);
      take(y, stretch.minY, stretch.maxY, state.originY ?? 0);
      take(z, stretch.minZ, stretch.maxZ, state.originZ ?? 0);
      standAt(last, state.x, state.y, state.z);
    },
    motion(motion, state) {
      const { fromX, fromY, fromZ } = motion;
      if (fromX !== last.x || fromY !== last.y || fromZ !== last.z) counted = 0;
      standAt(last, motion.toX, motion.toY, motion.toZ);
      counted &= ~movedAxes(motion);
      if (motion.by !== 'program' && motion.by !== 'cycle') {
        placed &= ~(motion.named | movedAxes(motion));
        return;
      }
      if (state.distance === 'absolute') placed |= motion.named;
      const axes = (motion.named | movedAxes(motion)) & placed;
      if (axes === 0 || isPreset) return;
      if (!reaches || workOffset !== state.workOffset) {
        workOffset = state.workOffset;
        reaches = byOffset.get(workOffset) ?? emptyReaches();
        counted = 0;
        byOffset.set(workOffset, reaches);
      }
      takeAxes(motion, state, axes, reaches);
      if (!isAt(origin, state)) {
        counted = 0;
        origin.x = state.originX ?? 0;
        origin.y = state.originY ?? 0;
        origin.z = state.originZ ?? 0;
      }
      counted |= axes;
    },
    result: () =>
      Object.fromEntries(
        [...byOffset].map(([name, { x, y, z }]) => [
          name,
          { x: windowOf(x, travel.x), y: windowOf(y, travel.y), z: windowOf(z, travel.z) },
        ]),
      ),
  };
}

function movedAxes(motion: Motion): number {
  return (
    (motion.minX < motion.maxX ? X : 0) |
    (motion.minY < motion.maxY ? Y : 0) |
    (motion.minZ < motion.maxZ ? Z : 0)
  );
}

function takeAxes(motion: Motion, state: MachineState, axes: number, reaches: Reaches): void {
  const { fromX, toX, fromY, toY, fromZ, toZ, minX, maxX, minY, maxY, minZ, maxZ } = motion;
  if (axes & X)
    take(reaches.x, ownLeast(fromX, toX, minX), ownGreatest(fromX, toX, maxX), state.originX ?? 0);
  if (axes & Y)
    take(reaches.y, ownLeast(fromY, toY, minY), ownGreatest(fromY, toY, maxY), state.originY ?? 0);
  if (axes & Z)
    take(reaches.z, ownLeast(fromZ, toZ, minZ), ownGreatest(fromZ, toZ, maxZ), state.originZ ?? 0);
}

function isAt(
  origin: { readonly x: number; readonly y: number; readonly z: number },
  state: MachineState,
): boolean {
  return (
    origin.x === (state.originX ?? 0) &&
    origin.y === (state.originY ?? 0) &&
    origin.z === (state.originZ ?? 0)
  );
}

interface Point {
  x: number;
  y: number;
  z: number;
}
function isThere(point: Point, { x, y, z }: MachineState): boolean {
  return point.x === x && point.y === y && point.z === z;
}
function standAt(point: Point, x: number, y: number, z: number): void {
  point.x = x;
  point.y = y;
  point.z = z;
}

function take(reach: Reach, least: number, greatest: number, origin: number): void {
  const low = least - origin;
  const high = greatest - origin;
  if (low < reach.least) reach.least = low;
  if (high > reach.greatest) reach.greatest = high;
}

function windowOf(reach: Reach, limits: Interval): Window {
  if (!(reach.least <= reach.greatest)) return null;
  return [limits[0] - reach.least, limits[1] - reach.greatest];
}

function emptyReaches(): Reaches {
  const empty = () => ({ least: Infinity, greatest: -Infinity });
  return { x: empty(), y: empty(), z: empty() };
}
