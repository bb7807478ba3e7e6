import { LIMIT_SLACK } from '../geometry/tolerance';
import { figure, toolWords } from './finding-data';
import { exampleRack } from './example-parts';
import { defineRule } from './rule';
import { watchToolsHandled } from './watch-tools-handled';

/** A tool that reaches further down than its pocket has room. */
export const tooLongForPocket = defineRule({
  id: 'too-long-for-pocket',
  group: 'tools',
  title: 'The tool is too long for its pocket',
  severity: 'stop',
  protects: 'The tip, and what stands under the pocket, when the holder is put away.',
  explanation:
    'The gauge length is held against the longest tool that the pocket takes. What stands under the pocket is not known otherwise.',
  examples: {
    setup: exampleRack({ longest: 90 }),
    bad: 'G21 G90 G54\nT1 M6\nM30',
    good: 'G21 G90 G54\nT2 M6\nM30',
  },
  word: (data, lengths) => ({
    message: `${toolWords(data)} is ${lengths.length(figure(data, 'gaugeLength'))} long from the gauge line; pocket ${figure(data, 'pocket')} takes ${lengths.length(figure(data, 'longest'))}.`,
    advice: `Move T${figure(data, 'tool')} to a pocket that takes its length, or set the cutter shorter and measure it again.`,
  }),
  observe: (shop, report) =>
    watchToolsHandled(shop, ({ tool, place, pockets }, state) => {
      const { number, name, gaugeLength } = tool;
      for (const each of pockets) {
        const longest = shop.pocketByNumber.get(each)?.longest ?? Infinity;
        const by = gaugeLength - longest;
        if (by <= LIMIT_SLACK) continue;
        const data = { tool: number, name, pocket: each, gaugeLength, longest };
        report.found({ cause: `T${number} ${each}`, by, at: place, tool: number, data }, state);
      }
    }),
});
