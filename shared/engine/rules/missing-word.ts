import { text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** A code without a word that it needs. */
export const missingWord = defineRule({
  id: 'missing-word',
  group: 'reading',
  title: 'A code lacks a word it needs',
  severity: 'stop',
  protects:
    'The run from an alarm half-way, or from a code that acts with a value left from before.',
  explanation:
    'The block is left out where the missing word decides what happens. Axis words with no motion code in force count as well: at the start, and after G80, nothing says how to move.',
  examples: { bad: 'G21 G90 G54\nG4\nM30', good: 'G21 G90 G54\nG4 P1\nM30' },
  word: (data) =>
    text(data, 'reason') === 'no-motion-code'
      ? {
          message: 'Axis words stand here, but no motion code is in force.',
          advice:
            'Write the motion code this move is meant to have, such as G0 or G1, in the block.',
        }
      : {
          message: `${text(data, 'code')} needs ${anArticle(text(data, 'letter'))} ${text(data, 'letter')} word, and the block has none.`,
          advice: `Add the ${text(data, 'letter')} word, or take ${text(data, 'code')} out.`,
        },
  observe: (_shop, report) =>
    reportProblem(
      report,
      'missing-word',
      (facts) => `${text(facts, 'reason')} ${text(facts, 'code')} ${text(facts, 'letter')}`,
    ),
});

/** Letters whose name begins with a vowel sound. */
function anArticle(letter: string): string {
  return 'AEFHILMNORSX'.includes(letter) ? 'an' : 'a';
}
