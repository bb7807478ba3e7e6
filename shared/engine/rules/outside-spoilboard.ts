import { LIMIT_SLACK } from '../geometry/tolerance';
import { openSpan } from '../geometry/span';
import { Material } from '../shop/material';
import { figure } from './finding-data';
import { isPlaced, movedWords } from './placing';
import { defineRule } from './rule';

/** The tool cuts where there is no spoilboard under the stock. */
export const outsideSpoilboard = defineRule({
  id: 'outside-spoilboard',
  group: 'travel-and-clearance',
  title: 'Cuts beyond the spoilboard',
  severity: 'hold',
  hold: 'judge',
  protects: 'The table, its clamps and the cutter where nothing soft lies under the stock.',
  explanation:
    'A feed motion in the stock with the spindle turning, whose middle line leaves the area of the spoilboard. Without a job sheet everything under Z zero counts as stock. Machines whose spoilboard has no stated area are not judged.',
  examples: {
    setup: { job: { stock: { max: { x: 1300 } } } },
    bad: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X1200 Y50 Z5\nG1 Z-5 F1000\nG1 X1220\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X1200 Y50 Z5\nG1 Z-5 F1000\nG1 X1205\nM30',
  },
  word: (data, lengths) => ({
    message: `Cuts ${lengths.length(figure(data, 'by'))} beyond the edge of the spoilboard.`,
    advice:
      'Move the stock or work zero so that the board lies under every cut, or look what lies there.',
  }),
  observe: (shop, report) => {
    const area = shop.setup.machine.spoilboard?.area;
    if (!area) return {};
    const material = new Material(shop);
    const span = openSpan();
    const { min, max } = area;
    return {
      quiet({ feed }, state) {
        if (state.turning === 'off') return;
        feed.within({ x: [min.x, max.x], y: [min.y, max.y] });
      },
      motion(motion, state) {
        const by = Math.max(
          min.x - motion.minX,
          motion.maxX - max.x,
          min.y - motion.minY,
          motion.maxY - max.y,
        );
        if (by <= LIMIT_SLACK) return;
        if (motion.kind !== 'feed' && motion.kind !== 'arc') return;
        if (state.turning === 'off' || motion.by === 'change') return;
        if (!isPlaced(motion, state) || !material.isMet(motion, state, span)) return;
        report.found(
          { cause: 'edge', by, at: state.place(movedWords(motion)), data: { by } },
          state,
        );
      },
    };
  },
});
