import type { Path } from './path';
import type { Prism } from './prism';
import type { Span } from './span';
import { findArcSpan } from './sweep-arc';

/**
 * Whether a box around the path is certainly apart from the region's own bounds: the fast test. NaN
 * is never apart, so the careful test sees it.
 */
export function isApart(path: Path, bounds: Prism): boolean {
  return (
    path.maxX < bounds.minX ||
    bounds.maxX < path.minX ||
    path.maxY < bounds.minY ||
    bounds.maxY < path.minY ||
    path.maxZ < bounds.minZ ||
    bounds.maxZ < path.minZ
  );
}

/**
 * Finds the part of the path inside the region, exactly for segments, for arcs in the XY plane and
 * for boxes, to ARC_SEARCH_STEP where a vertical arc passes a rounded edge. False: the path is clear.
 * A path with a NaN in it is inside from start to end.
 */
export function findSpan(path: Path, region: Prism, span: Span): boolean {
  if (!isNumeric(path)) {
    span.enter = 0;
    span.leave = 1;
    span.lowest = NaN;
    return true;
  }
  return path.kind === 'arc'
    ? findArcSpan(path, region, span)
    : findSegmentSpan(path, region, span);
}

/**
 * As findSpan, where all that is known of the path is that it stays in its own box: every axis may
 * arrive at its own time. True when the box and the region overlap at all.
 */
export function findBoxSpan(path: Path, region: Prism, span: Span): boolean {
  const apartX = Math.max(region.minX - path.maxX, path.minX - region.maxX, 0);
  const apartY = Math.max(region.minY - path.maxY, path.minY - region.maxY, 0);
  if (path.maxZ < region.minZ || region.maxZ < path.minZ) return false;
  if (apartX * apartX + apartY * apartY > region.round * region.round) return false;
  if (region.maxX < region.minX || region.maxY < region.minY) return false;
  span.enter = 0;
  span.leave = 1;
  span.lowest = Math.max(path.minZ, region.minZ);
  return true;
}

function isNumeric(path: Path): boolean {
  const ends = path.fromX + path.fromY + path.fromZ + path.toX + path.toY + path.toZ;
  if (Number.isNaN(ends)) return false;
  return path.kind !== 'arc' || !Number.isNaN(path.centreU + path.centreV + path.turn);
}

/** A prism is convex, so what a straight path has inside it is one interval. */
function findSegmentSpan(path: Path, region: Prism, span: Span): boolean {
  if (!findFlatSpan(path, region, span)) return false;
  const rise = path.toZ - path.fromZ;
  let { enter, leave } = span;
  if (rise === 0) {
    if (path.fromZ < region.minZ || region.maxZ < path.fromZ) return false;
  } else {
    const atLow = (region.minZ - path.fromZ) / rise;
    const atHigh = (region.maxZ - path.fromZ) / rise;
    enter = Math.max(enter, Math.min(atLow, atHigh));
    leave = Math.min(leave, Math.max(atLow, atHigh));
    if (leave < enter) return false;
  }
  span.enter = enter;
  span.leave = leave;
  span.lowest = path.fromZ + rise * (rise < 0 ? leave : enter);
  return true;
}

/**
 * The interval of a straight path over a rounded rectangle: the hull of its intervals over the two
 * rectangles and four discs that make it up. Leaves z alone.
 */
function findFlatSpan(path: Path, region: Prism, span: Span): boolean {
  span.enter = Infinity;
  span.leave = -Infinity;
  const { minX, minY, maxX, maxY, round } = region;
  addRectangle(path, minX - round, maxX + round, minY, maxY, span);
  if (round > 0) {
    addRectangle(path, minX, maxX, minY - round, maxY + round, span);
    addDisc(path, minX, minY, round, span);
    addDisc(path, maxX, minY, round, span);
    addDisc(path, minX, maxY, round, span);
    addDisc(path, maxX, maxY, round, span);
  }
  return span.enter <= span.leave;
}

function addRectangle(
  path: Path,
  lowX: number,
  highX: number,
  lowY: number,
  highY: number,
  span: Span,
): void {
  let enter = 0;
  let leave = 1;
  const alongX = path.toX - path.fromX;
  if (alongX === 0) {
    if (path.fromX < lowX || highX < path.fromX) return;
  } else {
    const first = (lowX - path.fromX) / alongX;
    const second = (highX - path.fromX) / alongX;
    enter = Math.max(enter, Math.min(first, second));
    leave = Math.min(leave, Math.max(first, second));
  }
  const alongY = path.toY - path.fromY;
  if (alongY === 0) {
    if (path.fromY < lowY || highY < path.fromY) return;
  } else {
    const first = (lowY - path.fromY) / alongY;
    const second = (highY - path.fromY) / alongY;
    enter = Math.max(enter, Math.min(first, second));
    leave = Math.min(leave, Math.max(first, second));
  }
  if (leave < enter || highX < lowX || highY < lowY) return;
  span.enter = Math.min(span.enter, enter);
  span.leave = Math.max(span.leave, leave);
}

function addDisc(path: Path, x: number, y: number, radius: number, span: Span): void {
  if (!Number.isFinite(x) || !Number.isFinite(y)) return;
  const alongX = path.toX - path.fromX;
  const alongY = path.toY - path.fromY;
  const awayX = path.fromX - x;
  const awayY = path.fromY - y;
  const square = alongX * alongX + alongY * alongY;
  const beyond = awayX * awayX + awayY * awayY - radius * radius;
  if (square === 0) {
    if (beyond > 0) return;
    span.enter = Math.min(span.enter, 0);
    span.leave = Math.max(span.leave, 1);
    return;
  }
  const half = awayX * alongX + awayY * alongY;
  const root = half * half - square * beyond;
  if (root < 0) return;
  const width = Math.sqrt(root);
  const enter = Math.max(0, (-half - width) / square);
  const leave = Math.min(1, (-half + width) / square);
  if (leave < enter) return;
  span.enter = Math.min(span.enter, enter);
  span.leave = Math.max(span.leave, leave);
}
