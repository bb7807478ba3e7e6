import { figure, toolWords } from './finding-data';
import { exampleRack, exampleTool } from './example-parts';
import { defineRule } from './rule';
import { watchToolsHandled } from './watch-tools-handled';

/** A tool heavier than its pocket is made for. */
export const tooHeavy = defineRule({
  id: 'too-heavy',
  group: 'tools',
  title: 'The tool is too heavy for its pocket',
  severity: 'hold',
  hold: 'look',
  protects: 'The fork from bending, and the holder from dropping out of it.',
  explanation:
    'Judged only where both the tool’s mass with its holder and the pocket’s heaviest load are entered.',
  examples: {
    setup: {
      ...exampleRack({ heaviest: 1.2 }),
      tools: [exampleTool(1, { mass: 1.5 }), exampleTool(2, { mass: 0.9 })],
    },
    bad: 'G21 G90 G54\nT1 M6\nM30',
    good: 'G21 G90 G54\nT2 M6\nM30',
  },
  word: (data) => ({
    message: `${toolWords(data)} weighs ${figure(data, 'mass')} kg with its holder; pocket ${figure(data, 'pocket')} takes ${figure(data, 'heaviest')} kg.`,
    advice: `Move T${figure(data, 'tool')} to a pocket made for its weight, or look how the fork bears it.`,
  }),
  observe: (shop, report) =>
    watchToolsHandled(shop, ({ tool, place, pockets }, state) => {
      const { number, name, mass } = tool;
      for (const each of pockets) {
        const heaviest = shop.pocketByNumber.get(each)?.heaviest;
        if (mass === undefined || heaviest === undefined || mass <= heaviest) continue;
        const by = mass - heaviest;
        const data = { tool: number, name, pocket: each, mass, heaviest };
        report.found({ cause: `T${number} ${each}`, by, at: place, tool: number, data }, state);
      }
    }),
});
