import { codeName } from '../blocks/code-groups';
import type { Target } from './kept';
import { moveStraight } from './motions';
import { refuse, tellProblem, type Run } from './run';
import { stopBetween } from './unknown-position';

/** NISTIR 6556: a probing target lies at least this far away, mm (0.010 inch). */
const SHORTEST_PROBE = 0.254;

/** G38.2 and its kin: towards the target, perhaps not all the way: from then on the head is somewhere between. */
export function probe(run: Run, code: number, target: Target, feed: number): void {
  const { machine, motion } = run;
  const what = codeName('G', code);
  if (machine.compensation !== 'off' || machine.feedMode === 'inverse-time') {
    const other = machine.compensation !== 'off' ? 'G41' : 'G93';
    return refuse(run, 'modal-conflict', { code: what }, { reason: 'probing', what, other });
  }
  const distance = Math.hypot(target.x - machine.x, target.y - machine.y, target.z - machine.z);
  if (run.dialect.isStrict && distance < SHORTEST_PROBE)
    tellProblem(run, 'out-of-range-word', undefined, {
      letter: what,
      what,
      value: distance,
      needs: 'farther',
    });
  const from = { x: machine.x, y: machine.y, z: machine.z, a: machine.a };
  const isUnknown = motion.endUnknown;
  motion.endUnknown = true;
  moveStraight(run, 'probe', 'program', target, feed);
  motion.endUnknown = isUnknown;
  stopBetween(run, from, target);
  // G38.2 and G38.4 raise an alarm when nothing is touched, so whatever comes after them was (common practice).
  const mustTouch = code === 382 || code === 384;
  run.probed.touched = mustTouch ? 1 : { least: 0, greatest: 1, of: '#5070' };
}
