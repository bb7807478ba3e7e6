import { ownGreatest, ownLeast } from '../geometry/path';
import type { MachineState, Motion, Observer } from '../interpreter/events';
import type { Tool } from '../shop/setup';
import type { Shop } from '../shop/shop';
import { openWorkFrames, tipDrop } from '../shop/work-frames';
import type { Extent } from './report';

export interface Extents {
  /** Machine coordinates of the gauge point. */
  readonly gauge: Extent | null;
  /** The tip in each work offset that was in force, by the real length of the tool. */
  readonly work: Readonly<Record<string, Extent>>;
}
interface Bounds {
  minX: number;
  minY: number;
  minZ: number;
  maxX: number;
  maxY: number;
  maxZ: number;
}

/**
 * Where all motion goes, tool changes left out. A motion counts for where it goes, not for where it
 * starts, so that the place where the head happens to wait is no part of the program.
 *
 * Bounds are kept in machine coordinates while tool and work offset stay the same, and carried over
 * when either changes: a motion costs a few comparisons.
 */
export function watchExtents(shop: Shop): Observer & { result(): Extents } {
  const frames = openWorkFrames(shop);
  const gauge = emptyBounds();
  const work = new Map<string, Bounds>();
  let bounds = emptyBounds();
  let shiftX = 0;
  let shiftY = 0;
  let shiftZ = 0;
  let tool: Tool | undefined;
  let workOffset = '';
  let originX: number | undefined;
  let originY: number | undefined;
  let originZ: number | undefined;
  let lengthOffset = NaN;
  const isSame = (state: MachineState) =>
    tool === state.held.tool &&
    originX === state.originX &&
    originY === state.originY &&
    originZ === state.originZ &&
    lengthOffset === state.lengthOffset &&
    workOffset === state.workOffset;
  const carryOver = () => {
    if (bounds.minX > bounds.maxX) return;
    widen(gauge, bounds, 0, 0, 0);
    const inWork = work.get(workOffset) ?? emptyBounds();
    widen(inWork, bounds, shiftX, shiftY, shiftZ);
    work.set(workOffset, inWork);
    bounds = emptyBounds();
  };
  const begin = (state: MachineState) => {
    carryOver();
    tool = state.held.tool;
    ({ originX, originY, originZ, lengthOffset, workOffset } = state);
    const origin = frames.origin(workOffset, state);
    shiftX = origin.x;
    shiftY = origin.y;
    shiftZ = origin.z + tipDrop(state);
  };
  return {
    quiet() {
      // Where it goes is told by the stretch.
    },
    stretch(stretch, state) {
      if (!isSame(state)) begin(state);
      widen(bounds, stretch, 0, 0, 0);
    },
    motion(motion, state) {
      if (motion.by === 'change' || !motion.moves) return;
      if (!isSame(state)) begin(state);
      take(motion, bounds);
    },
    result() {
      carryOver();
      return {
        gauge: extentOf(gauge),
        work: Object.fromEntries(
          [...work].map(([name, each]) => [name, extentOf(each)] as const).filter(isMoved),
        ),
      };
    },
  };
}

function isMoved(entry: readonly [string, Extent | null]): entry is readonly [string, Extent] {
  return entry[1] !== null;
}

function take(motion: Motion, bounds: Bounds): void {
  const { fromX, toX, fromY, toY, fromZ, toZ } = motion;
  if (motion.minX < bounds.minX)
    bounds.minX = Math.min(bounds.minX, ownLeast(fromX, toX, motion.minX));
  if (motion.minY < bounds.minY)
    bounds.minY = Math.min(bounds.minY, ownLeast(fromY, toY, motion.minY));
  if (motion.minZ < bounds.minZ)
    bounds.minZ = Math.min(bounds.minZ, ownLeast(fromZ, toZ, motion.minZ));
  if (motion.maxX > bounds.maxX)
    bounds.maxX = Math.max(bounds.maxX, ownGreatest(fromX, toX, motion.maxX));
  if (motion.maxY > bounds.maxY)
    bounds.maxY = Math.max(bounds.maxY, ownGreatest(fromY, toY, motion.maxY));
  if (motion.maxZ > bounds.maxZ)
    bounds.maxZ = Math.max(bounds.maxZ, ownGreatest(fromZ, toZ, motion.maxZ));
}

function widen(bounds: Bounds, by: Bounds, shiftX: number, shiftY: number, shiftZ: number): void {
  bounds.minX = Math.min(bounds.minX, by.minX - shiftX);
  bounds.minY = Math.min(bounds.minY, by.minY - shiftY);
  bounds.minZ = Math.min(bounds.minZ, by.minZ - shiftZ);
  bounds.maxX = Math.max(bounds.maxX, by.maxX - shiftX);
  bounds.maxY = Math.max(bounds.maxY, by.maxY - shiftY);
  bounds.maxZ = Math.max(bounds.maxZ, by.maxZ - shiftZ);
}

function extentOf(bounds: Bounds): Extent | null {
  if (!(bounds.minX <= bounds.maxX)) return null;
  return {
    min: { x: bounds.minX, y: bounds.minY, z: bounds.minZ },
    max: { x: bounds.maxX, y: bounds.maxY, z: bounds.maxZ },
  };
}

function emptyBounds(): Bounds {
  return {
    minX: Infinity,
    minY: Infinity,
    minZ: Infinity,
    maxX: -Infinity,
    maxY: -Infinity,
    maxZ: -Infinity,
  };
}
