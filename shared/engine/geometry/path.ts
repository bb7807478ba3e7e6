/**
 * The path of one point: a straight segment, or an arc (with a helix's rise) in one of the three
 * planes. Field names are those of a motion, so that a motion is a path without being copied.
 */
export interface Path {
  /** 'arc' bends; anything else is straight. */
  readonly kind: string;
  readonly fromX: number;
  readonly fromY: number;
  readonly fromZ: number;
  readonly toX: number;
  readonly toY: number;
  readonly toZ: number;
  /** True extremes of the path. */
  readonly minX: number;
  readonly minY: number;
  readonly minZ: number;
  readonly maxX: number;
  readonly maxY: number;
  readonly maxZ: number;
  /** Arcs only. xy: u = x, v = y; zx: u = z, v = x; yz: u = y, v = z. */
  readonly plane: 'xy' | 'zx' | 'yz';
  readonly centreU: number;
  readonly centreV: number;
  readonly radius: number;
  /** Radians, > 0 is counter-clockwise seen from the positive end of the axis normal to the plane. */
  readonly turn: number;
}
export interface MutablePoint {
  x: number;
  y: number;
  z: number;
}
export interface MutableBounds {
  minX: number;
  minY: number;
  minZ: number;
  maxX: number;
  maxY: number;
  maxZ: number;
}
const QUARTER = Math.PI / 2;

/** Angle of the start of an arc as seen from its centre, radians in the plane's own u to v sense. */
export function startAngle(path: Path): number {
  switch (path.plane) {
    case 'xy':
      return Math.atan2(path.fromY - path.centreV, path.fromX - path.centreU);
    case 'zx':
      return Math.atan2(path.fromX - path.centreV, path.fromZ - path.centreU);
    case 'yz':
      return Math.atan2(path.fromZ - path.centreV, path.fromY - path.centreU);
  }
}

/** The point at `part` of the path (0 its start, 1 its end), written into `out`. */
export function pointAt(path: Path, part: number, out: MutablePoint): MutablePoint {
  if (path.kind !== 'arc') {
    out.x = path.fromX + (path.toX - path.fromX) * part;
    out.y = path.fromY + (path.toY - path.fromY) * part;
    out.z = path.fromZ + (path.toZ - path.fromZ) * part;
    return out;
  }
  return arcPointAt(path, startAngle(path), part, out);
}

/** As pointAt, for an arc whose start angle is already known. */
export function arcPointAt(
  path: Path,
  start: number,
  part: number,
  out: MutablePoint,
): MutablePoint {
  const angle = start + path.turn * part;
  const u = path.centreU + path.radius * Math.cos(angle);
  const v = path.centreV + path.radius * Math.sin(angle);
  switch (path.plane) {
    case 'xy':
      out.x = u;
      out.y = v;
      out.z = path.fromZ + (path.toZ - path.fromZ) * part;
      break;
    case 'zx':
      out.x = v;
      out.y = path.fromY + (path.toY - path.fromY) * part;
      out.z = u;
      break;
    case 'yz':
      out.x = path.fromX + (path.toX - path.fromX) * part;
      out.y = u;
      out.z = v;
      break;
  }
  return out;
}

/** The true extremes of a path: its ends, and every quadrant point an arc passes. */
export function findExtremes(
  path: Omit<Path, keyof MutableBounds>,
  out: MutableBounds,
): MutableBounds {
  out.minX = Math.min(path.fromX, path.toX);
  out.maxX = Math.max(path.fromX, path.toX);
  out.minY = Math.min(path.fromY, path.toY);
  out.maxY = Math.max(path.fromY, path.toY);
  out.minZ = Math.min(path.fromZ, path.toZ);
  out.maxZ = Math.max(path.fromZ, path.toZ);
  if (path.kind !== 'arc') return out;
  const start = startAngle(path as Path);
  if (passesAngle(start, path.turn, 0)) widen(path, 1, 0, out);
  if (passesAngle(start, path.turn, QUARTER)) widen(path, 0, 1, out);
  if (passesAngle(start, path.turn, 2 * QUARTER)) widen(path, -1, 0, out);
  if (passesAngle(start, path.turn, 3 * QUARTER)) widen(path, 0, -1, out);
  return out;
}

/**
 * The least value of one coordinate that a path itself goes to: its end, or a bulge of an arc past its
 * start; where it starts is the doing of the path before. Takes the coordinate's start, end and least.
 */
export function ownLeast(from: number, to: number, least: number): number {
  return least === from && from < to ? to : least;
}
/** As ownLeast, for the greatest. */
export function ownGreatest(from: number, to: number, greatest: number): number {
  return greatest === from && to < from ? to : greatest;
}

/** Whether a turn from `start` passes `angle`, all in radians. */
export function passesAngle(start: number, turn: number, angle: number): boolean {
  const away = turn >= 0 ? angle - start : start - angle;
  const round = 2 * Math.PI;
  const first = away - Math.floor(away / round) * round;
  return first <= Math.abs(turn);
}

function widen(
  path: Omit<Path, keyof MutableBounds>,
  alongU: number,
  alongV: number,
  out: MutableBounds,
): void {
  const u = path.centreU + path.radius * alongU;
  const v = path.centreV + path.radius * alongV;
  switch (path.plane) {
    case 'xy':
      if (alongU !== 0) widenX(out, u);
      else widenY(out, v);
      break;
    case 'zx':
      if (alongU !== 0) widenZ(out, u);
      else widenX(out, v);
      break;
    case 'yz':
      if (alongU !== 0) widenY(out, u);
      else widenZ(out, v);
      break;
  }
}
function widenX(out: MutableBounds, x: number): void {
  out.minX = Math.min(out.minX, x);
  out.maxX = Math.max(out.maxX, x);
}
function widenY(out: MutableBounds, y: number): void {
  out.minY = Math.min(out.minY, y);
  out.maxY = Math.max(out.maxY, y);
}
function widenZ(out: MutableBounds, z: number): void {
  out.minZ = Math.min(out.minZ, z);
  out.maxZ = Math.max(out.maxZ, z);
}

/**
 * The direction (of length 1) in which an arc runs at its start (0) or end (1), its rise included: at right
 * angles to the line from its centre.
 */
export function arcTangent(path: Path, part: 0 | 1, out: MutablePoint): MutablePoint {
  const x = part === 0 ? path.fromX : path.toX;
  const y = part === 0 ? path.fromY : path.toY;
  const z = part === 0 ? path.fromZ : path.toZ;
  const around = Math.abs(path.radius * path.turn);
  const sense = path.turn < 0 ? -1 : 1;
  const { centreU, centreV, plane } = path;
  const u = (plane === 'xy' ? x : plane === 'zx' ? z : y) - centreU;
  const v = (plane === 'xy' ? y : plane === 'zx' ? x : z) - centreV;
  const rise =
    plane === 'xy'
      ? path.toZ - path.fromZ
      : plane === 'zx'
        ? path.toY - path.fromY
        : path.toX - path.fromX;
  const flat = (sense * around) / Math.sqrt((u * u + v * v) * (around * around + rise * rise));
  const up = rise / Math.sqrt(around * around + rise * rise);
  out.x = plane === 'xy' ? -v * flat : plane === 'zx' ? u * flat : up;
  out.y = plane === 'xy' ? u * flat : plane === 'zx' ? up : -v * flat;
  out.z = plane === 'xy' ? up : plane === 'zx' ? -v * flat : u * flat;
  return out;
}
