import type { FindingData } from '../report/report';
import type { Tool } from '../shop/setup';
import { SECONDS_A_DAY, secondsOf } from '../shop/moment';
import type { Shop } from '../shop/shop';
import { figure, text, toolWords } from './finding-data';
import { exampleTool } from './example-parts';
import { defineRule } from './rule';

/** A length nobody has measured, or not since the tool was last handled. */
export const notMeasured = defineRule({
  id: 'not-measured',
  group: 'tools',
  title: 'The tool’s length has not been measured lately',
  severity: 'hold',
  unattended: 'stop',
  hold: 'look',
  protects: 'The spoilboard, the stock and the tip from a length that is no longer true.',
  explanation:
    'Never measured, measured before it was last touched, or longer ago than the shop’s policy allows. Ages are judged against the moment the setup gives; without one, only a length that was never measured is found. Where the macro measures each tool, or zero is set with the tool in the spindle, the length does not come from the list and this is silent.',
  examples: {
    setup: {
      tools: [
        exampleTool(1),
        exampleTool(2, { measured: { at: '2026-11-30T18:00:00Z', method: 'setter' } }),
      ],
    },
    bad: 'G21 G90 G54\nT1 M6\nM30',
    good: 'G21 G90 G54\nT2 M6\nM30',
  },
  word: (data) => ({
    message: describe(data),
    advice: `Measure T${figure(data, 'tool')} and record its length.`,
  }),
  observe: (shop, report) => {
    const { lengthScheme } = shop.setup.controller;
    if (lengthScheme === 'none' || lengthScheme === 'measured-in-macro') return {};
    const seen = new Set<number>();
    return {
      toolChanging({ tool, place }, state) {
        if (!tool || seen.has(tool.number)) return;
        seen.add(tool.number);
        const fault = judgeLength(shop, tool);
        if (!fault) return;
        const data = { tool: tool.number, name: tool.name, ...fault };
        report.found({ cause: `T${tool.number}`, at: place, tool: tool.number, data }, state);
      },
    };
  },
});

function judgeLength(shop: Shop, tool: Tool): FindingData | undefined {
  if (!tool.measured) return { reason: 'never' };
  if (shop.setup.asOf === undefined) return undefined;
  const measured = secondsOf(tool.measured.at);
  if (tool.touched && !(secondsOf(tool.touched) <= measured))
    return { reason: 'touched', measuredAt: tool.measured.at, touchedAt: tool.touched };
  const days = (secondsOf(shop.setup.asOf) - measured) / SECONDS_A_DAY;
  const allowed = shop.setup.policy.unattended.measuredWithinDays;
  return days <= allowed
    ? undefined
    : { reason: 'old', measuredAt: tool.measured.at, days, allowed };
}

function describe(data: Parameters<typeof text>[0]): string {
  switch (text(data, 'reason')) {
    case 'touched':
      return `The length of ${toolWords(data)} was measured before the tool was last touched.`;
    case 'old':
      return `The length of ${toolWords(data)} was measured ${Math.floor(figure(data, 'days'))} days ago; the shop allows ${figure(data, 'allowed')}.`;
    default:
      return `The length of ${toolWords(data)} has never been measured.`;
  }
}
