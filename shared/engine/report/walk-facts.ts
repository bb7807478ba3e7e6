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
    motion(motion, state) {
      if (motion.by === 'change' || !motion.moves) return;
      if (motion.minX < min.x) min.x = motion.minX;
      if (motion.minY < min.y) min.y = motion.minY;
      if (motion.minZ < min.z) min.z = motion.minZ;
      if (motion.maxX > max.x) max.x = motion.maxX;
      if (motion.maxY > max.y) max.y = motion.maxY;
      if (motion.maxZ > max.z) max.z = motion.maxZ;
      const tool = state.held.number ?? -1;
      const before = lowest[tool];
      if (before === undefined || motion.minZ < before) lowest[tool] = motion.minZ;
    },
    facts: (firstSkippable) => ({
      firstSkippable,
      tools,
      lowest,
      extent: min.x <= max.x ? { min, max } : null,
    }),
  };
}
