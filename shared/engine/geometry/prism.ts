import { LIMIT_SLACK } from './tolerance';

/**
 * A solid with vertical sides: a rectangle in X and Y, rounded outwards by `round`, between two
 * heights. A box has round 0; a vertical cylinder has a rectangle of no size. Open sides are
 * infinite. Every solid the engine sweeps is one of these, so the meeting of two is one too.
 */
export interface Prism {
  readonly minX: number;
  readonly minY: number;
  readonly minZ: number;
  readonly maxX: number;
  readonly maxY: number;
  readonly maxZ: number;
  readonly round: number;
}
export interface Corner {
  readonly x?: number | undefined;
  readonly y?: number | undefined;
  readonly z?: number | undefined;
}

/** A box; sides left out are open. */
export function boxPrism(box: { readonly min: Corner; readonly max: Corner }): Prism {
  return {
    minX: box.min.x ?? -Infinity,
    minY: box.min.y ?? -Infinity,
    minZ: box.min.z ?? -Infinity,
    maxX: box.max.x ?? Infinity,
    maxY: box.max.y ?? Infinity,
    maxZ: box.max.z ?? Infinity,
    round: 0,
  };
}

/** A vertical cylinder about (x, y) between two heights. */
export function cylinderPrism(
  centre: { readonly x: number; readonly y: number },
  radius: number,
  heights: readonly [number, number],
): Prism {
  return {
    minX: centre.x,
    minY: centre.y,
    minZ: heights[0],
    maxX: centre.x,
    maxY: centre.y,
    maxZ: heights[1],
    round: radius,
  };
}

export function movePrism(prism: Prism, x: number, y: number, z: number): Prism {
  return {
    minX: prism.minX + x,
    minY: prism.minY + y,
    minZ: prism.minZ + z,
    maxX: prism.maxX + x,
    maxY: prism.maxY + y,
    maxZ: prism.maxZ + z,
    round: prism.round,
  };
}

/**
 * Where the reference point of a moving solid may not be: the points at which it would overlap the
 * standing one by more than LIMIT_SLACK in every direction. Exact, as both have vertical sides
 * (their Minkowski difference).
 */
export function meetingRegion(standing: Prism, moving: Prism): Prism {
  const round = standing.round + moving.round;
  const fromSides = Math.max(0, LIMIT_SLACK - round);
  return {
    minX: standing.minX - moving.maxX + fromSides,
    minY: standing.minY - moving.maxY + fromSides,
    minZ: standing.minZ - moving.maxZ + LIMIT_SLACK,
    maxX: standing.maxX - moving.minX - fromSides,
    maxY: standing.maxY - moving.minY - fromSides,
    maxZ: standing.maxZ - moving.minZ - LIMIT_SLACK,
    round: Math.max(0, round - LIMIT_SLACK),
  };
}

/** The smallest box around a prism, as a prism without rounding. */
export function boundsOf(prism: Prism): Prism {
  return {
    minX: prism.minX - prism.round,
    minY: prism.minY - prism.round,
    minZ: prism.minZ,
    maxX: prism.maxX + prism.round,
    maxY: prism.maxY + prism.round,
    maxZ: prism.maxZ,
    round: 0,
  };
}

/** The smallest box around all of them; of none, a box that nothing meets. */
export function boundsOfAll(prisms: readonly Prism[]): Prism {
  let all: Prism = {
    minX: Infinity,
    minY: Infinity,
    minZ: Infinity,
    maxX: -Infinity,
    maxY: -Infinity,
    maxZ: -Infinity,
    round: 0,
  };
  for (const prism of prisms) {
    const one = boundsOf(prism);
    all = {
      minX: Math.min(all.minX, one.minX),
      minY: Math.min(all.minY, one.minY),
      minZ: Math.min(all.minZ, one.minZ),
      maxX: Math.max(all.maxX, one.maxX),
      maxY: Math.max(all.maxY, one.maxY),
      maxZ: Math.max(all.maxZ, one.maxZ),
      round: 0,
    };
  }
  return all;
}
