import type { LengthWords } from '../rules/rule';
import { roundFigure } from './rounding';

/** How a reader measures: a report gives both, a person's own view one. */
export type ReaderUnits = 'mm' | 'inch' | 'both';

const MM_PER_INCH = 25.4;

export function lengthWords(units: ReaderUnits): LengthWords {
  const pair = (mm: string, inch: string) =>
    units === 'mm' ? mm : units === 'inch' ? inch : `${mm} (${inch})`;
  const length = (mm: number) => pair(`${plain(mm)} mm`, `${inches(mm)} in`);
  return {
    length,
    position: (axis, mm) => `${axis.toUpperCase()} ${length(mm)}`,
    feed: (mmPerMinute) =>
      pair(`${speed(mmPerMinute)} mm/min`, `${speed(mmPerMinute / MM_PER_INCH)} in/min`),
  };
}

function plain(mm: number): string {
  return String(roundFigure(mm));
}

/** Three decimals, four below a tenth of an inch, where a thousandth is too coarse to compare with. */
function inches(mm: number): string {
  const value = mm / MM_PER_INCH;
  const parts = Math.abs(value) < 0.1 ? 10_000 : 1000;
  const rounded = Math.sign(value) * (Math.round(Math.abs(value) * parts) / parts);
  return String(rounded === 0 ? 0 : rounded);
}

/** Whole numbers from a hundred on; below, one decimal, and three below one. */
function speed(value: number): string {
  const size = Math.abs(value);
  const parts = size >= 100 ? 1 : size >= 1 ? 10 : 1000;
  return String(Math.round(value * parts) / parts);
}
