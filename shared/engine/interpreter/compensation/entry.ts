import type { Circle } from '../kept';
import type { Vector } from './corner';

/**
 * How compensation is entered (NISTIR 6556, appendix B). Plane geometry in mm; `side` is 1 for a cutter on the
 * left of the path, −1 on the right.
 */

/**
 * The normal at the end of a straight entry from one point to another, farther off than the radius: the cutter
 * comes to the end along a tangent, on its side of it.
 */
export function straightEntryNormal(
  from: Vector,
  to: Vector,
  radius: number,
  side: number,
): Vector {
  const dx = from.x - to.x;
  const dy = from.y - to.y;
  const back = Math.atan2(dy, dx);
  const angle = back - side * Math.acos(radius / Math.sqrt(dx * dx + dy * dy));
  return { x: Math.cos(angle), y: Math.sin(angle) };
}

/**
 * The centre of an entry arc given by the radius of the programmed arc: as far from the cutter's centre as the
 * cutter's path will be, and as far from the end as the programmed arc. Fills `circle` with it and with the radius of
 * the cutter's path; false if there is none.
 */
export function findEntryCircle(
  from: Vector,
  to: Vector,
  arc: { readonly radius: number; readonly path: number; readonly turning: 1 | -1 },
  circle: Circle,
): boolean {
  const dx = to.x - from.x;
  const dy = to.y - from.y;
  const apart = Math.sqrt(dx * dx + dy * dy);
  const size = Math.abs(arc.radius);
  const along = (arc.path * arc.path + apart * apart - size * size) / (2 * apart);
  if (!(arc.path > 0) || !(Math.abs(along) <= arc.path)) return false;
  const aside = Math.sqrt(arc.path * arc.path - along * along);
  const side = arc.turning * Math.sign(arc.radius);
  circle.u = from.x + (along * dx - side * aside * dy) / apart;
  circle.v = from.y + (along * dy + side * aside * dx) / apart;
  circle.radius = arc.path;
  return true;
}
