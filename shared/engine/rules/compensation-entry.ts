import { figure, text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** Cutter compensation that cannot be started, ended or followed as written. */
export const compensationEntry = defineRule({
  id: 'compensation-entry',
  group: 'state',
  title: 'Cutter compensation starts, ends or turns where it cannot',
  severity: 'stop',
  protects: 'The work from a gouge at the lead-in, and the run from an alarm.',
  explanation:
    'Compensation is switched by a straight move longer than the compensation value; an inside corner or arc must be wider than it (NISTIR 6556, appendix B). The value taken is the one of the offset table.',
  examples: {
    bad: 'G21 G90 G54 G17\nT2 M6\nG0 X0 Y0\nG41 D2\nG1 X1 F1000\nX50\nG40\nM30',
    good: 'G21 G90 G54 G17\nT2 M6\nG0 X0 Y0\nG41 D2\nG1 X10 F1000\nX50\nG40\nM30',
  },
  word: (data, lengths) => ({
    message: describe(data, lengths.length),
    advice:
      'Lengthen the lead-in or lead-out, straight and clear of the work, or use a smaller cutter.',
  }),
  observe: (_shop, report) => reportProblem(report, 'compensation-entry'),
});

function describe(data: Parameters<typeof text>[0], length: (mm: number) => string): string {
  const by = length(figure(data, 'radius'));
  switch (text(data, 'reason')) {
    case 'arc':
      return 'Cutter compensation is switched on an arc.';
    case 'no-move':
      return 'Cutter compensation is switched off without a move that leads out.';
    case 'short':
      return `The move that switches compensation is ${length(figure(data, 'length'))} long, shorter than the compensation of ${by}.`;
    case 'corner':
      return `An inside corner is tighter than the compensation of ${by}.`;
    default:
      return 'Cutter compensation cannot be followed as written here.';
  }
}
