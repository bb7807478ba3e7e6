import type { MachineState, Motion } from '../interpreter/events';
import type { Shop } from '../shop/shop';
import { figure, has, toolWords } from './finding-data';
import { defineRule } from './rule';
import { hasLength, usesLengthTable, watchProgramZ, type LengthSinceChange } from './watch-length';

/** Z moves with the length of the tool before. */
export const lengthOffsetStale = defineRule({
  id: 'length-offset-stale',
  group: 'length',
  title: 'Z moves with the length offset of the tool before',
  severity: 'stop',
  protects: 'The stock, the table and the tip from the difference between two tools.',
  explanation:
    'The length applied for the tool before stays in force over a change (NISTIR 6556, 3.6.3). It is ordinary until the next G43, as long as Z does not move in program coordinates in between: G53 and G28 do not count, and the same tool called again keeps its own.',
  examples: {
    bad: 'G21 G90 G54\nT1 M6\nG43 H1 G0 Z5\nT2 M6\nG0 Z5\nM30',
    good: 'G21 G90 G54\nT1 M6\nG43 H1 G0 Z5\nT2 M6\nG53 G0 Z0\nG0 X10\nG43 H2 Z5\nM30',
  },
  word: (data, lengths) => ({
    message: `Z moves with ${toolWords(data)}, but the length offset in force is still ${has(data, 'offset') ? `H${figure(data, 'offset')}` : 'the one'} of the tool before${errorWords(data, lengths.length)}.`,
    advice: `Write G43 H${figure(data, 'tool')} in or before the first block that moves Z.`,
  }),
  observe: (shop, report) => {
    if (!usesLengthTable(shop) || shop.setup.controller.lengthOffset !== 'program') return {};
    const judge = (_motion: Motion, state: MachineState, since: LengthSinceChange) => {
      if (isRight(state, since)) return;
      const { number, tool } = state.held;
      const lower = lowerThanProgrammed(shop, state);
      const data = {
        tool: number,
        name: tool?.name ?? '',
        ...(state.lengthFrom !== null && { offset: state.lengthFrom }),
        ...(lower !== undefined && { lower }),
      };
      report.found({ cause: '', at: state.place({ letters: 'Z' }), data }, state);
    };
    return watchProgramZ(shop, judge, isRight);
  },
});

function isRight(state: MachineState, since: LengthSinceChange): boolean {
  if (since.applied || since.cancelled || !hasLength(state)) return true;
  const { number } = state.held;
  const isOwn = state.lengthFrom === number || state.lengthFrom === since.called;
  return isOwn || state.lengthAppliedFor === number;
}

/** How much lower than programmed the tip runs (mm); undefined where the table holds no true lengths. */
function lowerThanProgrammed(shop: Shop, { held, lengthOffset }: MachineState): number | undefined {
  const { lengthScheme, lengthReference } = shop.setup.controller;
  if (!held.tool || lengthScheme === 'touch-off') return undefined;
  return held.tool.gaugeLength - lengthReference - lengthOffset;
}

function errorWords(data: Parameters<typeof has>[0], length: (mm: number) => string): string {
  const lower = figure(data, 'lower');
  if (Number.isNaN(lower) || lower === 0) return '';
  return `, so its tip runs ${length(Math.abs(lower))} too ${lower > 0 ? 'low' : 'high'}`;
}
