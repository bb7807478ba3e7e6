import type { Units } from '#contracts';
import { formatDuration } from '../time';

/**
 * What a figure measures. Stored: mm, mm/min, mm/s², s, rev/min, kg, degrees; only lengths change
 * with the person's unit. A lifetime is stored in seconds and typed in minutes.
 */
export type Quantity =
  | 'length'
  | 'feed'
  | 'acceleration'
  | 'seconds'
  | 'lifetime'
  | 'rpm'
  | 'mass'
  | 'degrees'
  | 'plain'
  | 'whole';

/** By definition since 1959, exactly; never rounded on the way in. */
export const MM_PER_INCH = 25.4;

const SUFFIX: Record<Quantity, Record<Units, string>> = {
  length: { mm: 'mm', inch: 'in' },
  feed: { mm: 'mm/min', inch: 'in/min' },
  acceleration: { mm: 'mm/s²', inch: 'in/s²' },
  seconds: { mm: 's', inch: 's' },
  lifetime: { mm: 'min', inch: 'min' },
  rpm: { mm: 'rev/min', inch: 'rev/min' },
  mass: { mm: 'kg', inch: 'kg' },
  degrees: { mm: '°', inch: '°' },
  plain: { mm: '', inch: '' },
  whole: { mm: '', inch: '' },
};

const SECONDS = { s: 1, min: 60, h: 3600 } as const;

/** Decimals that keep at least a thousandth of a millimetre in either unit. */
const DECIMALS: Record<Units, number> = { mm: 4, inch: 5 };

export function suffixOf(quantity: Quantity, units: Units): string {
  return SUFFIX[quantity][units];
}

/** The figure as a person types it: no grouping, a plain minus, no trailing zeros. */
export function showFigure(stored: number, quantity: Quantity, units: Units): string {
  const shown = stored / storedPer(quantity, units);
  const rounded = Number(shown.toFixed(turnsWithUnit(quantity) ? DECIMALS[units] : 6));
  return String(rounded === 0 ? 0 : rounded);
}

/** The figure as a person reads it, with its unit: "−12.5 mm", "24000 rev/min". */
export function wordFigure(stored: number, quantity: Quantity, units: Units): string {
  if (quantity === 'lifetime') return formatDuration(stored);
  const figure = showFigure(stored, quantity, units).replace('-', '−');
  const suffix = suffixOf(quantity, units);
  if (suffix === '') return figure;
  return suffix === '°' ? `${figure}°` : `${figure} ${suffix}`;
}

/** Millimetres and inches together, where a mistake between them would hurt: "6.35 mm (0.25 in)". */
export function wordBoth(stored: number): string {
  return `${wordFigure(stored, 'length', 'mm')} (${wordFigure(stored, 'length', 'inch')})`;
}

export type ReadFigure =
  { readonly stored: number } | { readonly sentence: string } | { readonly empty: true };

/**
 * Reads a typed figure into its stored unit. Takes a decimal comma where it cannot be a thousands
 * mark, fractions of an inch ("3/8", "1 1/2") and a unit written behind the figure, which wins over
 * the person's own ("12.7mm" typed by someone who works in inches).
 */
export function readFigure(typed: string, quantity: Quantity, units: Units): ReadFigure {
  const text = typed.trim().replace(/[−–]/g, '-');
  if (text === '') return { empty: true };
  const { body, factor, unknown } = splitUnit(text, quantity, units);
  if (unknown !== undefined) return { sentence: `“${unknown}” is no unit for this figure.` };
  if (/^-?\d{1,3},\d{3}$/.test(body)) {
    return {
      sentence: `“${body}” could be read two ways. Write ${body.replace(',', '.')} or ${body.replace(',', '')}.`,
    };
  }
  const figure = readNumber(body.replace(',', '.'));
  if (figure === undefined) return { sentence: `“${typed.trim()}” is not a number.` };
  if (quantity === 'whole' && !Number.isInteger(figure)) {
    return { sentence: 'Only a whole number fits here.' };
  }
  return { stored: settle(figure * factor) };
}

/** How much of the stored unit one of the shown unit is. */
function storedPer(quantity: Quantity, units: Units): number {
  if (quantity === 'lifetime') return SECONDS.min;
  return turnsWithUnit(quantity) && units === 'inch' ? MM_PER_INCH : 1;
}

function turnsWithUnit(quantity: Quantity): boolean {
  return quantity === 'length' || quantity === 'feed' || quantity === 'acceleration';
}

/** Takes the binary crumbs off a product by 25.4 (0.1 in is 2.54, not 2.5400000000000005). */
function settle(figure: number): number {
  const settled = Number(figure.toPrecision(14));
  return settled === 0 ? 0 : settled;
}

function splitUnit(
  text: string,
  quantity: Quantity,
  units: Units,
): { body: string; factor: number; unknown?: string } {
  const factor = storedPer(quantity, units);
  const match = /^([-+\d.,/ ]+?)\s*([a-z"″°²/³]+)?$/i.exec(text);
  if (match === null) return { body: text, factor };
  const [, body = '', tail] = match;
  if (tail === undefined) return { body, factor };
  const written = tail.toLowerCase();
  if (turnsWithUnit(quantity)) {
    if (/^(mm|mm\/min|mm\/s(²|2)?)$/.test(written)) return { body, factor: 1 };
    if (/^(in|inch|"|″|in\/min|in\/s(²|2)?)$/.test(written)) return { body, factor: MM_PER_INCH };
  }
  if (quantity === 'lifetime' && isTimeUnit(written)) return { body, factor: SECONDS[written] };
  if (written === suffixOf(quantity, units).toLowerCase()) return { body, factor };
  return { body, factor, unknown: tail };
}

function isTimeUnit(written: string): written is keyof typeof SECONDS {
  return written in SECONDS;
}

/** A decimal number, or a fraction with or without a whole part before it. */
function readNumber(text: string): number | undefined {
  if (/^[-+]?(\d+\.?\d*|\.\d+)$/.test(text)) return Number(text);
  const fraction = /^([-+]?)(?:(\d+)\s+)?(\d+)\/(\d+)$/.exec(text);
  if (fraction === null) return undefined;
  const [, sign, whole = '0', over, under] = fraction;
  if (Number(under) === 0) return undefined;
  return (Number(whole) + Number(over) / Number(under)) * (sign === '-' ? -1 : 1);
}
