import { openSpan } from '../geometry/span';
import { Material } from '../shop/material';
import { figure, has, toolWords } from './finding-data';
import { movedWords } from './placing';
import { defineRule } from './rule';

/** A feed move in the stock while the spindle stands. Common practice, no source. */
export const cutSpindleOff = defineRule({
  id: 'cut-spindle-off',
  group: 'spindle-and-feed',
  title: 'Cuts with the spindle off',
  severity: 'stop',
  protects:
    'The cutter, the work and its clamping from a cutter pushed through material without turning.',
  explanation:
    'A feed motion that takes the tip into the stock, by the tool’s real length, while the spindle is off. Feed moves above or beside the stock are free, as are probing and tools that never turn (drag knives, probes). Without a job sheet everything under Z zero counts as stock; where nothing is known of the stock, any feed move sideways counts.',
  examples: {
    bad: 'G21 G90 G17 G54\nT1 M6\nG43 H1\nG0 X50 Y50 Z5\nG1 Z-5 F1000\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5\nG1 Z-5 F1000\nM30',
  },
  word: (data, lengths) => ({
    message: `${has(data, 'tool') ? toolWords(data) : 'The tool'} cuts with the spindle off${
      has(data, 'deep')
        ? `, ${lengths.length(figure(data, 'deep'))} under the top of the stock`
        : ''
    }.`,
    advice: 'Start the spindle with M3 and its S word before this block, after the tool change.',
  }),
  observe: (shop, report) => {
    const material = new Material(shop);
    const span = openSpan();
    return {
      quiet({ feed }, state) {
        if (state.turning !== 'off') return;
        if (material.regionFor(state)) material.keepClear(feed, state);
        else feed.close();
      },
      motion(motion, state) {
        if (state.turning !== 'off') return;
        if (motion.kind !== 'feed' && motion.kind !== 'arc') return;
        const { tool } = state.held;
        if (motion.by === 'change' || tool?.turns === 'never') return;
        const isKnown = material.regionFor(state) !== undefined;
        if (isKnown) {
          if (!material.isMet(motion, state, span)) return;
        } else if (motion.fromX === motion.toX && motion.fromY === motion.toY) return;
        const deep = isKnown ? material.depthAt(span.lowest, state) : 0;
        report.found(
          {
            cause: '',
            by: deep,
            at: state.place(movedWords(motion)),
            data: {
              ...(tool ? { tool: tool.number, name: tool.name } : {}),
              ...(isKnown ? { deep } : {}),
            },
          },
          state,
        );
      },
    };
  },
});
