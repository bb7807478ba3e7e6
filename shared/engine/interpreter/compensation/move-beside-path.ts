import { LETTER, letterBits } from '../../blocks/block';
import { feedOf } from '../feed';
import type { Target } from '../kept';
import { LIMIT_SLACK } from '../../geometry/tolerance';
import { moveStraight, readTarget } from '../motions';
import { tellProblem, type Run } from '../run';
import { goAlong, isSamePoint, type Move } from './beside';
import { enter } from './enter';
import { followArc, followLine } from './follow';

/**
 * Motion with cutter compensation on, or just switched off (NISTIR 6556, appendix B). The published language
 * looks no block ahead, and a strict controller follows it exactly: a tangent entry, an arc of the cutter's radius
 * round every outside corner of a feed, inside corners refused.
 *
 * Other controllers look ahead and take inside corners too, each in a way of its own, and this walk does not
 * look ahead with them. The cutter is moved to the end of the first offset line, back to where the two lines cross,
 * and on: the true path is part of that. A macro-style controller may also run the offset lines of an outside corner
 * on to where they cross, so there the path goes by that point. All of it stays within the radius of the programmed
 * path, or of a corner run on.
 */

const IN_PLANE = letterBits('XYIJR');

/** Carries out G0 to G3; false where the block is none of them, or where the plain move is the true one. */
export function moveBesidePath(run: Run, code: number): boolean {
  const { machine, motion, offset } = run;
  if (code > 30) return false;
  if (motion.endUnknown) {
    tellUnknown(run);
    return false;
  }
  if (offset.isLeaving) return comeBack(run, code);
  if (machine.x !== offset.toolX || machine.y !== offset.toolY) startFromHere(run);
  const move = readMove(run, code);
  const { to, turning } = move;
  if ((run.block.seen & IN_PLANE) === 0 || (turning === 0 && isSamePoint(to, offset)))
    goAlong(run, move);
  else if (offset.isEntering) enter(run, move);
  else if (turning === 0) followLine(run, move);
  else followArc(run, move, turning);
  offset.toolX = machine.x;
  offset.toolY = machine.y;
  return true;
}

/** The way hangs on where the head is, so moves from the bounds of that do not hold those between. */
function tellUnknown(run: Run): void {
  const { motion, offset } = run;
  const of = 'where the head stands';
  if (!motion.isAlternative)
    tellProblem(run, 'not-modelled', undefined, { what: '', reason: 'depends', of });
  offset.isEntering = !offset.isLeaving;
}

/** Something else has moved the head: compensation is entered anew. */
function startFromHere({ machine, offset }: Run): void {
  offset.isEntering = true;
  offset.x = machine.x;
  offset.y = machine.y;
}

function readMove(run: Run, code: number): Move {
  return {
    kind: code === 0 ? 'rapid' : 'feed',
    turning: code === 20 ? -1 : code === 30 ? 1 : 0,
    to: readProgrammed(run),
    feed: code === 0 ? NaN : feedOf(run),
  };
}

/** Words count from where the program stands, not from where the cutter is. */
function readProgrammed(run: Run): Target {
  const { machine, offset } = run;
  const { x, y } = machine;
  machine.x = offset.x;
  machine.y = offset.y;
  const to = { ...readTarget(run, run.target) };
  machine.x = x;
  machine.y = y;
  return to;
}

/**
 * The first XY move since compensation was switched off. The published language goes from where the cutter is, and
 * words left out are where the cutter is; other controllers go back to the programmed place on both axes (common
 * practice, no source).
 */
function comeBack(run: Run, code: number): boolean {
  const { block, machine, offset, dialect } = run;
  if ((block.seen & IN_PLANE) === 0) {
    if (block.has(LETTER.Z) && readTarget(run, run.target).z > machine.z) offset.isLow = false;
    return false;
  }
  offset.isLeaving = machine.isOffset = false;
  if (machine.x !== offset.toolX || machine.y !== offset.toolY) return false;
  if (code >= 20) {
    if (!dialect.isStrict) tellLeave(run, { reason: 'arc', side: 'off' });
    return false;
  }
  if (dialect.isStrict) return false;
  const to = readProgrammed(run);
  const length = Math.hypot(to.x - offset.x, to.y - offset.y);
  const { radius } = offset;
  // Behind a lead-out arc the cutter is clear of the work, and a short line to end on is ordinary.
  const isBehindLine = !Number.isNaN(offset.room);
  if (length <= radius + LIMIT_SLACK && code === 10 && offset.isLow && isBehindLine)
    tellLeave(run, { reason: 'leave-short', length, radius });
  moveStraight(run, code === 0 ? 'rapid' : 'feed', 'program', to, code === 0 ? NaN : feedOf(run));
  return true;
}

function tellLeave(run: Run, facts: Readonly<Record<string, string | number>>): void {
  tellProblem(run, 'compensation-entry', { letters: 'XYIJR' }, facts);
}
