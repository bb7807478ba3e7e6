import { alongDirection } from '../geometry/kinematics';
import type { Motion } from '../interpreter/events';
import type { PerAxis } from '../shop/setup';
import { figure } from './finding-data';
import { defineRule } from './rule';

/** A feed that an axis of this machine cannot follow: controllers clamp it. */
export const feedAboveMachine = defineRule({
  id: 'feed-above-machine',
  group: 'spindle-and-feed',
  title: 'Faster than the machine can feed',
  severity: 'note',
  protects:
    'The cut from a feed per tooth other than it was chosen for, and the run from lasting longer than planned.',
  explanation:
    'Controllers slow such a move to what its slowest axis can do. The greatest feed along a direction is where the first axis reaches its own greatest feed; on arcs the slower axis of the plane counts.',
  examples: {
    bad: 'G21 G90 G54\nT1 M6\nG1 X100 F20000\nM30',
    good: 'G21 G90 G54\nT1 M6\nG1 X100 F15000\nM30',
  },
  word: (data, { feed }) => ({
    message: `Feeds at ${feed(figure(data, 'feed'))}; along this path the machine can do ${feed(figure(data, 'most'))}.`,
    advice: 'Expect the slower feed, or lower both feed and speed.',
  }),
  observe: (shop, report) => {
    const { maxFeed } = shop.setup.machine;
    const slowestAxis = Math.min(maxFeed.x, maxFeed.y, maxFeed.z);
    return {
      quiet(quiet) {
        quiet.greatestFeed = Math.min(quiet.greatestFeed, slowestAxis);
      },
      motion(motion, state) {
        if (!(motion.feed > slowestAxis) || !motion.moves) return;
        const most = greatestFeed(motion, maxFeed);
        if (motion.feed <= most) return;
        const data = { feed: motion.feed, most };
        const at = state.place({ letters: 'F' });
        report.found({ cause: '', by: motion.feed - most, at, data }, state);
      },
    };
  },
});

/** mm/min along the motion at which its first axis reaches its own greatest feed. */
function greatestFeed(motion: Motion, maxFeed: PerAxis): number {
  if (motion.kind === 'arc') {
    const [u, v] = [motion.plane[0], motion.plane[1]] as ['x' | 'y' | 'z', 'x' | 'y' | 'z'];
    return Math.min(maxFeed[u], maxFeed[v]);
  }
  const { toX, fromX, toY, fromY, toZ, fromZ, length } = motion;
  const share = { x: (toX - fromX) / length, y: (toY - fromY) / length, z: (toZ - fromZ) / length };
  return alongDirection(share.x, share.y, share.z, maxFeed);
}
