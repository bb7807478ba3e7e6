import { figure, text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** Something this check does not understand: from here on it may be blind. */
export const notModelled = defineRule({
  id: 'not-modelled',
  group: 'reading',
  title: 'A code this check does not model',
  severity: 'stop',
  protects: 'The run from being called clear on the strength of lines nobody checked.',
  explanation:
    'The block is left out and the walk goes on, so that one run lists everything. What the machine really does there is not known, and positions after it may differ. A code that only switches something beside the motion can be declared in the controller description as doing nothing.',
  examples: {
    bad: 'G21 G90 G54\nM250\nM30',
    good: 'G21 G90 G54\nM8\nM30',
  },
  word: (data) => ({ message: describe(data), advice: advise(text(data, 'reason')) }),
  observe: (_shop, report) => reportProblem(report, 'not-modelled'),
});

function describe(data: Parameters<typeof text>[0]): string {
  const what = text(data, 'what');
  switch (text(data, 'reason')) {
    case 'flow':
      return `${what} steers the order of the blocks, which this check does not follow.`;
    case 'flow-size':
      return `${what} steers the order of the blocks, which is followed in programs of at most ${figure(data, 'most')} MB.`;
    case 'undecided':
      return `${what} is not known before the run, and not every way the program may take from here was walked.`;
    case 'depends':
      return `${what || 'This block'} depends on ${text(data, 'of')}, which is not known before the run.`;
    case 'system-parameter':
      return `“${what}” sets a parameter of the controller itself, which this check does not follow.`;
    case 'corner':
      return `${what} rounds or breaks the corner there, which this check does not follow.`;
    case 'no-reference':
      return `${what} goes to a reference point that the machine description does not give.`;
    case 'call':
      return `${what} calls another program, which this check does not follow.`;
    case 'other-axis':
      return `${what} moves an axis this check does not follow: beside X, Y and Z it knows A alone.`;
    case 'no-axis':
      return `${what} moves an axis that the machine description does not have.`;
    case 'no-use':
      return `${what} stands here, but no code of the block or in force uses it.`;
    default:
      return `${what || 'This block'} is not modelled by this check.`;
  }
}

function advise(reason: string): string {
  if (reason === 'no-reference')
    return 'Enter the stored reference point in the machine description, then check again.';
  if (reason === 'flow' || reason === 'flow-size')
    return 'Post the program without jumps, or have a person prove this part.';
  if (reason === 'depends')
    return 'If it is a parameter, state its starting value in the controller description; else write the figure into the program, or have a person prove this part.';
  if (reason === 'undecided')
    return 'State the starting value in the controller description, or have a person prove this part.';
  if (reason === 'call') return 'Post the program in one piece, or have a person prove this part.';
  if (reason === 'other-axis')
    return 'Post for a machine without that axis, or have a person prove this part.';
  if (reason === 'no-axis') return 'Post for a machine without that axis, or describe the axis.';
  if (reason === 'no-use') return 'Take the word out, or write the code it belongs to.';
  return 'Take it out if it is not needed, or declare in the controller description what it does.';
}
