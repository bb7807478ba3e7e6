import { figure, text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** A word whose value its letter does not allow. */
export const outOfRangeWord = defineRule({
  id: 'out-of-range-word',
  group: 'reading',
  title: 'A value outside what its letter allows',
  severity: 'stop',
  protects: 'The run from an alarm, or from a controller that rounds the value to something else.',
  explanation:
    'F and S may not be negative; T, H, D and counts are whole numbers, within 0.0001 (NISTIR 6556, 3.2.2.1); a G code has at most one decimal, an M code none.',
  examples: { bad: 'G21 G90 G54\nT1.5 M6\nM30', good: 'G21 G90 G54\nT1 M6\nM30' },
  word: (data) => {
    const what = text(data, 'what') || text(data, 'letter');
    const value = figure(data, 'value');
    const written = what.length > 1 ? what : `${what}${Number.isNaN(value) ? '' : value}`;
    switch (text(data, 'needs')) {
      case 'not-negative':
        return {
          message: `${written} is negative; ${text(data, 'letter')} has to be zero or more.`,
          advice: 'Write the value that is meant, without the minus sign.',
        };
      case 'whole':
        return {
          message: `${written} is not a whole number; ${text(data, 'letter')} has to be one.`,
          advice: 'Write the whole number that is meant.',
        };
      case 'code':
        return {
          message: `${written} is no code: ${text(data, 'letter') === 'G' ? 'a G code has at most one decimal' : 'an M code is a whole number'} and neither is negative.`,
          advice: 'Write the code that is meant.',
        };
      case 'positive':
        return {
          message: `${written} has to be more than zero.`,
          advice: 'Write the value that is meant.',
        };
      case 'in-table':
        return {
          message: `${written} names an offset that the table does not hold.`,
          advice: 'Enter the offset, or write the number that is meant.',
        };
      case 'pocket':
        return {
          message: `${written} names a pocket that the rack does not have.`,
          advice: 'Write the number of a pocket of this rack.',
        };
      case 'tool':
        return {
          message: 'This controller refuses T0; it does not put a tool away by it.',
          advice: 'Take the T0 change out, or put the tool away as this controller does.',
        };
      case 'offset-number':
        return {
          message: `${written} names no work offset of this controller.`,
          advice: 'Write the number of the work offset that is meant.',
        };
      default:
        return {
          message: `${written} is outside what ${text(data, 'letter')} allows here.`,
          advice: 'Write a value that the code allows.',
        };
    }
  },
  observe: (_shop, report) => reportProblem(report, 'out-of-range-word'),
});
