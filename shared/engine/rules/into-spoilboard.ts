import { LIMIT_SLACK } from '../geometry/tolerance';
import { boxPrism, cylinderPrism, meetingRegion, boundsOf, type Prism } from '../geometry/prism';
import { openSpan } from '../geometry/span';
import { findSpan, isApart } from '../geometry/sweep';
import type { MachineState, Motion } from '../interpreter/events';
import type { Machine } from '../shop/setup';
import { figure, text } from './finding-data';
import { isPlaced, movedWords } from './placing';
import { defineRule } from './rule';

/** The tip goes deeper into the spoilboard than the shop allows. */
export const intoSpoilboard = defineRule({
  id: 'into-spoilboard',
  group: 'travel-and-clearance',
  title: 'The tip goes too deep into the spoilboard',
  severity: 'stop',
  protects: 'The spoilboard, the table under it, and the cutter.',
  explanation:
    'The tip stands its tool’s real gauge length under the gauge point, whatever the length offset says, so a wrong offset shows here as a wrong depth. At feed it may go into the board by the allowance; a rapid may not touch the board at all, except straight up and inside a cycle’s own hole. Probing is left out. A tool that is not in the tool list is judged by its length offset; with neither, nothing is known of its tip.',
  examples: {
    bad: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X100 Y100 Z5\nG1 Z-20 F1000\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X100 Y100 Z5\nG1 Z-18.5 F1000\nM30',
  },
  word: (data, lengths) => ({
    message:
      text(data, 'kind') === 'rapid'
        ? `The tip goes ${lengths.length(figure(data, 'deep'))} into the spoilboard at rapid.`
        : `The tip goes ${lengths.length(figure(data, 'deep'))} into the spoilboard, ${lengths.length(figure(data, 'by'))} more than the ${lengths.length(figure(data, 'allowance'))} allowed.`,
    advice:
      text(data, 'kind') === 'rapid'
        ? 'Retract above the board before this rapid.'
        : `Cut at least ${lengths.length(figure(data, 'by'))} less deep, or check the height of work zero, the stock’s thickness and the tool’s measured length.`,
  }),
  observe: (shop, report) => {
    const board = shop.setup.machine.spoilboard;
    if (!board) return {};
    const over = openBoardRegion(board);
    const span = openSpan();
    const reference = shop.setup.controller.lengthReference;
    return {
      quiet({ feed, rapid }, state) {
        const drop = dropOf(state, reference);
        if (drop === 0) return;
        feed.above(board.top - board.allowance + drop);
        rapid.above(board.top + drop);
      },
      motion(motion, state) {
        const drop = dropOf(state, reference);
        // The fast test: a motion that stays above the board is none of our business.
        if (motion.minZ - drop >= board.top - LIMIT_SLACK || drop === 0) return;
        const allowance = allowanceFor(motion, board.allowance);
        if (allowance === undefined || !isPlaced(motion, state)) return;
        if (!over.isMet(motion, state, drop, span)) return;
        const deep = board.top - (span.lowest - drop);
        const by = deep - allowance;
        if (by <= LIMIT_SLACK) return;
        report.found(
          {
            cause: allowance === 0 ? 'rapid' : 'deep',
            by,
            at: state.place(movedWords(motion)),
            data: { kind: allowance === 0 ? 'rapid' : 'feed', deep, by, allowance, top: board.top },
          },
          state,
        );
      },
    };
  },
});

/** How far the tip is under the gauge point; 0 when neither tool nor offset says. */
function dropOf(state: MachineState, reference: number): number {
  const { tool } = state.held;
  if (tool) return tool.gaugeLength;
  return state.lengthOffset === 0 ? 0 : state.lengthOffset + reference;
}

/** Depth allowed to a motion of this kind; undefined: it is not judged. */
function allowanceFor(motion: Motion, allowance: number): number | undefined {
  if (motion.by === 'change' || motion.kind === 'probe') return undefined;
  if (motion.kind !== 'rapid' || motion.inHole) return allowance;
  const isLifting =
    motion.fromX === motion.toX && motion.fromY === motion.toY && motion.fromZ <= motion.toZ;
  return isLifting ? undefined : 0;
}

/** Where the gauge point brings the tip below the board's top, over the board. */
function openBoardRegion(board: NonNullable<Machine['spoilboard']>) {
  const area = board.area
    ? boxPrism({ min: board.area.min, max: { ...board.area.max, z: board.top } })
    : boxPrism({ min: {}, max: { z: board.top } });
  let region: Prism = area;
  let bounds: Prism = area;
  let placedDrop = NaN;
  let radius = NaN;
  return {
    isMet(motion: Motion, state: MachineState, drop: number, span: ReturnType<typeof openSpan>) {
      const wide = (state.held.tool?.diameter ?? 0) / 2;
      if (drop !== placedDrop || wide !== radius) {
        placedDrop = drop;
        radius = wide;
        region = meetingRegion(area, cylinderPrism({ x: 0, y: 0 }, wide, [-drop, Infinity]));
        bounds = boundsOf(region);
      }
      return !isApart(motion, bounds) && findSpan(motion, region, span);
    },
  };
}
