import { LIMIT_SLACK } from '../geometry/tolerance';
import { Material } from '../shop/material';
import type { Tool } from '../shop/setup';
import { figure, toolWords } from './finding-data';
import { isProgramMotion } from './mode-not-stated';
import { defineRule } from './rule';
import { depthUnderStock } from './stock-depth';

/** The cut goes deeper than the flutes reach. */
export const flutesShort = defineRule({
  id: 'flutes-short',
  group: 'length',
  title: 'The cut is deeper than the flutes',
  severity: 'hold',
  hold: 'judge',
  protects: 'The stock from a shank that rubs and burns it, and the tool from breaking.',
  explanation:
    'The tip goes deeper under the top of the stock than the tool has flutes, so the shank runs in the cut. A shank thinner than the cut clears it and is silent. What has been cut away before is not known here. Without a job sheet the stock is taken to lie everywhere, its top at Z zero.',
  examples: {
    bad: 'G21 G90 G54\nT1 M6\nG43 H1 G0 Z5\nS18000 M3\nG0 X50 Y50\nG1 Z-26 F500\nM30',
    good: 'G21 G90 G54\nT1 M6\nG43 H1 G0 Z5\nS18000 M3\nG0 X50 Y50\nG1 Z-18 F500\nM30',
  },
  word: (data, lengths) => ({
    message: `The tip goes ${lengths.length(figure(data, 'depth'))} under the top of the stock, but the flutes of ${toolWords(data)} are ${lengths.length(figure(data, 'fluteLength'))} long.`,
    advice: 'Use a tool with longer flutes, or look whether the stock around is cut away by then.',
  }),
  observe: (shop, report) => {
    const material = new Material(shop);
    return {
      quiet({ feed }, state) {
        const { tool } = state.held;
        if (tool && shankFollows(tool)) material.keepClear(feed, state, tool.fluteLength);
      },
      motion(motion, state) {
        if (motion.kind === 'rapid' || motion.kind === 'probe' || !isProgramMotion(motion)) return;
        const { tool } = state.held;
        if (!tool || !shankFollows(tool)) return;
        const depth = depthUnderStock(shop, material, motion, state, 0);
        const by = depth - tool.fluteLength;
        if (by <= LIMIT_SLACK) return;
        const { number, name, fluteLength } = tool;
        const data = { tool: number, name, depth, fluteLength };
        report.found({ cause: '', by, at: state.place({ letters: 'XYZ' }), data }, state);
      },
    };
  },
});

/** A shank thinner than the cut by this on either side (mm) does not rub; half of a fresh cutter’s wear. */
const CLEARANCE = 0.1;

/** A flute length of nought is one nobody entered. */
function shankFollows(tool: Tool): boolean {
  if (tool.turns === 'never' || tool.fluteLength === 0) return false;
  return tool.shank > tool.diameter - 2 * CLEARANCE;
}
