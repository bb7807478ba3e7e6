import { figure } from './finding-data';
import { defineRule } from './rule';
import { watchSelections, type LeftSelection } from './watch-selections';

/** A tool is chosen, none is fetched, and the cutting goes on. */
export const selectedNotChanged = defineRule({
  id: 'selected-not-changed',
  group: 'tools',
  title: 'A tool is chosen but never fetched, and the cutting goes on',
  severity: 'hold',
  hold: 'judge',
  protects: 'The work from being cut with the tool before.',
  explanation:
    'A T word that no later change consumes, with cutting after it. A T that a later M6 uses is a choice made ahead and ordinary, as is one that names the tool in the spindle. A choice left over at the end, made before the last tool had cut, is another matter and has its own rule.',
  examples: {
    bad: 'G21 G90 G54\nT1 M6\nG1 X10 F1000\nT2\nG1 X20\nM30',
    good: 'G21 G90 G54\nT1 M6\nT2\nG1 X10 F1000\nM6\nG1 X20\nM30',
  },
  word: (data) => ({
    message: `T${figure(data, 'tool')} is chosen, but no change follows and the cutting goes on${heldWords(figure(data, 'held'))}.`,
    advice: `Write M6 behind T${figure(data, 'tool')}, or take the T word out.`,
  }),
  observe: (_shop, report) =>
    watchSelections((left, state) => {
      if (!isForgottenChange(left)) return;
      const { number, place, held } = left;
      const data = { tool: number, ...(held !== null && { held }) };
      report.found({ cause: `T${number}`, at: place, tool: number, data }, state);
    }),
});

function isForgottenChange(left: LeftSelection): boolean {
  if (!left.cutAfter || left.number === 0) return false;
  return !left.changed || left.cutBefore || !left.atEnd;
}

function heldWords(held: number): string {
  if (Number.isNaN(held)) return '';
  return held === 0 ? ' with nothing known to be in the spindle' : ` with T${held} in the spindle`;
}
