import { openSpan } from '../geometry/span';
import { Material } from '../shop/material';
import { openCutRecord } from './cut-record';
import { figure } from './finding-data';
import { defineRule } from './rule';

/** A rapid straight down into the stock. */
export const plungeAtRapid = defineRule({
  id: 'plunge-at-rapid',
  group: 'travel-and-clearance',
  title: 'A rapid plunges into the stock',
  severity: 'stop',
  protects: 'The cutter and the spindle bearings from being driven into material at full speed.',
  explanation:
    'A rapid straight down that takes the tip under the top of the stock, by the tool’s real length, so that a wrong length offset shows here too. Into stock that nothing has cut it is a stop; into a place that this program has cut to that depth it is a hold, because what is left standing there is not followed yet. A cycle’s own rapids inside its hole are never meant. Without a job sheet everything under Z zero counts as stock.',
  examples: {
    bad: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5\nG0 Z-5\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5\nG0 Z0.5\nG1 Z-5 F1000\nM30',
  },
  word: (data, lengths) => ({
    message:
      data['cut'] === true
        ? `Plunges at rapid to ${lengths.length(figure(data, 'deep'))} under the top of the stock, where this program has cut but the space is not known to be cleared.`
        : `Plunges at rapid ${lengths.length(figure(data, 'deep'))} into the stock.`,
    advice:
      data['cut'] === true
        ? 'Look that the hole or pocket is clear at this place, or stop the rapid above the stock and feed from there.'
        : 'Stop the rapid above the stock and plunge at feed; if the depth itself surprises, check the length offset and the height of work zero.',
  }),
  observe: (shop, report) => {
    const material = new Material(shop);
    const cut = openCutRecord(shop, material, report.cuts);
    const span = openSpan();
    return {
      quiet({ feed, rapid }, state) {
        material.keepClear(rapid, state);
        if (report.cuts.isKept) material.keepClear(feed, state);
      },
      motion(motion, state) {
        if (motion.kind !== 'rapid') return cut.record(motion, state);
        if (motion.inHole || motion.by === 'change' || motion.fromZ <= motion.toZ) return;
        if (motion.fromX !== motion.toX || motion.fromY !== motion.toY) return;
        if (!material.isMet(motion, state, span)) return;
        const deep = material.depthAt(span.lowest, state);
        const isCut = cut.isCut(motion, state, span);
        report.found(
          {
            cause: isCut ? 'cut' : 'standing',
            by: deep,
            at: state.place({ letters: 'Z' }),
            ...(isCut ? { severity: 'hold' } : {}),
            data: { deep, cut: isCut },
          },
          state,
        );
      },
    };
  },
});
