import type { Motion } from '#engine';

/** Chords of one arc at most: a helix of a thousand turns must not fill the path by itself. */
const MOST_CHORDS = 2000;

/**
 * Gives the points of an arc as seen from above, the end included and the start not, so that no chord
 * is farther than `tolerance` (mm) from the arc. In the ZX and YZ planes only one of the two circle
 * axes shows; the third axis runs evenly from start to end.
 */
export function flattenArc(
  arc: Motion,
  tolerance: number,
  give: (x: number, y: number) => void,
): void {
  const { plane, centreU, centreV, turn } = arc;
  const startU = { xy: arc.fromX, zx: arc.fromZ, yz: arc.fromY }[plane];
  const startV = { xy: arc.fromY, zx: arc.fromX, yz: arc.fromZ }[plane];
  const radius = Math.hypot(startU - centreU, startV - centreV);
  const startAngle = Math.atan2(startV - centreV, startU - centreU);
  const chords = countChords(radius, turn, tolerance);
  for (let at = 1; at < chords; at += 1) {
    const part = at / chords;
    const angle = startAngle + turn * part;
    const u = centreU + radius * Math.cos(angle);
    const v = centreV + radius * Math.sin(angle);
    if (plane === 'xy') give(u, v);
    else if (plane === 'zx') give(v, arc.fromY + (arc.toY - arc.fromY) * part);
    else give(arc.fromX + (arc.toX - arc.fromX) * part, u);
  }
  give(arc.toX, arc.toY);
}

/** A chord over the angle a is radius × (1 − cos(a / 2)) away from its arc at most. */
function countChords(radius: number, turn: number, tolerance: number): number {
  const most = radius <= tolerance ? Math.PI / 2 : 2 * Math.acos(1 - tolerance / radius);
  const chords = Math.ceil(Math.abs(turn) / most);
  return Number.isFinite(chords) ? Math.min(Math.max(chords, 1), MOST_CHORDS) : 1;
}
