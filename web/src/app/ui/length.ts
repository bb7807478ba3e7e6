import type { Units } from '#contracts';

const MM_PER_INCH = 25.4;
const MINUS = '\u2212';

/** A number with a true minus sign, digits as given. */
export function signed(digits: string): string {
  return digits.startsWith('-') ? MINUS + digits.slice(1) : digits;
}

/**
 * A length of `mm` in the person's units with its unit, such as `92.4 mm` or `3.638 in`.
 * `decimals` counts for millimetres (default: up to 2, no trailing zeros); inches take one more.
 */
export function formatLength(mm: number | null | undefined, units: Units, decimals = 2): string {
  if (mm === null || mm === undefined || Number.isNaN(mm)) return '–';
  if (units === 'mm') return `${trimmed(mm, decimals)} mm`;
  return `${trimmed(mm / MM_PER_INCH, decimals + 1)} in`;
}

/** A typed length in the person's units, back in millimetres. */
export function toMm(value: number, units: Units): number {
  return units === 'mm' ? value : value * MM_PER_INCH;
}

/** A length in millimetres as the bare number a form field shows in the person's units. */
export function fromMm(mm: number, units: Units): number {
  if (units === 'mm') return mm;
  // Six decimals of an inch: a millimetre figure comes back the same to 0.0001 mm.
  return Number((mm / MM_PER_INCH).toFixed(6));
}

function trimmed(value: number, decimals: number): string {
  const fixed = value.toFixed(decimals);
  const bare = fixed.includes('.') ? fixed.replace(/\.?0+$/, '') : fixed;
  return signed(bare === '-0' ? '0' : bare);
}
