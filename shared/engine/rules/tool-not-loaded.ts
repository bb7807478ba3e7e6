import type { ToolChangedEvent } from '../interpreter/events';
import type { Shop } from '../shop/shop';
import { figure, has, toolWords } from './finding-data';
import { defineRule } from './rule';

/** A change to a tool that no pocket holds. */
export const toolNotLoaded = defineRule({
  id: 'tool-not-loaded',
  group: 'tools',
  title: 'The tool is in no pocket',
  severity: 'stop',
  protects: 'The rack and the work from a spindle that comes back empty, or with another tool.',
  explanation:
    'The tool list knows the tool, but the loading puts it in no pocket and does not name it as fitted by hand. On a machine that changes by hand every tool is fitted by hand, and this is silent. Where T names a pocket, an empty or unknown pocket is meant.',
  examples: {
    setup: { loading: { pockets: [{ pocket: 1, tool: 1 }] } },
    bad: 'G21 G90 G54\nT2 M6\nM30',
    good: 'G21 G90 G54\nT1 M6\nM30',
  },
  word: (data) =>
    has(data, 'pocket')
      ? {
          message: `T${figure(data, 'pocket')} names pocket ${figure(data, 'pocket')}, which the loading leaves empty.`,
          advice: 'Put the tool that is meant into that pocket and record it in the loading.',
        }
      : {
          message: `${toolWords(data)} is called, but the loading puts it in no pocket.`,
          advice: `Put T${figure(data, 'tool')} into a free pocket and record it in the loading.`,
        },
  observe: (shop, report) => ({
    toolChanging(event, state) {
      if (namesEmptyPocket(shop, event)) {
        const data = { pocket: event.written };
        report.found({ cause: `P${event.written}`, at: event.place, data }, state);
        return;
      }
      const { tool, from, place } = event;
      if (!tool || isAtHand(shop, tool.number) || from.number === tool.number) return;
      const data = { tool: tool.number, name: tool.name };
      report.found({ cause: `T${tool.number}`, at: place, tool: tool.number, data }, state);
    },
  }),
});

function namesEmptyPocket(shop: Shop, event: ToolChangedEvent): boolean {
  if (shop.setup.controller.toolWord !== 'pocket' || event.written === 0) return false;
  return !shop.toolOfPocket.has(event.written);
}

function isAtHand(shop: Shop, tool: number): boolean {
  return (
    shop.setup.controller.toolChange === 'manual' ||
    shop.fittedByHand.has(tool) ||
    shop.pocketsOfTool.has(tool)
  );
}
