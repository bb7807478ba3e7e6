import type { Tool } from '../shop/setup';
import { figure, toolWords } from './finding-data';
import { exampleTool } from './example-parts';
import { defineRule } from './rule';

/** The spindle is started with something in it that must stand still. */
export const mustNotTurn = defineRule({
  id: 'must-not-turn',
  group: 'tools',
  title: 'The spindle is started with a tool that must not turn',
  severity: 'stop',
  protects: 'Whoever stands near from a probe or a knife thrown out at speed.',
  explanation:
    'Probes, knives and whatever the tool list says never turns. A start at speed zero turns nothing; a speed given later with M3 still on does.',
  examples: {
    setup: {
      tools: [exampleTool(1, { kind: 'knife', turns: 'never' }), exampleTool(2)],
    },
    bad: 'G21 G90 G54\nT1 M6\nS18000 M3\nM30',
    good: 'G21 G90 G54\nT2 M6\nS18000 M3\nT1 M6\nS0 M3\nM30',
  },
  word: (data) => ({
    message: `The spindle is started at ${figure(data, 'speed')} rev/min with ${toolWords(data)} in it, which must not turn.`,
    advice: 'Take the spindle start out of this part of the program.',
  }),
  observe: (_shop, report) => ({
    spindle({ turning, speed, place }, state) {
      const { tool } = state.held;
      if (turning === 'off' || speed === 0 || !tool || !neverTurns(tool)) return;
      const data = { tool: tool.number, name: tool.name, speed };
      report.found({ cause: `T${tool.number}`, at: place, data }, state);
    },
  }),
});

function neverTurns({ turns, kind }: Tool): boolean {
  return turns === 'never' || /^(probe|knife)$/i.test(kind.trim());
}
