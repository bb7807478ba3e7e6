import { figure, text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** A subprogram that calls itself without end, or calls nested deeper than controllers go. */
export const subprogramLoop = defineRule({
  id: 'subprogram-loop',
  group: 'reading',
  title: 'Subprograms call each other too deep',
  severity: 'stop',
  protects: 'The run from an alarm half-way, with the spindle where the last call left it.',
  explanation:
    'Controllers keep count of the calls they have to return from and raise an alarm beyond 4 to 10 of them. The check goes ten deep. Where a subprogram calls itself that often it is left as a whole; a deeper call of another one is passed over.',
  examples: {
    bad: 'G21 G90 G54\nM98 P1\nM30\nO1\nG0 Z5\nM98 P1\nM99',
    good: 'G21 G90 G54\nM98 P1 L3\nM30\nO1\nG0 Z5\nM99',
  },
  word: (data) => ({
    message:
      text(data, 'reason') === 'recursion'
        ? `The subprogram ${named(text(data, 'what'))} calls itself, and is still doing so ${figure(data, 'most')} calls deep.`
        : `The call of ${named(text(data, 'what'))} stands more than ${figure(data, 'most')} calls deep.`,
    advice: 'End the chain of calls by a condition, or write the repeats as a loop.',
  }),
  observe: (_shop, report) => reportProblem(report, 'subprogram-loop'),
});

/** `O100`, `o<name>`; a line of the program itself is called by its number. */
function named(key: string): string {
  if (key.startsWith('<')) return `o${key}`;
  return key.startsWith('N') ? key : `O${key}`;
}
