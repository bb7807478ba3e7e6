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
      readonly unlabelled: boolean;
      readonly fields: readonly FactField[];
      readonly value: unknown;
    }
  | {
      readonly kind: 'table';
      readonly key: string;
      readonly label: string;
      readonly unlabelled: boolean;
      readonly columns: readonly Column[];
      readonly rows: readonly (readonly string[])[];
    };

interface Column {
  readonly label: string;
  readonly isFigure: boolean;
}
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
  const { key, label, unlabelled = false } = field;
  if (field.type === 'group' && !field.inline && isRecord(fact)) {
    return { kind: 'group', key, label, unlabelled, fields: field.fields, value: fact };
  }
  if (field.type === 'list') {
    const entries: readonly unknown[] = Array.isArray(fact) ? fact : [];
    return { kind: 'table', key, label, unlabelled, ...tableOf(field.fields, entries, reader) };
  }
  if (field.type === 'map') {
    const entries = Object.entries(isRecord(fact) ? fact : {});
    const rows = entries.map(([name, each]) => [name, wordCell(field.value, each, reader)]);
    const columns = [
      { label: field.keyLabel, isFigure: true },
      { label: field.value.label, isFigure: true },
    ];
    return { kind: 'table', key, label, unlabelled, columns, rows };
  }
  const words = wordFact(field, fact, reader.units, reader.now);
  const unsaid = words === NOT_SAID;
  return { kind: 'words', key, label, words, unsaid, isFigure: isOfFigures(field) };
}

function tableOf(
  fields: readonly FactField[],
  entries: readonly unknown[],
  reader: Reader,
): { columns: readonly Column[]; rows: readonly (readonly string[])[] } {
  const used = fields.filter((field) => entries.some((each) => !isUnsaid(part(each, field.key))));
  return {
    columns: used.map((field) => ({ label: field.label, isFigure: isOfFigures(field) })),
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

function isOfFigures(field: FactField): boolean {
  if (field.type === 'group') return field.inline === true;
  return ['figure', 'interval', 'box', 'map'].includes(field.type);
}

function isUnsaid(fact: unknown): boolean {
  return fact === undefined || fact === null || fact === '';
}
