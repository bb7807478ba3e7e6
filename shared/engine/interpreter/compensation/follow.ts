import { LIMIT_SLACK } from '../../geometry/tolerance';
import { arcTurn, findCircle } from '../arcs';
import type { Target } from '../kept';
import type { Run } from '../run';
import {
  beside,
  goAlong,
  isSamePoint,
  standBeside,
  tellFault,
  travel,
  type Move,
  type Part,
} from './beside';
import {
  cornerOf,
  cornerReach,
  crossing,
  directionOf,
  radial,
  sideNormal,
  turnAway,
  type Vector,
} from './corner';

/** A straight move with the cutter at its side. */
export function followLine(run: Run, move: Move): void {
  const { offset } = run;
  const { to } = move;
  const dx = to.x - offset.x;
  const dy = to.y - offset.y;
  const normal = sideNormal(dx, dy, offset.side);
  const end = beside(run, to, normal, to);
  const corner = turnCorner(run, move, normal, Math.sqrt(dx * dx + dy * dy), end);
  if (corner) travel(run, move, [...corner.parts, { to: end }]);
  standBeside(run, to, corner?.room ?? NaN);
}

/** An arc with the cutter at its side: round the same centre, on its own radius. */
export function followArc(run: Run, move: Move, turning: 1 | -1): void {
  const { offset } = run;
  const { to } = move;
  const isInside = turning === offset.side;
  const programmed = findCircle(run, turning, offset.x, offset.y, to.x, to.y);
  // An arc that cannot be drawn is told; the walk goes on from its end.
  if (!programmed) return isSamePoint(to, offset) ? goAlong(run, move) : followLine(run, move);
  const out = isInside ? -1 : 1;
  const turn = arcTurn(run, turning, programmed, offset.x, offset.y, to.x, to.y);
  const start = radial(programmed, offset, out);
  const end = beside(run, to, radial(programmed, to, out), to);
  const circle = { ...programmed, radius: programmed.radius + out * offset.radius };
  if (circle.radius <= LIMIT_SLACK) {
    const facts = { reason: 'tight', arc: programmed.radius, radius: offset.radius };
    if (!tellFault(run, facts, end)) travel(run, move, [{ to: end }]);
  } else {
    const corner = turnCorner(run, move, start, NaN, end);
    if (corner) travel(run, move, [...corner.parts, { to: end, arc: { circle, turn } }]);
  }
  standBeside(run, to, NaN);
}

interface Turned {
  /** What is travelled before the move itself. */
  readonly parts: readonly Part[];
  /** What is left of the move's length for the next corner; NaN for an arc. */
  readonly room: number;
}

/** From the side of the move before to the side of this one; undefined where that is refused. */
function turnCorner(
  run: Run,
  move: Move,
  normal: Vector,
  length: number,
  end: Target,
): Turned | undefined {
  const { machine, offset, controller, dialect } = run;
  const before = {
    x: (machine.x - offset.x) / offset.radius,
    y: (machine.y - offset.y) / offset.radius,
  };
  const away = turnAway(before, normal, offset.side);
  switch (cornerOf(away)) {
    case 'straight-on':
      return { parts: [], room: length };
    case 'outside': {
      const runsOn = controller.language === 'custom-macro' && !dialect.isStrict;
      if (runsOn) return { parts: runOn(run, before, normal, away), room: length };
      // NISTIR 6556: rapids get no corner arcs.
      return { parts: move.kind === 'rapid' ? [] : [cornerArc(run, normal, away)], room: length };
    }
    case 'inside':
      if (!dialect.isStrict) return turnInside(run, before, normal, away, length);
      tellFault(run, { reason: 'inside', radius: offset.radius }, end);
      return undefined;
  }
}

function cornerArc(run: Run, normal: Vector, away: number): Part {
  const { machine, offset } = run;
  const angle = away > 0 ? away : away + 2 * Math.PI;
  const circle = { u: offset.x, v: offset.y, radius: offset.radius };
  return {
    to: beside(run, offset, normal, machine),
    arc: { circle, turn: -offset.side * angle },
  };
}

/** The offset lines run on to where they cross; past a right angle, each one radius beyond its corner. */
function runOn(run: Run, before: Vector, after: Vector, away: number): Part[] {
  const { machine, offset } = run;
  const at = (off: Vector): Part => ({ to: beside(run, offset, off, machine) });
  if (0 < away && away <= Math.PI / 2) return [at(crossing(before, after)), at(after)];
  const on = directionOf(before, offset.side);
  const back = directionOf(after, offset.side);
  return [
    at({ x: before.x + on.x, y: before.y + on.y }),
    at({ x: after.x - back.x, y: after.y - back.y }),
  ];
}

/**
 * An inside corner. Between straight moves the cutter turns where the offset lines cross, and a move shorter than
 * that is from its end leaves it no room.
 */
function turnInside(run: Run, before: Vector, after: Vector, away: number, length: number): Turned {
  const { machine, offset } = run;
  const { room, radius } = offset;
  const isBetweenLines = !Number.isNaN(room + length);
  const reach = isBetweenLines ? radius * cornerReach(away) : 0;
  const shorter = Math.min(room, length);
  if (reach > shorter + LIMIT_SLACK) {
    tellFault(run, { reason: 'corner', length: Math.max(0, shorter), reach, radius }, machine);
    return { parts: [], room: NaN };
  }
  const off = isBetweenLines ? crossing(before, after) : after;
  return { parts: [{ to: beside(run, offset, off, machine) }], room: length - reach };
}
