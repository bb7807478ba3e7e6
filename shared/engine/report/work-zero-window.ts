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
  let isPreset = false;
  return {
    localShift({ code, withAxes }) {
      if (!code.startsWith('G92')) return;
      isPreset = code === 'G92' ? isPreset || withAxes : code === 'G92.3';
    },
    toolChanged() {
      if (shop.setup.machine.changePoint) placed = 0;
    },
    motion(motion, state) {
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
        byOffset.set(workOffset, reaches);
      }
      takeAxes(motion, state, axes, reaches);
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
  if (axes & X)
    take(reaches.x, motion.fromX, motion.toX, motion.minX, motion.maxX, state.originX ?? 0);
  if (axes & Y)
    take(reaches.y, motion.fromY, motion.toY, motion.minY, motion.maxY, state.originY ?? 0);
  if (axes & Z)
    take(reaches.z, motion.fromZ, motion.toZ, motion.minZ, motion.maxZ, state.originZ ?? 0);
}

function take(
  reach: Reach,
  from: number,
  to: number,
  least: number,
  greatest: number,
  origin: number,
): void {
  const low = ownLeast(from, to, least) - origin;
  const high = ownGreatest(from, to, greatest) - origin;
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
