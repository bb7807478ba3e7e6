import { ownLeast } from '../geometry/path';
import type { MachineState, Observer } from '../interpreter/events';
import type { Shop } from '../shop/shop';
import { openWorkFrames, tipDrop } from '../shop/work-frames';
import type { ToolUse } from './report';
import type { Times } from './times';

interface Use {
  readonly number: number;
  readonly firstLine: number;
  changes: number;
  cutLength: number;
  lowest: number;
}

/**
 * What the program does with each tool, in the order of first use. A tool that the program never calls
 * but finds in the spindle counts from its first motion; a change to the tool already held is none.
 */
export function watchToolUse(
  shop: Shop,
): Observer & { result(cuttingByTool: Times['cuttingByTool']): readonly ToolUse[] } {
  const uses = new Map<number, Use>();
  const frames = openWorkFrames(shop);
  let use: Use | undefined;
  let zeroOfTip = 0;
  let workOffset = '';
  let originZ: number | undefined;
  let lengthOffset = NaN;
  const find = (number: number, line: number): Use => {
    const known = uses.get(number);
    if (known) return known;
    const fresh = { number, firstLine: line, changes: 0, cutLength: 0, lowest: Infinity };
    uses.set(number, fresh);
    return fresh;
  };
  const place = (state: MachineState) => {
    if (
      workOffset === state.workOffset &&
      originZ === state.originZ &&
      lengthOffset === state.lengthOffset
    )
      return;
    ({ workOffset, originZ, lengthOffset } = state);
    zeroOfTip = frames.origin(workOffset, state).z + tipDrop(state);
  };
  return {
    toolChanged(event) {
      lengthOffset = NaN;
      use = event.to ? find(event.to, event.place.line) : undefined;
      const isSame = event.from.known && event.from.number === event.to;
      if (use && !isSame) use.changes += 1;
    },
    quiet(quiet, state) {
      if (!use && state.held.number) quiet.close();
    },
    stretch({ minZ, feedLength }, state) {
      if (!use) return;
      place(state);
      use.lowest = Math.min(use.lowest, minZ - zeroOfTip);
      if (state.turning !== 'off') use.cutLength += feedLength;
    },
    motion(motion, state) {
      if (motion.by === 'change' || !motion.moves) return;
      if (!use) {
        const { number } = state.held;
        if (!number) return;
        use = find(number, state.line);
      }
      place(state);
      const lowest = ownLeast(motion.fromZ, motion.toZ, motion.minZ) - zeroOfTip;
      if (lowest < use.lowest) use.lowest = lowest;
      if (state.turning === 'off') return;
      if (motion.isAlternative) return;
      if (motion.kind === 'feed' || motion.kind === 'arc') use.cutLength += motion.length;
    },
    result: (cuttingByTool) =>
      [...uses.values()].map(({ number, firstLine, changes, cutLength, lowest }) => ({
        number,
        pocket: shop.pocketsOfTool.get(number)?.[0] ?? null,
        firstLine,
        changes,
        cutSeconds: cuttingByTool.get(number) ?? 0,
        cutLength,
        lowest: Number.isFinite(lowest) ? lowest : null,
      })),
  };
}
