import { text } from './finding-data';
import { isProgramMotion } from './mode-not-stated';
import { defineRule } from './rule';

/** The unit changes after the program has begun to move. */
export const unitsChange = defineRule({
  id: 'units-change',
  group: 'state',
  title: 'Units change in the middle of the program',
  severity: 'hold',
  hold: 'judge',
  protects: 'The second half of the work from another scale than the first.',
  explanation:
    'G20 and G21 both hold in the course of one program. It is legal, and the check converts, but it mostly comes from two files joined. A second unit word before anything has moved is silent: the last one counts.',
  examples: {
    bad: 'G21 G90 G54\nG0 X10\nG20\nG0 X2\nM30',
    good: 'G20\nG21 G90 G54\nG0 X10\nG21\nG0 X2\nM30',
  },
  word: (data) => ({
    message: `Units change from ${unitWords(text(data, 'from'))} to ${unitWords(text(data, 'to'))} after the program has begun to move.`,
    advice: 'Post the whole program in one unit.',
  }),
  observe: (_shop, report) => {
    let hasMoved = false;
    return {
      quiet(quiet) {
        if (!hasMoved) quiet.close();
      },
      motion(motion) {
        if (!hasMoved && isProgramMotion(motion)) hasMoved = true;
      },
      modal({ what, from, to, place }, state) {
        if (what !== 'units' || from === to || !hasMoved) return;
        report.found({ cause: to, at: place, data: { from, to } }, state);
      },
    };
  },
});

function unitWords(units: string): string {
  return units === 'inch' ? 'inches' : 'millimetres';
}
