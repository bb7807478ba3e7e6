import { figure, text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** Two codes in one block that cannot both hold. */
export const modalConflict = defineRule({
  id: 'modal-conflict',
  group: 'reading',
  title: 'Two codes in one block that exclude each other',
  severity: 'stop',
  protects: 'The run from acting on the one of two codes that was not meant.',
  explanation:
    'One block carries out one code of a modal group (NISTIR 6556, 3.4), and one code that claims its axis words. Safety lines as posts write them, such as G80 beside G0, pass unless the controller is described as strict.',
  examples: {
    bad: 'G21 G90 G54\nG90 G91 G0 X10\nM30',
    good: 'G21 G90 G54\nG0 G17 G40 G49 G80 G90\nM30',
  },
  word: (data) => {
    const what = text(data, 'what');
    const other = text(data, 'other');
    switch (text(data, 'reason')) {
      case 'm-words':
        return {
          message: `The block holds more than ${figure(data, 'most')} M words.`,
          advice: 'Spread the M words over several blocks.',
        };
      case 'axis-words':
        return {
          message: `${other} and ${what} both claim the axis words of this block.`,
          advice: 'Write the two codes in blocks of their own, each with its axis words.',
        };
      case 'compensating':
      case 'in-cycle':
      case 'probing':
        return {
          message: `${what} cannot run while ${other} is on.`,
          advice: `Cancel ${other} before it.`,
        };
      case 'machine-move-motion':
        return {
          message: `G53 needs G0 or G1, but ${other} is in force.`,
          advice: 'Write G0 into the G53 block.',
        };
      case 'repeated-code':
        return {
          message: `${what} stands twice in this block.`,
          advice: `Take one ${what} out.`,
        };
      default:
        return {
          message: `${other} and ${what} belong to one modal group and stand in one block.`,
          advice: 'Keep the code that is meant and take the other out.',
        };
    }
  },
  observe: (_shop, report) =>
    reportProblem(
      report,
      'modal-conflict',
      (facts) => `${text(facts, 'reason')} ${text(facts, 'other')} ${text(facts, 'what')}`,
    ),
});
