import { figure, text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** Text that is no block: the controller stops here, or reads it in a way nobody can foretell. */
export const unreadableBlock = defineRule({
  id: 'unreadable-block',
  group: 'reading',
  title: 'A line that is no block',
  severity: 'stop',
  protects: 'The run from stopping half-way, or from a move that nobody wrote.',
  explanation:
    'A block is made of words: a letter with its number. Anything else is refused by some controllers and guessed at by others, so nothing of such a line is carried out in this check, and what follows is judged as if the line were not there.',
  examples: { bad: 'G21 G90 G54\nG0 X10 Y\nM30', good: 'G21 G90 G54\nG0 X10 Y5\nM30' },
  word: (data) => ({ message: describe(data), advice: advise(text(data, 'reason')) }),
  observe: (_shop, report) => reportProblem(report, 'unreadable-block'),
});

function describe(data: Parameters<typeof text>[0]): string {
  const what = text(data, 'what');
  switch (text(data, 'reason')) {
    case 'comment-not-closed':
      return 'A comment is opened with “(” and not closed on its line.';
    case 'exponent':
      return `${what} is written with an exponent, which is no number to most controllers.`;
    case 'comma':
      return `${what} holds a comma where a number is expected.`;
    case 'two-points':
      return `${what} holds more than one decimal point.`;
    case 'no-number':
      return `The letter ${text(data, 'letter')} stands without a number.`;
    case 'too-many-words':
      return `The line holds ${figure(data, 'words')} words; no more than ${figure(data, 'most')} are read.`;
    case 'too-long':
      return `The line is ${figure(data, 'length')} bytes long; no more than ${figure(data, 'most')} are read.`;
    case 'too-large':
      return `${what} is larger than any controller counts.`;
    case 'semicolon':
      return 'A comment stands behind a semicolon, which this controller does not know.';
    case 'percent':
      return 'A “%” stands alone on its line, but the program does not begin with one.';
    case 'line-number-first':
      return `The line number ${what} does not stand first in its block, or is none.`;
    case 'slash':
      return 'A “/” stands inside the block; block delete is only read at its beginning.';
    case 'stray-bracket':
      return 'A “)” closes a comment that was never opened.';
    default:
      return `“${what}” is not a word of a block.`;
  }
}

function advise(reason: string): string {
  if (reason === 'comment-not-closed') return 'Close the comment with “)” on the same line.';
  if (reason === 'exponent') return 'Write the number out in digits, or round it when posting.';
  if (reason === 'no-number') return 'Write the number behind the letter, or take the letter out.';
  if (reason === 'too-long' || reason === 'too-many-words') return 'Split the line into blocks.';
  return 'Correct the line, or put it in a comment if it is only text.';
}
