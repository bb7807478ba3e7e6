/**
 * Times of motion with constant acceleration, as in any handbook of mechanics: v = a t, s = a t² / 2.
 * Lengths mm, speeds mm/s, accelerations mm/s², times s.
 */

/**
 * Seconds for a length that is entered and left at given speeds, with `most` as the greatest speed
 * between: speeding up, cruising, slowing down, or a triangle where the length is too short to cruise.
 * Where the length is even too short to get from one speed to the other, the speeds are taken as
 * met: then the mean of both holds all along.
 */
export function travelSeconds(
  length: number,
  acceleration: number,
  most: number,
  enter: number,
  leave: number,
): number {
  if (!(length > 0)) return 0;
  const cruise = Math.max(most, enter, leave);
  const ramps = (2 * cruise * cruise - enter * enter - leave * leave) / (2 * acceleration);
  if (ramps <= length) {
    return (2 * cruise - enter - leave) / acceleration + (length - ramps) / cruise;
  }
  const peak = Math.sqrt(acceleration * length + (enter * enter + leave * leave) / 2);
  if (peak < Math.max(enter, leave)) return (2 * length) / (enter + leave);
  return (2 * peak - enter - leave) / acceleration;
}

/** Seconds from standstill to standstill. */
export function standstillSeconds(length: number, acceleration: number, most: number): number {
  return travelSeconds(length, acceleration, most, 0, 0);
}

/** The greatest value along a direction when each axis has its own: the axis that is used up first. */
export function alongDirection(
  x: number,
  y: number,
  z: number,
  limits: { readonly x: number; readonly y: number; readonly z: number },
): number {
  let most = Infinity;
  if (x !== 0) most = Math.min(most, limits.x / Math.abs(x));
  if (y !== 0) most = Math.min(most, limits.y / Math.abs(y));
  if (z !== 0) most = Math.min(most, limits.z / Math.abs(z));
  return most;
}
