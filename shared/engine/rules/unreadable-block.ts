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
    case 'value-missing':
      return `A value is missing behind “${what}”.`;
    case 'value':
      return `“${what}” stands where a value is expected.`;
    case 'bracket-not-closed':
      return `The bracket “[” of “${what}” is not closed.`;
    case 'operator':
      return `“${what}” stands where an operator or a closing bracket is expected.`;
    case 'comparison':
      return `“${what}” compares, which the published language does not know.`;
    case 'needs-brackets':
      return `The value in “${what}” is worked out without brackets, which this controller does not read.`;
    case 'sign':
      return `A sign stands right before a computed value in “${what}”, which the published language refuses.`;
    case 'function':
      return `“${what}” is no function of this controller, or stands without its bracket.`;
    case 'atan':
      return 'ATAN needs two values here: ATAN[y]/[x].';
    case 'exists':
      return 'EXISTS asks for a named parameter: EXISTS[#<name>].';
    case 'too-deep':
      return 'More brackets stand within one another than any controller reads.';
    case 'too-many-values':
      return 'The line holds more values than any controller reads.';
    case 'no-equals':
      return `“${what}” is followed by no “=”, so it neither sets a parameter nor is a word.`;
    case 'misspelt-name':
      return `“${what}” is no parameter; a name begins behind “#<”, and “_” comes first inside it.`;
    case 'named':
      return `“${what}” begins a named parameter, which the published language does not know.`;
    case 'name-not-closed':
      return `The name “${what}” is not closed with “>”.`;
    case 'name-too-long':
    case 'name-empty':
      return `“${what}” is no name of a parameter or subroutine.`;
    case 'control-word':
      return text(data, 'meant') === ''
        ? `“${what}” is no control word.`
        : `“${what}” is no control word; “${text(data, 'meant')}” may be meant.`;
    case 'label':
      return `“${what}” is no label: an O is followed by a number, or by a name in “<>”.`;
    case 'condition':
      return `“${what}” needs a condition or a count in brackets behind it.`;
    case 'flow-values':
      return `“${what}” has more values behind it than it takes.`;
    case 'flow-place':
      return `“${what}” has to stand first in its line.`;
    case 'flow-company':
      return `“${what}” stands in a line that steers the program, and nothing else may stand there.`;
    case 'if-without-then':
      return 'Behind the condition of an IF stands neither GOTO nor THEN.';
    case 'while-without-do':
      return 'Behind the condition of a WHILE stands no DO.';
    case 'loop-number':
      return `“${what}” names no loop: DO and END are followed by its number.`;
    case 'goto-target':
      return 'GOTO names no line to go to.';
    case 'flow-unpaired':
      return `“${what}” belongs to no ${text(data, 'other')} of its label above it.`;
    case 'flow-open':
      return `“${what}” begins what no ${text(data, 'other')} of its label ends.`;
    case 'flow-label':
      return text(data, 'other') === ''
        ? `“${what}” has a label that would have to be worked out, and only a call may.`
        : `The label of “${what}” already belongs to another ${text(data, 'other')}.`;
    case 'flow-crossing':
      return `“${what}” crosses the loop ${text(data, 'other')}.`;
    case 'flow-depth':
      return `“${what}” is no loop: only 1, 2 and 3 are.`;
    case 'into-loop':
      return `The jump to ${what} leads into a loop that has not been begun.`;
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
  if (reason === 'needs-brackets' || reason === 'sign')
    return 'Put the value in brackets: [0-#7] for -#7, #1=[#2+1] for #1=#2+1.';
  if (reason === 'bracket-not-closed') return 'Close the bracket where the value ends.';
  if (reason === 'control-word') return 'Write the control word as the controller knows it.';
  if (reason === 'flow-company' || reason === 'flow-place')
    return 'Give what steers the program a line of its own.';
  if (reason === 'too-long' || reason === 'too-many-words') return 'Split the line into blocks.';
  return 'Correct the line, or put it in a comment if it is only text.';
}
