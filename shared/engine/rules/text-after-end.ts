import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** Blocks behind the end code. */
export const textAfterEnd = defineRule({
  id: 'text-after-end',
  group: 'reading',
  title: 'Blocks after the end of the program',
  severity: 'note',
  protects: 'Work that is written but never run, such as the second half of two joined files.',
  explanation:
    'Nothing after M2, M30 or the closing % is carried out. Subprograms called from above stand there by right and are not reported. Blank lines and comments are no blocks.',
  examples: {
    bad: 'G21 G90 G54\nM30\nG0 X10',
    good: 'G21 G90 G54\nM30\n(END OF FILE)\n%',
  },
  word: () => ({
    message: 'Blocks stand after the end of the program; they are never run.',
    advice: 'Take them out, or the end code before them if they are meant to run.',
  }),
  observe: (_shop, report) => reportProblem(report, 'text-after-end', () => ''),
});
