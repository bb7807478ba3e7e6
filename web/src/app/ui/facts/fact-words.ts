import type { Units } from '#contracts';
import { formatMoment } from '../time';
import type { FactField } from './fact-field';
import { isRecord, part } from './fact-node';
import type { Quantity } from './measure';
import { suffixOf, wordFigure } from './measure';

/** Said where nothing is known or nothing stands. */
export const NOT_SAID = 'not said';
const AXES = ['x', 'y', 'z'] as const;

/** A fact as one line of text, for reading; lists and maps are drawn entry by entry instead. */
export function wordFact(field: FactField, value: unknown, units: Units, now: Date): string {
  if (value === undefined || value === null || value === '') return NOT_SAID;
  switch (field.type) {
    case 'figure':
      return typeof value === 'number'
        ? wordFigure(value, field.quantity, units)
        : `the value of word ${String(value)}`;
    case 'text':
      return String(value);
    case 'choice':
      return labelOf(field.choices, value);
    case 'several':
      return Array.isArray(value)
        ? value.map((each) => labelOf(field.choices, each)).join(', ')
        : NOT_SAID;
    case 'flag':
      return value === true ? field.yes : field.no;
    case 'moment':
      return formatMoment(String(value), now);
    case 'interval':
      return wordInterval(value, field.quantity, units);
    case 'box':
      return wordBox(value, units);
    case 'group':
      return wordGroup(field.fields, value, units, now);
    case 'list':
    case 'map':
      return '';
  }
}

/** A box by its sides, an open side said as such: "X −60 to 60, Z above 0 mm". */
export function wordBox(value: unknown, units: Units): string {
  const sides = AXES.flatMap((axis) => {
    const from = part(part(value, 'min'), axis);
    const to = part(part(value, 'max'), axis);
    const side = wordSide(from, to, units);
    return side === undefined ? [] : [`${axis.toUpperCase()} ${side}`];
  });
  return sides.length === 0 ? 'everywhere' : sides.join(', ');
}

function wordSide(from: unknown, to: unknown, units: Units): string | undefined {
  const bare = (figure: number) => bareFigure(figure, 'length', units);
  const unit = suffixOf('length', units);
  if (typeof from === 'number' && typeof to === 'number') {
    return `${bare(from)} to ${bare(to)} ${unit}`;
  }
  if (typeof from === 'number') return `above ${bare(from)} ${unit}`;
  if (typeof to === 'number') return `below ${bare(to)} ${unit}`;
  return undefined;
}

function wordInterval(value: unknown, quantity: Quantity, units: Units): string {
  const pair: readonly unknown[] = Array.isArray(value) ? value : [];
  const [from, to] = pair;
  if (typeof from !== 'number' || typeof to !== 'number') return NOT_SAID;
  return `${bareFigure(from, quantity, units)} to ${wordFigure(to, quantity, units)}`;
}

function wordGroup(fields: readonly FactField[], value: unknown, units: Units, now: Date): string {
  if (!isRecord(value)) return NOT_SAID;
  return fields
    .filter((each) => value[each.key] !== undefined && value[each.key] !== null)
    .map((each) => `${each.label} ${wordFact(each, value[each.key], units, now)}`)
    .join(', ');
}

function bareFigure(figure: number, quantity: Quantity, units: Units): string {
  const suffix = suffixOf(quantity, units);
  return wordFigure(figure, quantity, units).replace(suffix, '').trim();
}

function labelOf(
  choices: readonly { readonly value: string; readonly label: string }[],
  value: unknown,
): string {
  return choices.find((each) => each.value === value)?.label ?? String(value);
}
