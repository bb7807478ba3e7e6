import type { Units } from '#contracts';
import { counted } from '../count';
import type { Difference } from './differences';
import type { FactField } from './fact-field';
import type { FactPath } from './fact-form';
import { wordFigure } from './measure';
import { NOT_SAID, wordFact } from './fact-words';

/** A difference as a person reads it: "Travel, X, to: 1300 mm, now 1310 mm". */
export function wordDifference(
  difference: Difference,
  fields: readonly FactField[],
  units: Units,
): string {
  const { words, field } = locate(fields, difference.path);
  const word = (value: unknown) => wordValue(value, field, units);
  const was = difference.was === undefined ? '' : `${word(difference.was)}, now `;
  return `${words.join(', ')}: ${was}${word(difference.is)}`;
}

function wordValue(value: unknown, field: FactField | undefined, units: Units): string {
  if (value === undefined || value === null) return NOT_SAID;
  if (Array.isArray(value) && field?.type === 'list') {
    return counted(value.length, 'entry', 'entries');
  }
  if (typeof value === 'number' && (field?.type === 'interval' || field?.type === 'box')) {
    return wordFigure(value, field.type === 'interval' ? field.quantity : 'length', units);
  }
  if (field === undefined || typeof value === 'object') return shorten(JSON.stringify(value));
  return wordFact(field, value, units, new Date());
}

/** The labels along a path, as far as fields are known, and the field at its end. */
function locate(
  fields: readonly FactField[],
  path: FactPath,
): { words: readonly string[]; field: FactField | undefined } {
  const [key, ...rest] = path;
  const field = fields.find((each) => each.key === key);
  if (field === undefined) return { words: path.map(String), field: undefined };
  if (rest.length === 0) return { words: [field.label], field };
  const inner = inside(field, rest);
  const label = field.label === '' ? [] : [field.label];
  return { words: [...label, ...inner.words], field: inner.field };
}

function inside(
  field: FactField,
  rest: FactPath,
): { words: readonly string[]; field: FactField | undefined } {
  const [step, ...deeper] = rest;
  if (field.type === 'group') return locate(field.fields, rest);
  if (field.type === 'list') {
    const entry = `${field.entry} ${Number(step) + 1}`;
    if (deeper.length === 0) return { words: [entry], field: undefined };
    const inner = locate(field.fields, deeper);
    return { words: [entry, ...inner.words], field: inner.field };
  }
  if (field.type === 'map') {
    if (deeper.length === 0) return { words: [String(step)], field: field.value };
    const inner = inside(field.value, deeper);
    return { words: [String(step), ...inner.words], field: inner.field };
  }
  if (field.type === 'interval') return { words: [step === 0 ? 'from' : 'to'], field };
  if (field.type === 'box') {
    const axis = String(deeper[0] ?? '').toUpperCase();
    return { words: [`${axis} ${step === 'min' ? 'from' : 'to'}`], field };
  }
  return { words: rest.map(String), field: undefined };
}

function shorten(text: string): string {
  return text.length <= 60 ? text : `${text.slice(0, 57)}…`;
}
