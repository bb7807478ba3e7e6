import { LIMIT_SLACK } from '../geometry/tolerance';
import type { FindingData } from '../report/report';
import type { Tool } from '../shop/setup';
import { figure, text, toolWords } from './finding-data';
import { exampleTool } from './example-parts';
import { defineRule } from './rule';
import { watchToolsHandled } from './watch-tools-handled';

const HOLDER = {
  taper: 'ISO30',
  diameter: 50,
  above: 72,
  collet: { min: 5, max: 6, grips: 30 },
  gripped: 24,
};

/** A shank that its collet cannot hold. */
export const colletGrip = defineRule({
  id: 'collet-grip',
  group: 'tools',
  title: 'The collet does not hold the shank as it should',
  severity: 'hold',
  hold: 'look',
  protects: 'The work, and whoever stands near, from a cutter that creeps or flies out.',
  explanation:
    'The shank is held against the clamping range of the collet, and the length gripped against two thirds of the length the collet grips (common practice, no source). Judged only where these are entered. A loose nut cannot be seen.',
  examples: {
    setup: {
      tools: [exampleTool(1, { holder: HOLDER, shank: 6.35 }), exampleTool(2, { holder: HOLDER })],
    },
    bad: 'G21 G90 G54\nT1 M6\nM30',
    good: 'G21 G90 G54\nT2 M6\nM30',
  },
  word: (data, lengths) =>
    text(data, 'reason') === 'range'
      ? {
          message: `The shank of ${toolWords(data)} is ${lengths.length(figure(data, 'shank'))}, outside its collet’s range of ${lengths.length(figure(data, 'min'))} to ${lengths.length(figure(data, 'max'))}.`,
          advice: `Fit T${figure(data, 'tool')} with the collet for its shank, and measure it again.`,
        }
      : {
          message: `The collet of ${toolWords(data)} grips ${lengths.length(figure(data, 'gripped'))} of shank; it needs ${lengths.length(figure(data, 'needs'))}.`,
          advice: `Set the shank of T${figure(data, 'tool')} deeper into the collet, and measure it again.`,
        },
  observe: (shop, report) =>
    watchToolsHandled(shop, ({ tool, place }, state) => {
      const fault = judgeGrip(tool);
      if (!fault) return;
      const { number, name } = tool;
      const data = { tool: number, name, ...fault };
      report.found({ cause: `T${number}`, at: place, tool: number, data }, state);
    }),
});

/** Part of the collet’s gripping length that the shank has to fill; common practice, no source. */
const FILLED = 2 / 3;

function judgeGrip({ shank, holder }: Tool): FindingData | undefined {
  const { collet, gripped } = holder;
  if (!collet) return undefined;
  const { min, max, grips } = collet;
  if (!(min - LIMIT_SLACK <= shank && shank <= max + LIMIT_SLACK))
    return { reason: 'range', shank, min, max };
  if (gripped === undefined || grips === undefined) return undefined;
  const needs = grips * FILLED;
  return gripped >= needs - LIMIT_SLACK ? undefined : { reason: 'length', gripped, needs };
}
