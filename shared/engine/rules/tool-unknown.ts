import { figure } from './finding-data';
import { defineRule } from './rule';

/** A change to a tool that is not in the tool list. */
export const toolUnknown = defineRule({
  id: 'tool-unknown',
  group: 'tools',
  title: 'The tool is not in the tool list',
  severity: 'stop',
  protects: 'The spindle from fetching nothing, or a tool nobody has described.',
  explanation:
    'Nothing is known of it: not its pocket, not its length, not how fast it may turn. Everything after it is judged with no tool. T0 is no tool and is not meant.',
  examples: { bad: 'G21 G90 G54\nT99 M6\nM30', good: 'G21 G90 G54\nT1 M6\nM30' },
  word: (data) => ({
    message: `T${figure(data, 'tool')} is called, but it is not in the tool list.`,
    advice: `Enter T${figure(data, 'tool')} in the tool list with its measured length, or call the tool that is meant.`,
  }),
  observe: (_shop, report) => ({
    toolChanging(event, state) {
      const { to, tool, place } = event;
      if (to === null || to === 0 || tool) return;
      report.found({ cause: `T${to}`, at: place, tool: to, data: { tool: to } }, state);
    },
  }),
});
