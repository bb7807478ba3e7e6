import { arcPointAt, findExtremes, type MutableBounds, type Path } from '../path';

/** Paths for specs. */
type Triple = readonly [number, number, number];

export function linePath(from: Triple, to: Triple): Path {
  return finish({
    kind: 'feed',
    fromX: from[0],
    fromY: from[1],
    fromZ: from[2],
    toX: to[0],
    toY: to[1],
    toZ: to[2],
    plane: 'xy',
    centreU: 0,
    centreV: 0,
    radius: 0,
    turn: 0,
  });
}

/** An arc from a point about a centre (in plane order), with a rise along the plane's normal. */
export function arcPath(
  plane: Path['plane'],
  from: Triple,
  centreU: number,
  centreV: number,
  turn: number,
  rise = 0,
): Path {
  const [x, y, z] = from;
  const [u, v] = plane === 'xy' ? [x, y] : plane === 'zx' ? [z, x] : [y, z];
  const radius = Math.hypot(u - centreU, v - centreV);
  const open = {
    kind: 'arc',
    fromX: x,
    fromY: y,
    fromZ: z,
    toX: x + (plane === 'yz' ? rise : 0),
    toY: y + (plane === 'zx' ? rise : 0),
    toZ: z + (plane === 'xy' ? rise : 0),
    plane,
    centreU,
    centreV,
    radius,
    turn,
  };
  const end = { x: 0, y: 0, z: 0 };
  arcPointAt(finish(open), Math.atan2(v - centreV, u - centreU), 1, end);
  return finish({ ...open, toX: end.x, toY: end.y, toZ: end.z });
}

function finish(path: Omit<Path, keyof MutableBounds>): Path {
  const bounds = { minX: 0, minY: 0, minZ: 0, maxX: 0, maxY: 0, maxZ: 0 };
  return { ...path, ...findExtremes(path, bounds) };
}

/** Numbers between two bounds, the same on every run (a linear congruential generator). */
export function seededRandom(seed: number): (from: number, to: number) => number {
  let state = seed >>> 0;
  return (from, to) => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return from + ((to - from) * state) / 4294967296;
  };
}
