import { LIMIT_SLACK } from '../geometry/tolerance';
import type { MachineState, Motion } from '../interpreter/events';
import type { Material } from '../shop/material';

/**
 * How deep the tip goes under the top of the stock in this motion (mm), if anything of `radius` about
 * the tool's axis comes over the stock at all; −Infinity otherwise. The stock is the whole box of the
 * job sheet, and the motion its box: what has been cut away is not known.
 */
export function depthUnderStock(
  material: Material,
  motion: Motion,
  state: MachineState,
  radius: number,
): number {
  const region = material.regionFor(state);
  if (!region) return -Infinity;
  // The region is where solids meet by more than the slack, so the slack is added back for a true depth.
  const depth = region.maxZ - motion.minZ + LIMIT_SLACK;
  if (!(depth > LIMIT_SLACK)) return -Infinity;
  const isClear =
    motion.maxX < region.minX - radius ||
    region.maxX + radius < motion.minX ||
    motion.maxY < region.minY - radius ||
    region.maxY + radius < motion.minY;
  return isClear ? -Infinity : depth;
}
