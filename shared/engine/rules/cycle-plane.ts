import { figure, text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** A drill cycle whose clearance plane lies under its depth. */
export const cyclePlane = defineRule({
  id: 'cycle-plane',
  group: 'arcs-and-cycles',
  title: 'The clearance plane of a drill cycle lies below its depth',
  severity: 'stop',
  protects: 'The stock from a rapid to the bottom of a hole that is not there yet.',
  explanation:
    'R has to lie above the depth (NISTIR 6556, 3.5.16); below it the head would come down at rapid and feed up. A clearance plane above the depth but inside the stock is reached at rapid as well: that is found where the head moves, as a plunge or a rapid through stock.',
  examples: {
    bad: 'G21 G90 G54 G17\nG0 Z10\nG81 X10 Y10 Z2 R-5 F500\nG80\nM30',
    good: 'G21 G90 G54 G17\nG0 Z10\nG81 X10 Y10 Z-5 R2 F500\nG80\nM30',
  },
  word: (data, lengths) => ({
    message: `${text(data, 'code')} has its clearance plane at ${lengths.length(figure(data, 'retract'))}, ${lengths.length(figure(data, 'by'))} under its depth of ${lengths.length(figure(data, 'depth'))}.`,
    advice: 'Write R above the top of the stock, and the depth below it.',
  }),
  observe: (_shop, report) => reportProblem(report, 'cycle-plane', (facts) => text(facts, 'code')),
});
