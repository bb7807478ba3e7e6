import { LIMIT_SLACK } from '../geometry/tolerance';
import type { Opening, Rack, Tool } from '../shop/setup';
import type { Shop } from '../shop/shop';
import { figure, toolWords } from './finding-data';
import { exampleRack } from './example-parts';
import { defineRule } from './rule';
import { watchToolsHandled } from './watch-tools-handled';

/** A tool that cannot be lifted over the parked ones it has to cross. */
export const tooLongToCross = defineRule({
  id: 'too-long-to-cross',
  group: 'tools',
  title: 'The tool is too long to be carried over the parked ones',
  severity: 'stop',
  protects: 'Every parked holder in the way of the held tip.',
  explanation:
    'Only where the pocket opens away from the table: the head then has to carry the tool over the row of parked holders, straight or by way of its end. At the greatest Z a change may use, the tip has to be above the highest parked pull stud. Where pockets open towards the table nothing is crossed, and this is silent. A rack that is passed around its end is not known here.',
  examples: {
    setup: exampleRack({ opens: '+y' }),
    bad: 'G21 G90 G54\nT1 M6\nM30',
    good: 'G21 G90 G54\nG53 G0 Z0\nM30',
  },
  word: (data, lengths) => ({
    message: `${toolWords(data)} is ${lengths.length(figure(data, 'by'))} too long to be carried over the parked tools: at the top of Z its tip is at ${lengths.position('z', figure(data, 'tip'))}, the highest parked stud at ${lengths.position('z', figure(data, 'top'))}.`,
    advice: `Set the cutter of T${figure(data, 'tool')} shorter, or use a rack whose pockets open towards the table.`,
  }),
  observe: (shop, report) =>
    watchToolsHandled(shop, ({ tool, place, pockets }, state) => {
      const { rack, machine } = shop.setup;
      const opens = pockets.map((each) => shop.pocketByNumber.get(each)?.opens);
      if (!opens.some((each) => each === awayFromTable(rack))) return;
      const tip = (machine.changeTravel.z ?? machine.travel.z)[1] - tool.gaugeLength;
      const top = highestParked(shop, tool);
      const by = top - tip;
      if (by <= LIMIT_SLACK) return;
      const { number, name } = tool;
      const data = { tool: number, name, by, tip, top };
      report.found({ cause: `T${number}`, by, at: place, tool: number, data }, state);
    }),
});

function awayFromTable({ edge }: Rack): Opening {
  const away = { front: '-y', back: '+y', left: '-x', right: '+x' } as const;
  return away[edge];
}

function highestParked(shop: Shop, held: Tool): number {
  let top = -Infinity;
  for (const { pocket, tool } of shop.setup.loading.pockets) {
    const parked = shop.toolByNumber.get(tool);
    const place = shop.pocketByNumber.get(pocket);
    if (parked && place && parked !== held) top = Math.max(top, place.grip.z + parked.holder.above);
  }
  return top;
}
