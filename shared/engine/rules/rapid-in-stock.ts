import type { Motion } from '../interpreter/events';
import { openSpan, type Span } from '../geometry/span';
import { figure } from './finding-data';
import { movedWords } from './placing';
import { defineRule } from './rule';
import { Material } from '../shop/material';
import { openCutRecord } from './cut-record';

/** A rapid that also moves sideways, through stock. */
export const rapidInStock = defineRule({
  id: 'rapid-in-stock',
  group: 'travel-and-clearance',
  title: 'A rapid goes through the stock',
  severity: 'stop',
  protects:
    'The cutter, the work and whoever stands near from a cutter driven through material at full speed.',
  explanation:
    'A rapid with X or Y on which the tip is under the top of the stock, by the tool’s real length. Through stock that nothing has cut it is a stop. Through space that this program has cut at that place to that depth it is a hold, because what is left standing there is not followed yet. A rapid straight up, and a cycle’s own rapids inside its hole, are never meant. Without a job sheet everything under Z zero counts as stock.',
  examples: {
    bad: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5\nG1 Z-5 F1000\nG0 X300\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5\nG1 Z-5 F1000\nG0 Z5\nG0 X300\nM30',
  },
  word: (data, lengths) => ({
    message:
      data['cut'] === true
        ? `Moves at rapid with the tip ${lengths.length(figure(data, 'deep'))} under the top of the stock, through space this program has cut but that is not known to be cleared.`
        : `Moves at rapid through the stock, with the tip ${lengths.length(figure(data, 'deep'))} under its top.`,
    advice:
      data['cut'] === true
        ? `Look that nothing is left standing on this way, or retract at least ${lengths.length(figure(data, 'deep'))} first.`
        : `Retract at least ${lengths.length(figure(data, 'deep'))} before this rapid, or make it a feed move.`,
  }),
  observe: (shop, report) => {
    const material = new Material(shop);
    const cut = openCutRecord(shop, material, report.cuts);
    const isBoxed = shop.setup.controller.rapids === 'independent';
    const span = openSpan();
    const isMet = (motion: Motion, state: Parameters<Material['isMet']>[1], out: Span) =>
      isBoxed ? material.isMetByBox(motion, state, out) : material.isMet(motion, state, out);
    return {
      quiet({ feed, rapid }, state) {
        material.keepClear(rapid, state);
        if (report.cuts.isKept) material.keepClear(feed, state);
      },
      motion(motion, state) {
        if (motion.kind !== 'rapid') return cut.record(motion, state);
        if (motion.inHole || motion.by === 'change') return;
        if (motion.fromX === motion.toX && motion.fromY === motion.toY) return;
        if (!isMet(motion, state, span)) return;
        const deep = material.depthAt(span.lowest, state);
        const isCut = cut.isCut(motion, state, span);
        report.found(
          {
            cause: isCut ? 'cut' : 'standing',
            by: deep,
            at: state.place(movedWords(motion)),
            ...(isCut ? { severity: 'hold' } : {}),
            data: { deep, cut: isCut },
          },
          state,
        );
      },
    };
  },
});
