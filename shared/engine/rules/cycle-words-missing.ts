import { listed, text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** A drill cycle without the words that say how deep and from where. */
export const cycleWordsMissing = defineRule({
  id: 'cycle-words-missing',
  group: 'arcs-and-cycles',
  title: 'A drill cycle lacks its words',
  severity: 'stop',
  protects: 'The run from an alarm, or from a hole drilled with the words of another cycle.',
  explanation:
    'The first block of a cycle needs its depth and R, and P, Q or I, J, K where the cycle uses them (NISTIR 6556, 3.5.16). Blocks that follow under the same cycle keep them; a change to another cycle does not.',
  examples: {
    bad: 'G21 G90 G54 G17\nG0 Z10\nG81 X10 Y10 Z-5 F500\nG80\nM30',
    good: 'G21 G90 G54 G17\nG0 Z10\nG81 X10 Y10 Z-5 R2 F500\nX20\nG80\nM30',
  },
  word: (data) => {
    const letters = [...text(data, 'letters')];
    return {
      message: `${text(data, 'code')} starts without ${letters.length === 1 ? 'its' : 'its words'} ${listed(letters)}${letters.length === 1 ? ' word' : ''}.`,
      advice: `Write ${listed(letters)} into the first block of the cycle.`,
    };
  },
  observe: (_shop, report) =>
    reportProblem(report, 'cycle-words-missing', (facts) => text(facts, 'code')),
});
