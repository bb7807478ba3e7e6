import { figure, text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** A loop that nothing ends. */
export const neverEnds = defineRule({
  id: 'never-ends',
  group: 'reading',
  title: 'A loop that never ends',
  severity: 'stop',
  protects: 'The machine from turning in one place, or cutting on, until somebody stops it.',
  explanation:
    'Found where a loop has turned a thousand times with every parameter as it was, or 300,000 times in all, or where a program has carried out two million blocks beyond one for each of its lines. Nothing behind it is judged. A loop that waits for an input or another value nobody knows before the run is not found here, if that value can end it. M99 at the end of a main program begins it again by intention, and is walked once.',
  examples: {
    bad: 'G21 G90 G54\n#1=0\no1 while [#1 LT 3]\nG0 X#1\no1 endwhile\nM30',
    good: 'G21 G90 G54\n#1=0\no1 while [#1 LT 3]\nG0 X#1\n#1=[#1+1]\no1 endwhile\nM30',
  },
  word: (data) => ({
    message: describe(text(data, 'reason'), text(data, 'what'), figure(data, 'most')),
    advice: 'Correct the condition, or set in the loop what it asks for.',
  }),
  observe: (_shop, report) => reportProblem(report, 'never-ends'),
});

function describe(reason: string, what: string, most: number): string {
  const count = String(most).replace(/\B(?=(\d{3})+$)/g, ',');
  if (reason === 'idle') return `Nothing in the loop of “${what}” changes what could end it.`;
  if (reason === 'turns') return `The loop of “${what}” has not ended after ${count} turns.`;
  return `The program is still going on at “${what}” after ${count} repeated blocks.`;
}
