import { figure, toolWords } from './finding-data';
import { defineRule } from './rule';
import { LENGTH_AGREES, lengthInTable, trueOffset } from './true-offset';
import { usesLengthTable } from './watch-length';

/** The offset table and the tool list give one tool two lengths. */
export const lengthOffsetDisagrees = defineRule({
  id: 'length-offset-disagrees',
  group: 'length',
  title: 'The offset table and the tool list disagree about a length',
  severity: 'hold',
  hold: 'look',
  protects: 'The depth of every cut, and the tip, from a length that is not true.',
  explanation:
    'The value applied is held against the gauge length, less the reference of the table. More than 0.05 mm apart is a matter to look at, more than 1 mm a stop. Which of the two is true, the check cannot say. Tables of touch-off values hold no true lengths and are not judged.',
  examples: {
    setup: { offsets: { length: { 1: 95.4 } } },
    bad: 'G21 G90 G54\nT1 M6\nG43 H1 Z5\nM30',
    good: 'G21 G90 G54\nT2 M6\nG43 H2 Z5\nM30',
  },
  word: (data, lengths) => ({
    message: `The offset table holds ${lengths.length(figure(data, 'table'))} for ${toolWords(data)}, the tool list makes it ${lengths.length(figure(data, 'listed'))}: its tip runs ${lengths.length(Math.abs(figure(data, 'lower')))} too ${figure(data, 'lower') > 0 ? 'low' : 'high'}, if the list is right.`,
    advice: `Measure T${figure(data, 'tool')} and correct the one that is wrong.`,
  }),
  observe: (shop, report) => {
    if (!usesLengthTable(shop)) return {};
    let called = 0;
    return {
      toolChanging(event) {
        called = event.written;
      },
      lengthOffset({ code, number, after, place }, state) {
        const { tool } = state.held;
        const listed = trueOffset(shop, tool);
        if (code !== 'G43' || !tool || listed === undefined || number === null) return;
        const isOwn = number === tool.number || number === called;
        if (!isOwn || lengthInTable(shop, number) === undefined) return;
        const lower = listed - after;
        const by = Math.abs(lower);
        if (by <= LENGTH_AGREES + ROUNDING) return;
        const data = { tool: tool.number, name: tool.name, table: after, listed, lower };
        const severity = by <= FAR_APART + ROUNDING ? 'hold' : 'stop';
        report.found({ cause: `H${number}`, by, at: place, severity, data }, state);
      },
    };
  },
});

/** Beyond this (mm) it is another tool, or another datum: rules.md. */
const FAR_APART = 1;
/** Differences of decimal figures are off in their last digits. */
const ROUNDING = 1e-9;
