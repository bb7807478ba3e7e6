import { text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** A call or a jump to something that is nowhere. */
export const subprogramMissing = defineRule({
  id: 'subprogram-missing',
  group: 'reading',
  title: 'What is called or jumped to is not there',
  severity: 'stop',
  protects: 'The run from an alarm half-way, and this check from passing what it never saw.',
  explanation:
    'A subprogram may stand in the same file, as O1000 or as a named or numbered sub, or be given with the controller description by its name. M97 and jumps look for an N number in the program they stand in, ahead first, then from its beginning. A subroutine called by its o-word has to stand in front of its first call. The check goes on behind the call as if it had done nothing.',
  examples: {
    bad: 'G21 G90 G54\nM98 P1000\nM30',
    good: 'G21 G90 G54\nM98 P1000\nM30\nO1000\nG0 Z5\nM99',
  },
  word: (data) => ({
    message: describe(text(data, 'reason'), text(data, 'what')),
    advice: advise(text(data, 'reason')),
  }),
  observe: (_shop, report) => reportProblem(report, 'subprogram-missing'),
});

function describe(reason: string, what: string): string {
  switch (reason) {
    case 'jump':
      return `The jump leads to ${what}, and no block of this program has that number.`;
    case 'line':
      return `The call leads to ${what}, and no block of this program has that number.`;
    case 'return':
      return `The return leads to ${what}, and no block of the program it returns to has that number.`;
    case 'behind':
      return `The subroutine ${what} is called before the program has come by its sub, and is not known there yet.`;
    default:
      return `The subprogram ${what} is neither in this file nor given with the controller description.`;
  }
}

function advise(reason: string): string {
  if (reason === 'behind') return 'Put the subroutine in front of its first call.';
  return reason === 'call'
    ? 'Put the subprogram into the file, or enter its text in the controller description.'
    : 'Number the block that is meant, or correct the number here.';
}
