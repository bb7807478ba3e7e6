import { text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** A whole number that this controller counts in its least increments. */
export const noDecimalPoint = defineRule({
  id: 'no-decimal-point',
  group: 'reading',
  title: 'A length without a decimal point',
  severity: 'hold',
  hold: 'judge',
  protects: 'The work from a move a thousand times too short.',
  explanation:
    'This controller is described as counting numbers without a point in least increments: X10 is then 0.010 mm. The check reads it so. Counts, tool numbers and codes need no point.',
  examples: {
    setup: { controller: { numbers: 'least-increment' } },
    bad: 'G21 G90 G54\nG0 X10\nM30',
    good: 'G21 G90 G54\nG0 X10.\nM30',
  },
  word: (data, lengths) => ({
    message: `${text(data, 'what')} has no decimal point, so this controller counts it in least increments${meaning(data, lengths)}.`,
    advice: 'Write the decimal point if the plain length is meant.',
  }),
  observe: (_shop, report) =>
    reportProblem(report, 'no-decimal-point', (facts) => text(facts, 'letter')),
});

function meaning(
  data: Parameters<typeof text>[0],
  lengths: { length(mm: number): string },
): string {
  const value = data['length'];
  return typeof value === 'number' ? `: ${lengths.length(value)}` : '';
}
