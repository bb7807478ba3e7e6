import { text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** Signs that the file stops in the middle. */
export const cutShort = defineRule({
  id: 'cut-short',
  group: 'reading',
  title: 'The file stops in the middle',
  severity: 'stop',
  protects: 'The run from ending in the cut, with the spindle turning.',
  explanation:
    'Either the last line stops in the middle of a word and no end code came before it, or the file opens with % and is neither closed by % nor ended. A missing last line end by itself is ordinary.',
  examples: { bad: '%\nG21 G90 G54\nG0 X10\n', good: '%\nG21 G90 G54\nG0 X10\nM30\n%\n' },
  word: (data) =>
    text(data, 'reason') === 'percent'
      ? {
          message: 'The file opens with % but has neither an end code nor a closing %.',
          advice: 'Transfer the file again and compare its size with the source.',
        }
      : {
          message: 'The last line stops in the middle of a word.',
          advice: 'Transfer the file again and compare its size with the source.',
        },
  observe: (_shop, report) => reportProblem(report, 'cut-short', () => ''),
});
