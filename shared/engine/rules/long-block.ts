import { figure } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** A block longer than the controller takes. */
export const longBlock = defineRule({
  id: 'long-block',
  group: 'reading',
  title: 'A line longer than the controller reads',
  severity: 'hold',
  hold: 'judge',
  protects: 'The run from a block whose end is cut off.',
  explanation:
    'The longest line is part of the controller description. Comments count, because most controllers count them. What a controller does with the rest differs: refuse, cut off, or carry on.',
  examples: {
    setup: { controller: { longestBlock: 40 } },
    bad: 'G21 G90 G54\nG0 X10 Y10 (A REMARK THAT MAKES THE LINE TOO LONG)\nM30',
    good: 'G21 G90 G54\nG0 X10 Y10 (SHORT)\nM30',
  },
  word: (data) => ({
    message: `The line is ${figure(data, 'length')} characters long; the controller takes ${figure(data, 'limit')}.`,
    advice: 'Shorten the line, usually by its comment, or split it into blocks.',
  }),
  observe: (_shop, report) => reportProblem(report, 'long-block', () => ''),
});
