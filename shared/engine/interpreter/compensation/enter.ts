import { LETTER } from '../../blocks/block';
import { LIMIT_SLACK } from '../../geometry/tolerance';
import { arcTolerance, arcTurn, moveArc, placeCentre } from '../arcs';
import type { Circle } from '../kept';
import type { Facts, Run } from '../run';
import { beside, goAlong, isSamePoint, standBeside, tellFault, travel, type Move } from './beside';
import { findEntryCircle, straightEntryNormal } from './entry';
import { radial, sideNormal } from './corner';

const { I, J, R } = LETTER;

/** The first XY move since compensation was switched on. */
export function enter(run: Run, move: Move): void {
  const { machine, offset } = run;
  const { to } = move;
  const { radius, side } = offset;
  const length = Math.hypot(to.x - machine.x, to.y - machine.y);
  if (move.turning !== 0) return enterByArc(run, move, move.turning);
  if (isSamePoint(machine, to)) {
    // The cutter is there already, as after a change of side: the next move enters.
    offset.x = to.x;
    offset.y = to.y;
    return goAlong(run, move);
  }
  if (length <= radius + LIMIT_SLACK) {
    // No tangent leads there; the cutter comes to the side of the move as if it had been on before.
    const aside = sideNormal(to.x - machine.x, to.y - machine.y, side);
    const end = beside(run, to, aside, to);
    if (!tellFault(run, { reason: 'short', length, radius }, end)) travel(run, move, [{ to: end }]);
    return standBeside(run, to, NaN);
  }
  const normal = straightEntryNormal(machine, to, radius, side);
  travel(run, move, [{ to: beside(run, to, normal, to) }]);
  standBeside(run, to, NaN);
}

/** The arc cannot be an entry: it is made as programmed, and the next move enters. */
function enterLater(run: Run, { to, feed }: Move, turning: 1 | -1, facts: Facts): void {
  const { offset } = run;
  if (!tellFault(run, facts, to)) moveArc(run, turning, to, feed);
  offset.x = to.x;
  offset.y = to.y;
}

/** The published language enters along an arc that the cutter touches; other controllers do not. */
function enterByArc(run: Run, move: Move, turning: 1 | -1): void {
  const { machine, dialect, offset } = run;
  const { to } = move;
  const out = turning === offset.side ? -1 : 1;
  const circle = entryCircle(run, move, turning, out);
  const facts = { reason: 'arc', side: machine.compensation };
  if (!circle) return enterLater(run, move, turning, facts);
  const end = beside(run, to, radial(circle, to, out), to);
  if (!dialect.isStrict) tellFault(run, facts, end);
  const turn = arcTurn(run, turning, circle, machine.x, machine.y, end.x, end.y);
  travel(run, move, [{ to: end, arc: { circle, turn } }]);
  standBeside(run, to, NaN);
}

/** The circle of the cutter's own path, or undefined where the arc as written does not touch the cutter. */
function entryCircle(run: Run, { to }: Move, turning: 1 | -1, out: 1 | -1): Circle | undefined {
  const { block, machine, offset, circle } = run;
  if (block.has(R)) {
    const radius = block.value(R) * machine.unit;
    const path = Math.abs(radius) + out * offset.radius;
    return findEntryCircle(machine, to, { radius, path, turning }, circle)
      ? { ...circle }
      : undefined;
  }
  const hasCentre = block.has(I) || block.has(J);
  if (!hasCentre || !placeCentre(run, machine.x, machine.y)) return undefined;
  const here = Math.hypot(machine.x - circle.u, machine.y - circle.v);
  const path = Math.hypot(to.x - circle.u, to.y - circle.v) + out * offset.radius;
  if (!(path > 0 && Math.abs(here - path) <= arcTolerance(run))) return undefined;
  return { ...circle, radius: here };
}
