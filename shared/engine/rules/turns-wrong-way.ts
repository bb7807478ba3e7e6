import { has, text, toolWords } from './finding-data';
import { defineRule } from './rule';

/** The spindle is started against the hand of the tool. */
export const turnsWrongWay = defineRule({
  id: 'turns-wrong-way',
  group: 'tools',
  title: 'The spindle turns the wrong way for this tool',
  severity: 'stop',
  protects: 'The cutter and the work from edges that rub, and the nut from coming loose.',
  explanation:
    'M3 turns clockwise, M4 counterclockwise (NISTIR 6556, 3.6.2); the tool list says which way the cutter cuts. A spindle that only turns one way is held to it as well. A start at speed zero turns nothing.',
  examples: {
    bad: 'G21 G90 G54\nT1 M6\nS18000 M4\nM30',
    good: 'G21 G90 G54\nT1 M6\nS18000 M3\nM30',
  },
  word: (data) => ({
    message: has(data, 'tool')
      ? `${text(data, 'code')} turns ${wayWords(text(data, 'turning'))}, but ${toolWords(data)} cuts ${wayWords(text(data, 'cuts'))}.`
      : `${text(data, 'code')} turns ${wayWords(text(data, 'turning'))}, which this spindle does not do.`,
    advice: `Write ${text(data, 'turning') === 'cw' ? 'M4' : 'M3'} if that is what is meant, or correct the entry that is wrong.`,
  }),
  observe: (shop, report) => ({
    spindle({ turning, speed, code, place }, state) {
      if (turning === 'off' || speed === 0) return;
      const { tool } = state.held;
      if (tool && tool.turns !== 'never' && tool.turns !== turning) {
        const data = {
          code: startCode(turning),
          turning,
          tool: tool.number,
          name: tool.name,
          cuts: tool.turns,
        };
        report.found({ cause: turning, at: place, data }, state);
      } else if (!shop.setup.machine.spindle.turns.includes(turning)) {
        report.found({ cause: turning, at: place, data: { code, turning } }, state);
      }
    },
  }),
});

function startCode(turning: 'cw' | 'ccw'): string {
  return turning === 'cw' ? 'M3' : 'M4';
}
function wayWords(way: string): string {
  return way === 'cw' ? 'clockwise' : 'counterclockwise';
}
