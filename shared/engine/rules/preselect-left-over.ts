import { figure, has } from './finding-data';
import { defineRule } from './rule';
import { watchSelections } from './watch-selections';

/** The last T of the program is never used. */
export const preselectLeftOver = defineRule({
  id: 'preselect-left-over',
  group: 'tools',
  title: 'A tool is left chosen at the end',
  severity: 'hold',
  hold: 'judge',
  protects: 'The next program from a bare change that fetches this tool.',
  explanation:
    'The program ends with a tool chosen and not fetched. Many posts name the first tool again at the end, ready for the next part: that is only a note. The tool in the spindle chosen again, and T0, leave nothing over.',
  examples: {
    bad: 'G21 G90 G54\nT1 M6\nT2\nG1 X10 F1000\nM30',
    good: 'G21 G90 G54\nT1 M6\nT2\nG1 X10 F1000\nT2 M6\nM30',
  },
  word: (data) =>
    has(data, 'first')
      ? {
          message: `The program ends with T${figure(data, 'tool')}, its first tool, chosen and not fetched.`,
          advice: 'Leave it if this program runs again next; otherwise take the T word out.',
        }
      : {
          message: `The program ends with T${figure(data, 'tool')} chosen and not fetched.`,
          advice: `Take T${figure(data, 'tool')} out, or write the M6 that was meant.`,
        },
  observe: (_shop, report) =>
    watchSelections((left, state) => {
      const { number, place, atEnd, cutAfter, cutBefore, changed, firstTool } = left;
      const isForgottenChange = cutAfter && (!changed || cutBefore);
      if (!atEnd || number === 0 || isForgottenChange) return;
      const isFirst = number === firstTool;
      const data = { tool: number, ...(isFirst && { first: true }) };
      const severity = isFirst ? 'note' : 'hold';
      report.found({ cause: `T${number}`, at: place, severity, tool: number, data }, state);
    }),
});
