import { text } from './finding-data';
import { isProgramMotion, reportUnstated } from './mode-not-stated';
import { defineRule } from './rule';

/** The program moves before it says whether coordinates are absolute. */
export const distanceNotStated = defineRule({
  id: 'distance-not-stated',
  group: 'state',
  title: 'Absolute or incremental is not stated before the first move',
  severity: 'note',
  protects: 'The first moves from being counted from wherever the head happens to stand.',
  explanation:
    'Neither G90 nor G91 stands before the first move in program coordinates. Most controllers start in absolute mode; the check takes what the controller description names.',
  examples: { bad: 'G21 G54\nG0 X10 Y10\nM30', good: 'G21 G54\nG90 G0 X10 Y10\nM30' },
  word: (data) => ({
    message: `The program moves without having stated G90 or G91; this controller would read ${text(data, 'distance')} coordinates if nothing changed it.`,
    advice: 'Write G90 at the head of the program.',
  }),
  observe: (_shop, report) =>
    reportUnstated(report, 'distance', isProgramMotion, (state) => ({
      data: { distance: state.distance },
    })),
});
