import { text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** No end code: nothing says that the file is whole, and nothing is reset. */
export const missingEnd = defineRule({
  id: 'missing-end',
  group: 'reading',
  title: 'The program has no end code',
  severity: 'hold',
  hold: 'judge',
  protects: 'The run from a file that was cut short, and the next one from what this leaves on.',
  explanation:
    'Reported only when M2, M30 and M99 are all absent. The end code stops spindle and coolant and resets modes; without it they stay as they are. A subprogram that is left by reaching the end of its text is reported as well. A missing end is also the commonest sign of a file that was not transferred whole.',
  examples: { bad: 'G21 G90 G54\nG0 X10\nM5', good: 'G21 G90 G54\nG0 X10\nM5\nM30' },
  word: (data) =>
    text(data, 'reason') === 'subprogram'
      ? {
          message: 'The subprogram called here ends without M99.',
          advice: 'Write M99 at its end; some controllers raise an alarm instead of returning.',
        }
      : {
          message: 'The program ends without M2, M30 or M99.',
          advice:
            'Compare the file with its source; if it is whole, write the end code that this controller uses.',
        },
  observe: (_shop, report) => reportProblem(report, 'missing-end', (facts) => text(facts, 'what')),
});
