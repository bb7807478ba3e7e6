import { LIMIT_SLACK } from '../geometry/tolerance';
import type { MachineState, Motion } from '../interpreter/events';
import type { Material } from '../shop/material';
import type { Shop } from '../shop/shop';
import { trueOffset } from './true-offset';
import { usesLengthTable } from './watch-length';

/**
 * How deep the tip goes under the top of the stock in this motion (mm), if anything of `radius` about
 * the tool's axis comes over the stock at all; −Infinity otherwise. The stock is the whole box of the
 * job sheet, and the motion its box: what has been cut away is not known. With a length in force that is
 * more than 1 mm off, every depth is wrong by as much; that is a stop of its own, and nothing is said here.
 */
export function depthUnderStock(
  shop: Shop,
  material: Material,
  motion: Motion,
  state: MachineState,
  radius: number,
): number {
  const region = hasTrueLength(shop, state) ? material.regionFor(state) : undefined;
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

/** Beyond this (mm) a wrong length is a stop: see length-offset-disagrees. */
const FAR_OFF = 1;

function hasTrueLength(shop: Shop, { held, lengthOffset }: MachineState): boolean {
  const own = usesLengthTable(shop) ? trueOffset(shop, held.tool) : undefined;
  return own === undefined || Math.abs(lengthOffset - own) <= FAR_OFF;
}
