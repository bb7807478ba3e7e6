import type { FindingData } from '../report/report';
import { figure, text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule, type LengthWords, type Wording } from './rule';

/** Cutter compensation that cannot be started, ended or followed as written. */
export const compensationEntry = defineRule({
  id: 'compensation-entry',
  group: 'state',
  title: 'Cutter compensation starts, ends or turns where it cannot',
  severity: 'stop',
  protects: 'The work from a gouge at the lead-in, and the run from an alarm.',
  explanation:
    'Compensation is switched on and off by a straight move longer than the compensation value; an arc turned on its inside must be wider than it, and straight moves at an inside corner long enough for the cutter to turn there (NISTIR 6556, appendix B). The value taken is half the diameter in the offset table. The published language refuses every inside corner, which counts where the controller is described as strict; other controllers turn there.',
  examples: {
    bad: 'G21 G90 G54 G17\nT2 M6\nG0 X0 Y0\nG41 D2\nG1 X1 F1000\nX50\nG40\nM30',
    good: 'G21 G90 G54 G17\nT2 M6\nG0 X0 Y0\nG41 D2\nG1 X10 F1000\nX50\nG40\nM30',
  },
  word: wordReason,
  observe: (_shop, report) =>
    reportProblem(
      report,
      'compensation-entry',
      // A lead-in and a lead-out that are too short are one slip.
      (facts) => `${text(facts, 'reason').replace('leave-', '')} ${String(facts['side'] ?? '')}`,
    ),
});

const LEAD =
  'Lead in and out on a straight line longer than the compensation, or use a smaller cutter.';

function wordReason(data: FindingData, { length }: LengthWords): Wording {
  const lengthOf = (what: string): string => length(figure(data, what));
  switch (text(data, 'reason')) {
    case 'arc':
      return {
        message: `Cutter compensation is switched ${text(data, 'side') === 'off' ? 'off' : 'on'} on an arc.`,
        advice: LEAD,
      };
    case 'short':
      return {
        message: `The move that switches compensation on is ${lengthOf('length')} long, no longer than the compensation of ${lengthOf('radius')}.`,
        advice: LEAD,
      };
    case 'leave-short':
      return {
        message: `The move that ends compensation is ${lengthOf('length')} long, no longer than the compensation of ${lengthOf('radius')}: the cutter comes back over the edge it has cut.`,
        advice: LEAD,
      };
    case 'no-move':
      return {
        message: 'Cutter compensation is switched off before any XY move has followed it.',
        advice: 'Take it out, or write the lead-in between.',
      };
    case 'tight':
      return {
        message: `An inside arc of radius ${lengthOf('arc')} is no wider than the compensation of ${lengthOf('radius')}.`,
        advice: 'Use a smaller cutter, or open the arc.',
      };
    case 'corner':
      return {
        message: `An inside corner needs ${lengthOf('reach')} of each of its moves for the compensation of ${lengthOf('radius')}, and one of them has ${lengthOf('length')}.`,
        advice: 'Use a smaller cutter, or take the small move out of the contour.',
      };
    case 'inside':
      return {
        message: `An inside corner with cutter compensation on, which this controller refuses.`,
        advice: 'Round the corner by an arc wider than the cutter, or post the path of the centre.',
      };
    case 'zero-moved':
      return {
        message: 'Work zero is moved while cutter compensation is on, which distorts the path.',
        advice: 'Cancel compensation before, and lead in anew after it.',
      };
    default:
      return {
        message: 'Cutter compensation is switched on outside the XY plane.',
        advice: 'Select G17 before cutter compensation is switched on.',
      };
  }
}
