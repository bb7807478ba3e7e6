import { LowestGrid } from '../geometry/lowest-grid';
import type { Span } from '../geometry/span';
import type { MachineState, Motion } from '../interpreter/events';
import type { CutMemory } from './rule';
import type { Material } from '../shop/material';
import type { Shop } from '../shop/shop';
import { tipDrop } from '../shop/work-frames';

/** A cutter thinner than this is remembered as this wide, as is one whose size is not known (mm). */
const THIN_CUTTER = 1;

/**
 * What a walk remembers of where it has cut: only how low, on a coarse grid over the table. It tells a
 * rapid through whole stock from one through space that was cut before; it does not say that
 * nothing is left standing there.
 */
export interface CutRecord {
  /** Remembers a feed motion with the spindle turning in stock; any other motion is ignored. */
  record(motion: Motion, state: MachineState): void;
  /** Whether this part of the path has been cut that low before, all over the tool's width. */
  isCut(motion: Motion, state: MachineState, part: Span): boolean;
}

export function openCutRecord(shop: Shop, material: Material, cuts: CutMemory): CutRecord {
  const { x, y } = shop.setup.machine.travel;
  const grid = new LowestGrid(x[0], y[0], x[1], y[1]);
  const radius = (state: MachineState) => (state.held.tool?.diameter ?? THIN_CUTTER) / 2;
  if (!cuts.isKept)
    return {
      record() {
        // Not in this walk.
      },
      isCut() {
        cuts.want();
        return false;
      },
    };
  return {
    record(motion, state) {
      // Where a motion is only known within bounds, nothing is known to be cut.
      if (motion.endUnknown || state.turning === 'off') return;
      const region = material.regionFor(state);
      if (!region || !(motion.minZ < region.maxZ)) return;
      grid.press(motion, radius(state), tipDrop(state));
    },
    isCut: (motion, state, part) =>
      grid.isSwept(motion, part, { radius: radius(state), drop: tipDrop(state) }, (px, py) =>
        material.isOver(px, py, state),
      ),
  };
}
