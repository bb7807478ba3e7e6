import { figure } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** An arc whose end does not lie on the circle its centre gives (NISTIR 6556 section 3.5.3.2). */
export const arcRadiusMismatch = defineRule({
  id: 'arc-radius-mismatch',
  group: 'arcs-and-cycles',
  title: 'The end of an arc is not on its circle',
  severity: 'stop',
  protects:
    'The run from stopping at this block, or from a step where the controller mends the arc.',
  explanation:
    'The distances from start to centre and from end to centre must agree within what this controller allows (arcTolerance of the setup). A post that writes too few decimals, or a number changed by hand, is the usual cause. What a more lenient controller would draw instead cannot be told.',
  examples: {
    bad: 'G21 G90 G54 G17\nG0 X10 Y0\nG3 X0 Y10.5 I-10 J0 F500\nM30',
    good: 'G21 G90 G54 G17\nG0 X10 Y0\nG3 X0 Y10 I-10 J0 F500\nM30',
  },
  word: (data, { length }) => ({
    message: `The arc starts ${length(figure(data, 'start'))} from its centre and ends ${length(figure(data, 'end'))} from it, ${length(figure(data, 'by'))} apart; this controller allows ${length(figure(data, 'tolerance'))}.`,
    advice: 'Post the program again with more decimals, or mend the centre or the end point.',
  }),
  observe: (_shop, report) => reportProblem(report, 'arc-radius-mismatch', () => ''),
});
