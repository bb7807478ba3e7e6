import { LIMIT_SLACK } from '../geometry/tolerance';
import { Material } from '../shop/material';
import { figure, toolWords } from './finding-data';
import { isProgramMotion } from './mode-not-stated';
import { defineRule } from './rule';
import { depthUnderStock } from './stock-depth';

/** The cut goes deeper than the tool stands out of its holder. */
export const reachShort = defineRule({
  id: 'reach-short',
  group: 'length',
  title: 'The holder comes down to the stock',
  severity: 'hold',
  hold: 'judge',
  protects: 'The stock from a nut that rubs and burns it, and the tool from being bent.',
  explanation:
    'The tip goes deeper under the top of the stock than the tool stands out of its holder, within the holder’s radius of the stock. What has been cut away before is not known here, so a deep pocket cut wide in layers may be all right. Without a job sheet the stock is taken to lie everywhere, its top at Z zero.',
  examples: {
    bad: 'G21 G90 G54\nT1 M6\nG43 H1 G0 Z5\nS18000 M3\nG0 X50 Y50\nG1 Z-41 F500\nM30',
    good: 'G21 G90 G54\nT1 M6\nG43 H1 G0 Z5\nS18000 M3\nG0 X50 Y50\nG1 Z-18 F500\nM30',
  },
  word: (data, lengths) => ({
    message: `The tip goes ${lengths.length(figure(data, 'depth'))} under the top of the stock, but ${toolWords(data)} stands only ${lengths.length(figure(data, 'stickOut'))} out of its holder.`,
    advice:
      'Use a tool that stands further out, or look whether the stock around is cut away by then.',
  }),
  observe: (shop, report) => {
    const material = new Material(shop);
    return {
      quiet({ feed }, state) {
        const { tool } = state.held;
        if (tool) material.keepClear(feed, state, tool.stickOut);
      },
      motion(motion, state) {
        if (motion.kind === 'rapid' || motion.kind === 'probe' || !isProgramMotion(motion)) return;
        const { tool } = state.held;
        if (!tool) return;
        const depth = depthUnderStock(shop, material, motion, state, tool.holder.diameter / 2);
        const by = depth - tool.stickOut;
        if (by <= LIMIT_SLACK) return;
        const { number, name, stickOut } = tool;
        const data = { tool: number, name, depth, stickOut };
        report.found({ cause: '', by, at: state.place({ letters: 'XYZ' }), data }, state);
      },
    };
  },
});
