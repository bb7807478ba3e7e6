import { figure, figures, listed, toolWords } from './finding-data';
import { defineRule } from './rule';
import { watchToolsHandled } from './watch-tools-handled';

/** One tool, two homes: one of the two pockets holds something else. */
export const toolInTwoPockets = defineRule({
  id: 'tool-in-two-pockets',
  group: 'tools',
  title: 'The loading puts one tool into two pockets',
  severity: 'stop',
  protects: 'The rack from a holder put down where another stands.',
  explanation:
    'A tool belongs in one pocket. Where the loading names two, one of them is wrong, and the change may fetch from or put into the wrong one. A sharpened twin needs a number of its own.',
  examples: {
    setup: {
      loading: {
        pockets: [
          { pocket: 1, tool: 1 },
          { pocket: 2, tool: 1 },
        ],
      },
    },
    bad: 'G21 G90 G54\nT1 M6\nM30',
    good: 'G21 G90 G54\nG53 G0 Z0\nM30',
  },
  word: (data) => ({
    message: `The loading puts ${toolWords(data)} into pockets ${listed(figures(data, 'pockets'))}.`,
    advice: `Look at the rack and correct the loading, so that T${figure(data, 'tool')} stands in one pocket only.`,
  }),
  observe: (shop, report) =>
    watchToolsHandled(shop, ({ tool, place, pockets }, state) => {
      if (pockets.length < 2) return;
      const { number, name } = tool;
      const data = { tool: number, name, pockets };
      report.found({ cause: `T${number}`, at: place, tool: number, data }, state);
    }),
});
