import { text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** O for 0, l for 1. */
export const letterForDigit = defineRule({
  id: 'letter-for-digit',
  group: 'reading',
  title: 'A letter where a digit belongs',
  severity: 'stop',
  protects: 'The change, the offset or the move that the controller will not find in this word.',
  explanation:
    'Typed by hand, the letter O passes for a nought and l for a one. The controller reads neither, and may drop the word without a word.',
  examples: { bad: 'G21 G90 G54\nT1 MO6\nM30', good: 'G21 G90 G54\nT1 M06\nM30' },
  word: (data) => ({
    message: `${text(data, 'what')} holds the letter ${text(data, 'letter')} where a digit belongs.`,
    advice: 'Write the digit.',
  }),
  observe: (_shop, report) => reportProblem(report, 'letter-for-digit'),
});
