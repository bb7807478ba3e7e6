import type { LengthOffsetEvent, MachineState } from '../interpreter/events';
import type { Shop } from '../shop/shop';
import { LENGTH_AGREES, lengthInTable, trueOffset } from './true-offset';
import { figure, toolWords } from './finding-data';
import { defineRule } from './rule';
import { usesLengthTable } from './watch-length';

/** G43 with the H of another tool than the one in the spindle. */
export const lengthOffsetOtherTool = defineRule({
  id: 'length-offset-other-tool',
  group: 'length',
  title: 'Length offset of another tool',
  severity: 'stop',
  protects: 'The stock, the table and the tip from the difference between two tools.',
  explanation:
    'The H number is compared with the tool in the spindle, not with the last T, which may only be chosen ahead. Where T names pockets, the number of its pocket is right as well. An H that belongs to no tool of the list and holds the true length of this one is a second offset kept for it, and silent. Where it is not known what the spindle holds, nothing is said.',
  examples: {
    bad: 'G21 G90 G54\nT1 M6\nG43 H2 Z5\nM30',
    good: 'G21 G90 G54\nT1 M6\nT2\nG43 H1 Z5\nM30',
  },
  word: (data) => ({
    message: `H${figure(data, 'offset')} is applied with ${toolWords(data)} in the spindle.`,
    advice: `Write H${figure(data, 'own')}, or the T that is meant.`,
  }),
  observe: (shop, report) => {
    if (!usesLengthTable(shop)) return {};
    let called = 0;
    return {
      toolChanged(event) {
        called = event.written;
      },
      lengthOffset(event, state) {
        if (!isOfAnother(shop, event, state, called)) return;
        const { number: tool, tool: listed } = state.held;
        const own = shop.setup.controller.toolWord === 'pocket' && called ? called : tool;
        const data = { tool, name: listed?.name ?? '', offset: event.number, own };
        report.found({ cause: `H${event.number}`, at: event.place, data }, state);
      },
    };
  },
});

function isOfAnother(
  shop: Shop,
  { code, number, after }: LengthOffsetEvent,
  { held }: MachineState,
  called: number,
): boolean {
  if (code !== 'G43' || number === null || number === 0 || !held.number) return false;
  if (number === held.number || number === called) return false;
  // An H that the table does not hold is a fault of its own, told where it is applied.
  if (lengthInTable(shop, number) === undefined) return false;
  const own = trueOffset(shop, held.tool);
  const isSecondOffset = own !== undefined && Math.abs(after - own) <= LENGTH_AGREES;
  return !(isSecondOffset && !shop.toolByNumber.has(number));
}
