import type { FindingData, FindingValue } from './report';

/**
 * Figures are rounded once, on entry to the report: half away from zero, never −0. Sine and cosine may
 * differ between engines in the last digit; reports may not.
 */

/** To 0.001 (mm, degrees, rev/min and the like). */
export function roundFigure(value: number): number {
  return roundTo(value, 1000);
}

/** Times, to 0.1 s. */
export function roundSeconds(value: number): number {
  return roundTo(value, 10);
}

/**
 * Fifteen significant digits are kept before the half is judged, so that 1.0005, which a double stores
 * a hair below, rounds as it is written.
 */
function roundTo(value: number, parts: number): number {
  const scaled = Number((Math.abs(value) * parts).toPrecision(15));
  const rounded = Math.floor(scaled + 0.5) / parts;
  return rounded === 0 ? 0 : value < 0 ? -rounded : rounded;
}

/** A finding's figures, rounded; a key that ends in `seconds` is a time. What is not a number has no figure: null. */
export function roundData(data: FindingData): FindingData {
  const rounded: Record<string, FindingValue> = {};
  for (const key of Object.keys(data)) rounded[key] = roundValue(key, data[key] ?? null);
  return rounded;
}

function roundValue(key: string, value: FindingValue): FindingValue {
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) return null;
    return /seconds$/i.test(key) ? roundSeconds(value) : roundFigure(value);
  }
  if (Array.isArray(value)) return value.map((each: FindingValue) => roundValue(key, each));
  return value;
}
