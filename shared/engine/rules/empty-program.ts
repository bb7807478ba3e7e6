import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** A program without a single word. */
export const emptyProgram = defineRule({
  id: 'empty-program',
  group: 'reading',
  title: 'The program holds no block',
  severity: 'stop',
  protects: 'The night’s work from a file that was never written.',
  explanation: 'A file of blank lines, comments and percent marks alone moves nothing.',
  examples: { bad: '%\n(NOTHING HERE)\n%\n', good: 'G21 G90 G54\nM30' },
  word: () => ({
    message: 'The program holds no block at all.',
    advice: 'Post the program again and look at its size before loading it.',
  }),
  observe: (_shop, report) => reportProblem(report, 'empty-program', () => ''),
});
