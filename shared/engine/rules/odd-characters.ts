import { figure, text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** Characters that no block holds, outside comments. */
export const oddCharacters = defineRule({
  id: 'odd-characters',
  group: 'reading',
  title: 'Characters that do not belong in a block',
  severity: 'hold',
  hold: 'judge',
  protects: 'The run from a block that the controller reads in its own way, or refuses.',
  explanation:
    'Outside comments a block holds letters, digits, signs, points and blanks. Anything else usually comes from a wrong encoding or a damaged file. Comments may hold what they like.',
  examples: {
    bad: 'G21 G90 G54\nG0 X10 $\nM30',
    good: 'G21 G90 G54\nG0 X10 (5 $ A SHEET)\nM30',
  },
  word: (data) =>
    figure(data, 'byte') === SPACE
      ? {
          message: `A number is written with a blank inside (${text(data, 'what')}).`,
          advice:
            'Write the number without the blank if it is one, or put in the letter that is lacking.',
        }
      : {
          message: `“${text(data, 'what')}” (byte ${figure(data, 'byte')}) does not belong in a block.`,
          advice:
            'Take the characters out, and look whether the file was damaged or saved in a wrong encoding.',
        },
  observe: (_shop, report) =>
    reportProblem(report, 'odd-characters', (facts) => String(facts['byte'])),
});

const SPACE = 32;
