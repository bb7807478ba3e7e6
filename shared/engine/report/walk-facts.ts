import { ownGreatest, ownLeast } from '../geometry/path';
import type { Observer, Place } from '../interpreter/events';
import type { WalkFacts } from '../rules/rule';

/** Kept changes; a program that loops through more is compared by its first ones. */
const KEPT_CHANGES = 10_000;

/** Gathers what the two readings of `/` blocks are compared by: tools, depth, extents. */
export function gatherWalkFacts(): Observer & { facts(firstSkippable: Place): WalkFacts } {
  const tools: number[] = [];
  const lowest: Record<number, number> = {};
  const min = { x: Infinity, y: Infinity, z: Infinity };
  const max = { x: -Infinity, y: -Infinity, z: -Infinity };
  return {
    toolChanged(event) {
      if (tools.length < KEPT_CHANGES) tools.push(event.to ?? -1);
    },
    quiet() {
      // Where it goes is told by the stretch.
    },
    stretch(stretch, state) {
      min.x = Math.min(min.x, stretch.minX);
      min.y = Math.min(min.y, stretch.minY);
      min.z = Math.min(min.z, stretch.minZ);
      max.x = Math.max(max.x, stretch.maxX);
      max.y = Math.max(max.y, stretch.maxY);
      max.z = Math.max(max.z, stretch.maxZ);
      const tool = state.held.number ?? -1;
      lowest[tool] = Math.min(lowest[tool] ?? Infinity, stretch.minZ);
    },
    motion(motion, state) {
      if (motion.by === 'change' || !motion.moves) return;
      const { fromX, toX, fromY, toY, fromZ, toZ } = motion;
      const lowestZ = ownLeast(fromZ, toZ, motion.minZ);
      min.x = Math.min(min.x, ownLeast(fromX, toX, motion.minX));
      min.y = Math.min(min.y, ownLeast(fromY, toY, motion.minY));
      min.z = Math.min(min.z, lowestZ);
      max.x = Math.max(max.x, ownGreatest(fromX, toX, motion.maxX));
      max.y = Math.max(max.y, ownGreatest(fromY, toY, motion.maxY));
      max.z = Math.max(max.z, ownGreatest(fromZ, toZ, motion.maxZ));
      const tool = state.held.number ?? -1;
      lowest[tool] = Math.min(lowest[tool] ?? Infinity, lowestZ);
    },
    facts: (firstSkippable) => ({
      firstSkippable,
      tools,
      lowest,
      extent: min.x <= max.x ? { min, max } : null,
    }),
  };
}
