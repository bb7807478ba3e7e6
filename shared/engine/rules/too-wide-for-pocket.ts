import { LIMIT_SLACK } from '../geometry/tolerance';
import { parkedOverlap, widestDiameter } from '../shop/parked-bands';
import type { Pocket, Tool } from '../shop/setup';
import type { Shop } from '../shop/shop';
import { figure, has, toolWords } from './finding-data';
import { exampleRack } from './example-parts';
import { defineRule } from './rule';
import { watchToolsHandled } from './watch-tools-handled';

/** A tool wider than its pocket allows, or than its neighbour leaves room for. */
export const tooWideForPocket = defineRule({
  id: 'too-wide-for-pocket',
  group: 'tools',
  title: 'The tool is too wide for its pocket',
  severity: 'stop',
  protects: 'The holders beside it from being struck at every change.',
  explanation:
    'The widest part of cutter and holder is held against the pocket’s largest diameter, and against each loaded neighbour at the heights where both are wide. Tools are taken at their described sizes, with no margin added.',
  examples: {
    setup: exampleRack({ largestDiameter: 40 }),
    bad: 'G21 G90 G54\nT1 M6\nM30',
    good: 'G21 G90 G54\nT2 M6\nM30',
  },
  word: (data, lengths) =>
    has(data, 'neighbour')
      ? {
          message: `${toolWords(data)} in pocket ${figure(data, 'pocket')} overlaps T${figure(data, 'neighbour')} in pocket ${figure(data, 'neighbourPocket')} by ${lengths.length(figure(data, 'by'))}.`,
          advice: `Move one of the two to a pocket with more room beside it.`,
        }
      : {
          message: `${toolWords(data)} is ${lengths.length(figure(data, 'widest'))} across at its widest; pocket ${figure(data, 'pocket')} takes ${lengths.length(figure(data, 'largest'))}.`,
          advice: `Move T${figure(data, 'tool')} to a pocket that takes it, and keep its neighbours clear.`,
        },
  observe: (shop, report) =>
    watchToolsHandled(shop, ({ tool, place, pockets }, state) => {
      const { number, name } = tool;
      for (const pocket of pockets.map((each) => shop.pocketByNumber.get(each))) {
        if (!pocket) continue;
        const widest = widestDiameter(tool);
        const by = widest - pocket.largestDiameter;
        const about = { at: place, tool: number };
        if (!(by <= LIMIT_SLACK)) {
          const data = {
            tool: number,
            name,
            pocket: pocket.number,
            widest,
            largest: pocket.largestDiameter,
          };
          report.found({ ...about, cause: `T${number} ${pocket.number}`, by, data }, state);
        }
        for (const overlap of overlaps(shop, tool, pocket)) {
          const data = { tool: number, name, pocket: pocket.number, ...overlap };
          const cause = `T${number} ${pocket.number} ${overlap.neighbourPocket}`;
          report.found({ ...about, cause, by: overlap.by, data }, state);
        }
      }
    }),
});

function overlaps(shop: Shop, tool: Tool, pocket: Pocket) {
  return shop.setup.loading.pockets.flatMap(({ pocket: other, tool: neighbour }) => {
    const beside = shop.pocketByNumber.get(other);
    const parked = shop.toolByNumber.get(neighbour);
    if (!beside || !parked || beside === pocket || parked === tool) return [];
    const apart = Math.hypot(beside.grip.x - pocket.grip.x, beside.grip.y - pocket.grip.y);
    const by = parkedOverlap(tool, parked, beside.grip.z - pocket.grip.z, apart);
    return by <= LIMIT_SLACK ? [] : [{ neighbour, neighbourPocket: other, by }];
  });
}
