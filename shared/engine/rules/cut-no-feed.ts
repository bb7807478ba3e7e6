import { text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** A feed move with no feed rate, or zero (NISTIR 6556 section 3.5.19). */
export const cutNoFeed = defineRule({
  id: 'cut-no-feed',
  group: 'spindle-and-feed',
  title: 'A feed move without a feed',
  severity: 'stop',
  protects: 'The run from an alarm, or from the feed that the last program left behind.',
  explanation:
    'F keeps its value once stated, in units per minute; in inverse time (G93) every feed move needs its own. A feed left over from an earlier program is never assumed.',
  examples: { bad: 'G21 G90 G54\nG1 X10\nM30', good: 'G21 G90 G54\nG1 X10 F500\nX20\nM30' },
  word: (data) => ({
    message: `${text(data, 'code') || 'A feed move'} moves here, and no feed is in force.`,
    advice: 'Write the F word on or before this block.',
  }),
  observe: (_shop, report) => reportProblem(report, 'cut-no-feed', () => ''),
});
