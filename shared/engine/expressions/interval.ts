/** All numbers from `least` to `greatest`, ends included; either may be infinite. */
export interface Interval {
  readonly least: number;
  readonly greatest: number;
}

export const EVERYTHING: Interval = { least: -Infinity, greatest: Infinity };
/** Of a condition that cannot be decided. */
export const EITHER: Interval = { least: 0, greatest: 1 };

/** Ends that came out as no number, as ∞ − ∞ does, say nothing about the value. */
export const interval = (least: number, greatest: number): Interval =>
  least <= greatest ? { least, greatest } : EVERYTHING;

/**
 * A few units in the last place: sines, powers and logarithms are not rounded correctly everywhere, so an
 * interval worked out from its ends is widened by more than they may be wrong by.
 */
const SLACK = 2 ** -48;

export const outward = (least: number, greatest: number): Interval =>
  interval(
    least - Math.abs(least) * SLACK - Number.MIN_VALUE,
    greatest + Math.abs(greatest) * SLACK + Number.MIN_VALUE,
  );

/** The least and greatest of some values; everything when one of them is no number. */
export function hull(values: readonly number[]): Interval {
  return interval(Math.min(...values), Math.max(...values));
}

export const holds = ({ least, greatest }: Interval, value: number): boolean =>
  least <= value && value <= greatest;

export function multiply(a: Interval, b: Interval): Interval {
  return hull([
    product(a.least, b.least),
    product(a.least, b.greatest),
    product(a.greatest, b.least),
    product(a.greatest, b.greatest),
  ]);
}

/** Nought times an endless bound is nought: every value below the bound is finite. */
const product = (a: number, b: number): number => (a === 0 || b === 0 ? 0 : a * b);

/** By an interval that holds nought, the quotient may be anything. */
export function divide(a: Interval, b: Interval): Interval {
  if (holds(b, 0)) return EVERYTHING;
  return hull([
    a.least / b.least,
    a.least / b.greatest,
    a.greatest / b.least,
    a.greatest / b.greatest,
  ]);
}

/** The remainder is never negative (NISTIR 6556 3.2.2.3) and always less than the divisor. */
export function remainder(a: Interval, b: Interval): Interval {
  const divisor = Math.max(Math.abs(b.least), Math.abs(b.greatest));
  const isFixed = b.least === b.greatest && b.least !== 0;
  const turn = Math.floor(a.least / divisor);
  if (isFixed && turn === Math.floor(a.greatest / divisor)) {
    const from = remainderOf(a.least, divisor);
    const to = remainderOf(a.greatest, divisor);
    // Rounding may put two ends into one turn that lie in two.
    if (to - from >= (a.greatest - a.least) / 2) return interval(from, to);
  }
  return interval(0, divisor);
}

export function remainderOf(a: number, b: number): number {
  const rest = a % b;
  return rest < 0 ? rest + Math.abs(b) : rest;
}

/** Over bases above nought a power rises or falls with either part, so its extremes are at the corners. */
export function power(a: Interval, b: Interval): Interval {
  if (a.least > 0)
    return widened([
      a.least ** b.least,
      a.least ** b.greatest,
      a.greatest ** b.least,
      a.greatest ** b.greatest,
    ]);
  const exponent = b.least;
  const isWhole = exponent === b.greatest && Number.isInteger(exponent);
  if (!isWhole || (exponent < 0 && holds(a, 0))) {
    const isRoot = a.least === 0 && b.least > 0;
    return isRoot ? widened([0, a.greatest ** b.least, a.greatest ** b.greatest]) : EVERYTHING;
  }
  const ends = [a.least ** exponent, a.greatest ** exponent];
  return widened(holds(a, 0) ? [...ends, 0 ** exponent] : ends);
}

function widened(values: readonly number[]): Interval {
  const { least, greatest } = hull(values);
  return outward(least, greatest);
}

/** Sines of an interval of degrees; `shift` of 90 makes them cosines. */
export function sine({ least, greatest }: Interval, shift: number): Interval {
  const from = least + shift;
  const to = greatest + shift;
  if (!(to - from < 360)) return { least: -1, greatest: 1 };
  const ends = [sineOf(from), sineOf(to)];
  if (passes(from, to, 90)) ends.push(1);
  if (passes(from, to, 270)) ends.push(-1);
  const { least: low, greatest: high } = hull(ends);
  const slack = ANGLE_SLACK * (1 + ANGLE_SLACK * Math.max(Math.abs(from), Math.abs(to)));
  return { least: Math.max(low - slack, -1), greatest: Math.min(high + slack, 1) };
}

/** Angles of many turns lose digits when they are made radians: about 1e-18 of themselves. */
const ANGLE_SLACK = 1e-8;

const sineOf = (degrees: number): number => Math.sin((degrees * Math.PI) / 180);

/** Whether some whole number of turns from `angle` lies between `from` and `to`. */
function passes(from: number, to: number, angle: number): boolean {
  return (
    Math.floor((to - angle) / 360) > Math.floor((from - angle) / 360) || (from - angle) % 360 === 0
  );
}

export function tangent({ least, greatest }: Interval): Interval {
  const hasPole =
    !(greatest - least < 180) ||
    Math.floor((greatest - 90) / 180) > Math.floor((least - 90) / 180) ||
    (least - 90) % 180 === 0;
  if (hasPole) return EVERYTHING;
  const from = Math.tan((least * Math.PI) / 180);
  const to = Math.tan((greatest * Math.PI) / 180);
  return from <= to ? outward(from, to) : EVERYTHING;
}

/** Directions of a box of points, −180 … 180 degrees. */
export function direction(y: Interval, x: Interval): Interval {
  // Across the line where the angle jumps from 180 to −180, it may be anything.
  if (x.least <= 0 && holds(y, 0)) return { least: -180, greatest: 180 };
  const corners = [y.least, y.greatest].flatMap((dy) =>
    [x.least, x.greatest].map((dx) => directionOf(dy, dx)),
  );
  return widened(corners);
}

export const directionOf = (y: number, x: number): number => (Math.atan2(y, x) * 180) / Math.PI;
