import type { Shop } from '../shop/shop';
import { figure, has, text, toolWords } from './finding-data';
import { exampleRack } from './example-parts';
import { defineRule } from './rule';
import { watchToolsHandled } from './watch-tools-handled';

/** A holder of another family than the pocket or the spindle. */
export const holderFamily = defineRule({
  id: 'holder-family',
  group: 'tools',
  title: 'The holder is of another family',
  severity: 'stop',
  protects: 'The spindle taper, and the fork, from a holder that does not seat.',
  explanation:
    'Families of the same size number have different flanges and pull studs: a fork cut for one does not hold the other. Names are compared as entered, but for blanks, hyphens and case. The spindle is taken to be of the family that all pockets share.',
  examples: {
    setup: exampleRack({ taper: 'BT30' }),
    bad: 'G21 G90 G54\nT1 M6\nM30',
    good: 'G21 G90 G54\nT2 M6\nM30',
  },
  word: (data) => ({
    message: `${toolWords(data)} has a holder of family ${text(data, 'holder')}, but ${has(data, 'pocket') ? `pocket ${figure(data, 'pocket')}` : 'the spindle'} takes ${text(data, 'takes')}.`,
    advice: `Put the cutter of T${figure(data, 'tool')} into a holder of family ${text(data, 'takes')}, or correct the entry that is wrong.`,
  }),
  observe: (shop, report) => {
    const spindle = spindleFamily(shop);
    return watchToolsHandled(shop, ({ tool, place, pockets }, state) => {
      const { number, name, holder } = tool;
      const misfit = (takes: string, pocket?: number) => {
        const data = { tool: number, name, holder: holder.taper, takes, ...(pocket && { pocket }) };
        report.found({ cause: `T${number} ${pocket ?? ''}`, at: place, tool: number, data }, state);
      };
      for (const each of pockets) {
        const { taper } = shop.pocketByNumber.get(each) ?? holder;
        if (familyName(taper) !== familyName(holder.taper)) misfit(taper, each);
      }
      if (pockets.length === 0 && spindle && familyName(spindle) !== familyName(holder.taper))
        misfit(spindle);
    });
  },
});

function familyName(taper: string): string {
  return taper.replace(/[\s-]/g, '').toUpperCase();
}

function spindleFamily(shop: Shop): string | undefined {
  const [first, ...others] = shop.setup.rack.pockets.map((pocket) => pocket.taper);
  if (first === undefined) return undefined;
  return others.every((each) => familyName(each) === familyName(first)) ? first : undefined;
}
