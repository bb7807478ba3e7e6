import { text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

const CENTRE_LETTERS: Readonly<Record<string, string>> = {
  xy: 'I and J',
  zx: 'I and K',
  yz: 'J and K',
};

/** An arc with neither a radius nor a centre: those words are not modal (NISTIR 6556 section 3.5.3). */
export const arcCentreMissing = defineRule({
  id: 'arc-centre-missing',
  group: 'arcs-and-cycles',
  title: 'An arc has neither centre nor radius',
  severity: 'stop',
  protects: 'The run from an alarm, or from the arc of an earlier block drawn in the wrong place.',
  explanation:
    'G2 and G3 stay in force from block to block, their I, J, K and R words do not. A bare coordinate after an arc needs G1 or its own centre. The walk goes on from the end point as written.',
  examples: {
    bad: 'G21 G90 G54 G17\nG0 X10 Y0\nG3 X0 Y10 I-10 J0 F500\nX-10 Y0\nM30',
    good: 'G21 G90 G54 G17\nG0 X10 Y0\nG3 X0 Y10 I-10 J0 F500\nG1 X-10 Y0\nM30',
  },
  word: (data) => ({
    message:
      text(data, 'reason') === 'one-word'
        ? 'Arc centres count from program zero here (G90.1), and the block gives one of the two centre words.'
        : 'An arc is in force here, but the block gives neither a radius nor a centre.',
    advice: `Add ${CENTRE_LETTERS[text(data, 'plane')] ?? 'the centre words'} or R, or write G1 if a straight move is meant.`,
  }),
  observe: (_shop, report) => reportProblem(report, 'arc-centre-missing', () => ''),
});
