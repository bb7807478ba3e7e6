import type { MachineState, ProgramEndEvent, SettableState } from '../interpreter/events';
import type { FindingData } from '../report/report';
import type { Shop } from '../shop/shop';
import { endCodeResets } from './end-code-resets';
import { figure, has, text } from './finding-data';
import { defineRule, type Reporter } from './rule';

/** A mode left on that the next program, or a person at the panel, does not expect. */
export const stateLeftOver = defineRule({
  id: 'state-left-over',
  group: 'state',
  title: 'A mode is left on at the end',
  severity: 'hold',
  hold: 'judge',
  protects: 'The next program, and the person jogging, from a mode they do not expect.',
  explanation:
    'Incremental coordinates (G91), inverse-time feed (G93) or cutter compensation still hold as the program ends, and the way it ends does not put them back. In the published language M2 and M30 do (NISTIR 6556, 3.6.1), so there this is silent; ending by M99, by % or by the end of the text resets nothing anywhere. Compensation that is still on at a tool change is told everywhere. A cycle or a local shift left on has a rule of its own.',
  examples: {
    setup: { controller: { language: 'custom-macro' } },
    bad: 'G21 G90 G54\nG91 G28 Z0\nM30',
    good: 'G21 G90 G54\nG91 G28 Z0\nG90\nM30',
  },
  word: (data) => ({
    message:
      text(data, 'end') === 'change'
        ? `${text(data, 'what')} is still on as the tool is changed${setWords(data)}: the radius of the old cutter would hold for the new one.`
        : `${text(data, 'what')} is still on as the program ends${setWords(data)}, and ${endWords(text(data, 'end'))} does not put it back.`,
    advice: `Write ${text(data, 'cure')} before the ${text(data, 'end') === 'change' ? 'change' : 'end'}.`,
  }),
  observe: (shop, report) => ({
    toolChanging({ place }, state) {
      if (state.compensation === 'off') return;
      const what = state.compensation === 'left' ? 'G41' : 'G42';
      const setAt = state.setAt('compensation')?.line;
      const data = { what, cure: 'G40', end: 'change', ...(setAt !== undefined && { setAt }) };
      report.found({ cause: `${what} change`, at: place, data }, state);
    },
    programEnd(event, state) {
      if (!endCodeResets(shop.setup.controller, event.code)) judgeEnd(shop, report, event, state);
    },
  }),
});

function judgeEnd(shop: Shop, report: Reporter, event: ProgramEndEvent, state: MachineState): void {
  const { defaults } = shop.setup.controller;
  const left = (what: string, cure: string, by: SettableState) => {
    const setAt = state.setAt(by)?.line;
    const data = { what, cure, end: event.code, ...(setAt !== undefined && { setAt }) };
    report.found({ cause: what, at: event.place, data }, state);
  };
  if (state.distance !== defaults.distance && state.distance === 'incremental')
    left('G91', 'G90', 'distance');
  if (state.feedMode !== defaults.feed && state.feedMode === 'inverse-time')
    left('G93', 'G94', 'feedMode');
  if (state.compensation !== 'off')
    left(state.compensation === 'left' ? 'G41' : 'G42', 'G40', 'compensation');
}

const setWords = (data: FindingData): string =>
  has(data, 'setAt') ? ` (set in line ${figure(data, 'setAt')})` : '';

function endWords(code: string): string {
  if (code === 'end-of-text') return 'the end of the text';
  return code === '%' ? 'the closing %' : code;
}
