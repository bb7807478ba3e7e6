import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** A bracket inside a comment: for most controllers the comment ends too early. */
export const nestedComment = defineRule({
  id: 'nested-comment',
  group: 'reading',
  title: 'A bracket inside a comment',
  severity: 'stop',
  protects: 'The run from a comment whose end is read as code.',
  explanation:
    'A comment may not hold “(” (NISTIR 6556, 3.2.4). Many controllers end the comment at the first “)” and carry out or refuse what is left of it. Behind a semicolon brackets do no harm.',
  examples: {
    bad: 'G21 G90 G54\n(POCKET (ROUGH) PASS)\nM30',
    good: 'G21 G90 G54\n(POCKET, ROUGH PASS)\n; POCKET (ROUGH)\nM30',
  },
  word: () => ({
    message: 'A “(” stands inside a comment, which for many controllers ends at the first “)”.',
    advice: 'Take the inner brackets out of the comment.',
  }),
  observe: (_shop, report) => reportProblem(report, 'nested-comment', () => ''),
});
