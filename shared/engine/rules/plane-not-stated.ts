import type { Motion } from '../interpreter/events';
import { text } from './finding-data';
import { reportUnstated } from './mode-not-stated';
import { defineRule } from './rule';

/** An arc or a cycle before the plane is stated. */
export const planeNotStated = defineRule({
  id: 'plane-not-stated',
  group: 'state',
  title: 'The plane is not stated before the first arc or cycle',
  severity: 'note',
  protects: 'The first arc from being turned in another plane.',
  explanation:
    'None of G17, G18 and G19 stands before the first arc or canned cycle. Straight moves need no plane, so a program without arcs and cycles is silent.',
  examples: {
    bad: 'G21 G90 G54\nG0 X0 Y0\nG2 X10 Y10 I10 J0 F1000\nM30',
    good: 'G21 G90 G54 G17\nG0 X0 Y0\nG2 X10 Y10 I10 J0 F1000\nM30',
  },
  word: (data) => ({
    message: `An arc or a cycle runs without a plane having been stated; this controller would use ${text(data, 'plane').toUpperCase()} if nothing changed it.`,
    advice: 'Write G17 at the head of the program.',
  }),
  observe: (_shop, report) =>
    reportUnstated(
      report,
      'plane',
      needsPlane,
      (state) => ({ data: { plane: state.plane } }),
      'arcs',
    ),
});

function needsPlane(motion: Motion): boolean {
  return motion.kind === 'arc' || motion.by === 'cycle';
}
