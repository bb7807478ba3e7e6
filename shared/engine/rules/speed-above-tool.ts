import { figure, toolWords } from './finding-data';
import { defineRule } from './rule';

/** A speed past what the tool list allows the tool in the spindle. */
export const speedAboveTool = defineRule({
  id: 'speed-above-tool',
  group: 'spindle-and-feed',
  title: 'Faster than the tool may turn',
  severity: 'stop',
  protects: 'Whoever stands near, and the spindle, from a tool that comes apart.',
  explanation:
    'The greatest speed is the tool list’s own figure for the assembly of cutter and holder. Judged whenever the spindle starts or its speed changes with a known tool in it. An override above 100 % at the panel is not known here.',
  examples: {
    setup: { machine: { spindle: { maxRpm: 30000 } } },
    bad: 'G21 G90 G54\nT1 M6\nS28000 M3\nM30',
    good: 'G21 G90 G54\nT1 M6\nS24000 M3\nM30',
  },
  word: (data) => ({
    message: `Turns ${toolWords(data)} at ${figure(data, 'speed')} rev/min; it may turn at most ${figure(data, 'most')}.`,
    advice: 'Lower the speed, and hold the override at 100 % or less.',
  }),
  observe: (_shop, report) => ({
    spindle({ turning, speed, place }, state) {
      const { tool } = state.held;
      if (turning === 'off' || !tool || speed <= tool.maxRpm) return;
      const data = { tool: tool.number, name: tool.name, speed, most: tool.maxRpm };
      report.found({ cause: '', by: speed - tool.maxRpm, at: place, data }, state);
    },
  }),
});
