/** NISTIR 6556 3.2.2.1: a value that must be whole may lie within this of a whole number. */
const WHOLE_ROUNDING = 0.0001;

/** The whole number that is meant, or NaN. */
export function wholeNumber(value: number): number {
  const whole = Math.round(value);
  return Math.abs(value - whole) <= WHOLE_ROUNDING ? whole + 0 : NaN;
}
