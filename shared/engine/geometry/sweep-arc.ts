import { arcPointAt, startAngle } from './path';
import type { MutablePoint, Path } from './path';
import type { Prism } from './prism';
import type { Span } from './span';
import { ARC_SEARCH_STEP } from './tolerance';

/**
 * Finds what of an arc lies in a region. The arc is cut at every place where it can cross the
 * region's surface (planes and, in XY, rounded corners, all in closed form); between two cuts it is
 * wholly inside or wholly outside, so the middle decides.
 */
export function findArcSpan(path: Path, region: Prism, span: Span): boolean {
  const start = startAngle(path);
  const cuts = [0, 1];
  addSideCuts(path, start, region, cuts);
  if (region.round > 0 && path.plane === 'xy') addCornerCuts(path, start, region, cuts);
  cuts.sort((one, other) => one - other);
  span.enter = Infinity;
  span.leave = -Infinity;
  const point: MutablePoint = { x: 0, y: 0, z: 0 };
  for (let index = 1; index < cuts.length; index += 1) {
    const from = cuts[index - 1]!;
    const to = cuts[index]!;
    arcPointAt(path, start, (from + to) / 2, point);
    if (distanceFrom(region, point) <= 0) widenSpan(span, from, to);
    else if (region.round > 0 && path.plane !== 'xy') {
      searchRounded(path, start, region, from, to, span, point);
    }
  }
  if (!(span.enter <= span.leave)) return false;
  span.lowest = lowestBetween(path, start, span, point);
  return true;
}

/** How far a point is outside a prism (mm); 0 or less: inside or on it. */
export function distanceFrom(region: Prism, point: Readonly<MutablePoint>): number {
  const awayX = Math.max(region.minX - point.x, point.x - region.maxX);
  const awayY = Math.max(region.minY - point.y, point.y - region.maxY);
  const flat =
    awayX > 0 && awayY > 0 ? Math.sqrt(awayX * awayX + awayY * awayY) : Math.max(awayX, awayY);
  return Math.max(flat - region.round, region.minZ - point.z, point.z - region.maxZ);
}

function widenSpan(span: Span, from: number, to: number): void {
  span.enter = Math.min(span.enter, from);
  span.leave = Math.max(span.leave, to);
}

/** Cuts at the six planes, and at the edges of the rounded rectangle's straight sides. */
function addSideCuts(path: Path, start: number, region: Prism, cuts: number[]): void {
  const { round } = region;
  const xs = [region.minX - round, region.maxX + round, region.minX, region.maxX];
  const ys = [region.minY - round, region.maxY + round, region.minY, region.maxY];
  const zs = [region.minZ, region.maxZ];
  switch (path.plane) {
    case 'xy':
      addCosineCuts(path, start, path.centreU, xs, cuts);
      addSineCuts(path, start, path.centreV, ys, cuts);
      addLinearCuts(path.fromZ, path.toZ, zs, cuts);
      break;
    case 'zx':
      addCosineCuts(path, start, path.centreU, zs, cuts);
      addSineCuts(path, start, path.centreV, xs, cuts);
      addLinearCuts(path.fromY, path.toY, ys, cuts);
      break;
    case 'yz':
      addCosineCuts(path, start, path.centreU, ys, cuts);
      addSineCuts(path, start, path.centreV, zs, cuts);
      addLinearCuts(path.fromX, path.toX, xs, cuts);
      break;
  }
}

function addLinearCuts(from: number, to: number, values: readonly number[], cuts: number[]): void {
  if (from === to) return;
  for (const value of values) {
    const part = (value - from) / (to - from);
    if (0 < part && part < 1) cuts.push(part);
  }
}
function addCosineCuts(
  path: Path,
  start: number,
  centre: number,
  values: readonly number[],
  cuts: number[],
): void {
  for (const value of values) {
    const cosine = (value - centre) / path.radius;
    if (!(Math.abs(cosine) <= 1)) continue;
    const angle = Math.acos(cosine);
    addAngle(path, start, angle, cuts);
    addAngle(path, start, -angle, cuts);
  }
}
function addSineCuts(
  path: Path,
  start: number,
  centre: number,
  values: readonly number[],
  cuts: number[],
): void {
  for (const value of values) {
    const sine = (value - centre) / path.radius;
    if (!(Math.abs(sine) <= 1)) continue;
    const angle = Math.asin(sine);
    addAngle(path, start, angle, cuts);
    addAngle(path, start, Math.PI - angle, cuts);
  }
}

/** Where a circle of the arc's own radius crosses the circles of the four rounded corners. */
function addCornerCuts(path: Path, start: number, region: Prism, cuts: number[]): void {
  for (const x of [region.minX, region.maxX]) {
    for (const y of [region.minY, region.maxY]) {
      const alongX = x - path.centreU;
      const alongY = y - path.centreV;
      const apart = Math.sqrt(alongX * alongX + alongY * alongY);
      if (!(apart > 0) || !Number.isFinite(apart)) continue;
      const { radius } = path;
      const cosine =
        (radius * radius + apart * apart - region.round * region.round) / (2 * radius * apart);
      if (!(Math.abs(cosine) <= 1)) continue;
      const towards = Math.atan2(alongY, alongX);
      const aside = Math.acos(cosine);
      addAngle(path, start, towards + aside, cuts);
      addAngle(path, start, towards - aside, cuts);
    }
  }
}

/** Adds every part of the arc at which it stands at this angle; a turn may pass it more than once. */
function addAngle(path: Path, start: number, angle: number, cuts: number[]): void {
  const round = 2 * Math.PI;
  const turn = Math.abs(path.turn);
  if (turn === 0) return;
  const away = path.turn >= 0 ? angle - start : start - angle;
  let passed = away - Math.floor(away / round) * round;
  while (passed < turn) {
    cuts.push(passed / turn);
    passed += round;
  }
}

/**
 * A vertical arc past a rounded edge has no simple closed form. The distance to a prism changes no
 * faster than the point moves, so a middle farther off than half the piece's length clears the piece.
 */
function searchRounded(
  path: Path,
  start: number,
  region: Prism,
  from: number,
  to: number,
  span: Span,
  point: MutablePoint,
): void {
  const middle = (from + to) / 2;
  arcPointAt(path, start, middle, point);
  const away = distanceFrom(region, point);
  const half = (arcLength(path) * (to - from)) / 2;
  if (away <= 0) {
    widenSpan(span, middle, middle);
    return;
  }
  if (away > half || half < ARC_SEARCH_STEP) return;
  searchRounded(path, start, region, from, middle, span, point);
  searchRounded(path, start, region, middle, to, span, point);
}

/** Length of an arc with its rise, mm. */
export function arcLength(path: Path): number {
  const around = path.radius * path.turn;
  const rise =
    path.plane === 'xy'
      ? path.toZ - path.fromZ
      : path.plane === 'zx'
        ? path.toY - path.fromY
        : path.toX - path.fromX;
  return Math.sqrt(around * around + rise * rise);
}

/** An arc in XY rises evenly, so its ends decide; a vertical one may dip between them. */
function lowestBetween(path: Path, start: number, span: Span, point: MutablePoint): number {
  if (path.plane !== 'xy') return path.minZ;
  const first = arcPointAt(path, start, span.enter, point).z;
  return Math.min(first, arcPointAt(path, start, span.leave, point).z);
}
