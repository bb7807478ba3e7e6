import { text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** One letter twice in a block: which of the two counts differs from controller to controller. */
export const repeatedWord = defineRule({
  id: 'repeated-word',
  group: 'reading',
  title: 'The same letter twice in one block',
  severity: 'stop',
  protects: 'The move from going to the one of two places that was not meant.',
  explanation:
    'Only G and M words may stand more than once in a block (NISTIR 6556, 3.2.5). Some controllers refuse the block, some take the first word, some the last. This check goes on with the last.',
  examples: { bad: 'G21 G90 G54\nG0 X10 X20\nM30', good: 'G21 G90 G54\nG0 X10 Y20\nM30' },
  word: (data) => ({
    message: `The letter ${text(data, 'letter')} stands more than once in this block (${text(data, 'what')}).`,
    advice: 'Keep the word that is meant and take the other out.',
  }),
  observe: (_shop, report) =>
    reportProblem(report, 'repeated-word', (facts) => text(facts, 'letter')),
});
