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
    'F and S may not be negative; T, H, D and counts are whole numbers, within 0.0001 (NISTIR 6556, 3.2.2.1); a G code has at most one decimal, an M code none. A value that is worked out has to come out as a number: nothing is divided by zero, no root taken of a negative number (3.2.2.3, 3.2.2.4).',
  examples: { bad: 'G21 G90 G54\nT1.5 M6\nM30', good: 'G21 G90 G54\nT1 M6\nM30' },
  word: (data) => {
    const what = text(data, 'what') || text(data, 'letter');
    const value = figure(data, 'value');
    const plain = what.length > 1 ? what : `${what}${Number.isNaN(value) ? '' : value}`;
    const written = plain.startsWith('#') ? `“${plain}”` : plain;
    switch (text(data, 'needs')) {
      case 'division':
        return {
          message: `${written} divides by zero.`,
          advice: 'Correct the value, or the parameters it is worked out from.',
        };
      case 'power':
        return {
          message: `${written} raises a negative number to a fraction.`,
          advice: 'Correct the value, or the parameters it is worked out from.',
        };
      case 'domain':
        return {
          message: `${written} asks ${text(data, 'letter')} of a value it does not take.`,
          advice: 'Correct the value, or the parameters it is worked out from.',
        };
      case 'too-large':
        return {
          message: `${written} comes out larger than any controller counts.`,
          advice: 'Correct the value, or the parameters it is worked out from.',
        };
      case 'not-whole':
        return {
          message: `${written} names the parameter ${text(data, 'letter')}, and a parameter has a whole number.`,
          advice: 'Write the number of the parameter that is meant.',
        };
      case 'parameter-number':
        return {
          message: `${written} names the parameter ${text(data, 'letter')}, which this controller does not have.`,
          advice: 'Write the number of the parameter that is meant.',
        };
      case 'never-set':
        return {
          message: `${written} reads ${text(data, 'letter')}, which nothing has set before.`,
          advice: 'Set it first, or state its starting value in the controller description.',
        };
      case 'read-only':
        return {
          message: `${written} sets #0, which is always empty.`,
          advice: 'Set another variable.',
        };
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
      case 'own-diameter':
        return {
          message: `${written} takes D${figure(data, 'value')}, a diameter offset which the table does not hold.`,
          advice: 'Enter the offset, or write the D number that is meant.',
        };
      case 'fewer':
        return {
          message: `${written} asks for more turns than any arc makes.`,
          advice: 'Write how often the arc is to go round.',
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
