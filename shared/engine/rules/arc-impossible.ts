import type { FindingData } from '../report/report';
import { figure, text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule, type LengthWords, type Wording } from './rule';

/** An arc that no circle can be drawn for (NISTIR 6556 section 3.5.3, errors 7, 69, 86, 89, 92, 101, 197). */
export const arcImpossible = defineRule({
  id: 'arc-impossible',
  group: 'arcs-and-cycles',
  title: 'An arc that cannot be drawn',
  severity: 'stop',
  protects: 'The run from an alarm in the middle of the work.',
  explanation:
    'A radius of less than half the way from start to end, a radius arc that ends where it starts, a centre on the start point, a centre letter of another plane, or a radius together with a centre: each has no arc, or more than one. The walk goes on from the end point as written.',
  examples: {
    bad: 'G21 G90 G54 G17\nG0 X0 Y0\nG2 X20 Y0 R5 F500\nM30',
    good: 'G21 G90 G54 G17\nG0 X0 Y0\nG2 X20 Y0 R10 F500\nM30',
  },
  word: wordReason,
  observe: (_shop, report) =>
    reportProblem(report, 'arc-impossible', (facts) => text(facts, 'reason')),
});

function wordReason(data: FindingData, { length }: LengthWords): Wording {
  switch (text(data, 'reason')) {
    case 'radius-short':
      return {
        message: `The radius of ${length(figure(data, 'radius'))} is ${length(figure(data, 'short'))} too small: start and end are ${length(2 * figure(data, 'halfChord'))} apart.`,
        advice: 'Give the true radius, or the centre in its place.',
      };
    case 'ends-where-it-starts':
      return {
        message: 'A radius arc ends where it starts, so its centre could lie anywhere around.',
        advice: 'Write a full circle with its centre words, or mend the end point.',
      };
    case 'centre-letter':
      return {
        message: `The ${text(data, 'what')} word is no centre word of the ${text(data, 'plane').toUpperCase()} plane now in force.`,
        advice: 'Select the plane the arc is meant for (G17, G18 or G19), or mend the letter.',
      };
    case 'radius-and-centre':
      return {
        message: 'The arc gives both a radius and a centre, and they may disagree.',
        advice: 'Leave one of the two out.',
      };
    case 'no-plane-word':
      return {
        message: 'The arc names no axis of its plane, so it has no end point there.',
        advice: 'Write at least one axis word of the plane; a full circle repeats its start.',
      };
    default:
      return {
        message: 'The centre of the arc lies on its start point, so it has no radius.',
        advice: 'Mend the centre words.',
      };
  }
}
