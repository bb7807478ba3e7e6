import type { Units } from '#contracts';
import type { FactField } from './fact-field';
import { isRecord, part } from './fact-node';
import { NOT_SAID, wordFact } from './fact-words';

export type FactLine =
  | {
      readonly kind: 'words';
      readonly key: string;
      readonly label: string;
      readonly words: string;
      readonly unsaid: boolean;
      readonly isFigure: boolean;
    }
  | {
      readonly kind: 'group';
      readonly key: string;
      readonly label: string;
      readonly fields: readonly FactField[];
      readonly value: unknown;
    }
  | {
      readonly kind: 'table';
      readonly key: string;
      readonly label: string;
      readonly columns: readonly string[];
      readonly rows: readonly (readonly string[])[];
    };

interface Reader {
  readonly units: Units;
  readonly now: Date;
  readonly leaveOutUnsaid: boolean;
}

/** Facts as lines for reading; a list becomes a table of the columns that any entry fills. */
export function layOutFacts(
  fields: readonly FactField[],
  value: unknown,
  reader: Reader,
): readonly FactLine[] {
  return fields.flatMap((field) => {
    const fact = part(value, field.key);
    if (reader.leaveOutUnsaid && isUnsaid(fact)) return [];
    return [layOut(field, fact, reader)];
  });
}

function layOut(field: FactField, fact: unknown, reader: Reader): FactLine {
  const { key, label } = field;
  if (field.type === 'group' && !field.inline && isRecord(fact)) {
    return { kind: 'group', key, label, fields: field.fields, value: fact };
  }
  if (field.type === 'list') {
    const entries: readonly unknown[] = Array.isArray(fact) ? fact : [];
    return { kind: 'table', key, label, ...tableOf(field.fields, entries, reader) };
  }
  if (field.type === 'map') {
    const entries = Object.entries(isRecord(fact) ? fact : {});
    const rows = entries.map(([name, each]) => [name, wordCell(field.value, each, reader)]);
    return { kind: 'table', key, label, columns: [field.keyLabel, field.value.label], rows };
  }
  const words = wordFact(field, fact, reader.units, reader.now);
  const isFigure = field.type === 'figure' || field.type === 'interval' || field.type === 'box';
  return { kind: 'words', key, label, words, unsaid: words === NOT_SAID, isFigure };
}

function tableOf(
  fields: readonly FactField[],
  entries: readonly unknown[],
  reader: Reader,
): { columns: readonly string[]; rows: readonly (readonly string[])[] } {
  const used = fields.filter((field) => entries.some((each) => !isUnsaid(part(each, field.key))));
  return {
    columns: used.map((field) => field.label),
    rows: entries.map((each) =>
      used.map((field) => wordCell(field, part(each, field.key), reader)),
    ),
  };
}

function wordCell(field: FactField, fact: unknown, reader: Reader): string {
  if (isUnsaid(fact)) return '–';
  if (field.type === 'map') {
    const pairs = Object.entries(isRecord(fact) ? fact : {});
    return pairs.map(([key, each]) => `${key} = ${String(each)}`).join(', ');
  }
  if (field.type === 'list') {
    const entries: readonly unknown[] = Array.isArray(fact) ? fact : [];
    return entries
      .map((each) => field.fields.map((inner) => wordCell(inner, part(each, inner.key), reader)))
      .map((cells) => cells.join(' × '))
      .join(', ');
  }
  return wordFact(field, fact, reader.units, reader.now);
}

function isUnsaid(fact: unknown): boolean {
  return fact === undefined || fact === null || fact === '';
}
