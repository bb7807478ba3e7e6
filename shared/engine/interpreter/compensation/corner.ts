/**
 * The corner between two moves of a compensated path, by the side normals of its moves: vectors of length 1
 * from the programmed path to the cutter's centre. Plane geometry; lengths in mm, angles in radians.
 */
export interface Vector {
  readonly x: number;
  readonly y: number;
}

/** NISTIR 6556: a turn of no more than this is no corner. */
const LEAST_CORNER = 0.01;

export type Corner = 'straight-on' | 'outside' | 'inside';

/** The normal of a move in a direction; `side` is 1 for a cutter on the left, −1 on the right. */
export function sideNormal(dx: number, dy: number, side: number): Vector {
  const length = Math.sqrt(dx * dx + dy * dy);
  return { x: (-dy * side) / length, y: (dx * side) / length };
}

/** How far the path turns away from the cutter, −π to π: positive round the outside of a corner. */
export function turnAway(before: Vector, after: Vector, side: number): number {
  const cross = before.x * after.y - before.y * after.x;
  return -side * Math.atan2(cross, before.x * after.x + before.y * after.y);
}

/**
 * A turn back on itself is an outside corner: the cutter goes half round it, on whichever side rounding
 * puts the reversal.
 */
export function cornerOf(away: number): Corner {
  if (Math.abs(away) <= LEAST_CORNER) return 'straight-on';
  return away > 0 || away <= LEAST_CORNER - Math.PI ? 'outside' : 'inside';
}

/** Where the offset lines of two straight moves cross, from the corner, in cutter radii. */
export function crossing(before: Vector, after: Vector): Vector {
  const scale = 1 + before.x * after.x + before.y * after.y;
  return { x: (before.x + after.x) / scale, y: (before.y + after.y) / scale };
}

/** How much of each of its moves an inside corner uses up, in cutter radii. */
export const cornerReach = (away: number): number => Math.abs(Math.tan(away / 2));

/** The direction of a move by its side normal. */
export const directionOf = (normal: Vector, side: number): Vector => ({
  x: side * normal.y,
  y: -side * normal.x,
});

/** The side normal at a point of an arc: away from its centre (`out` 1) or towards it (−1). At the centre itself, +X. */
export function radial(
  centre: { readonly u: number; readonly v: number },
  point: Vector,
  out: 1 | -1,
): Vector {
  const x = point.x - centre.u;
  const y = point.y - centre.v;
  const length = Math.sqrt(x * x + y * y);
  if (length === 0) return { x: out, y: 0 };
  return { x: (out * x) / length, y: (out * y) / length };
}
