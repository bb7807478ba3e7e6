import type { Quantity } from './measure';

/**
 * A fact about the shop that a person enters or reads: its key in the contract, its name, and one
 * sentence that says what it means. Lists of these drive both the form and the page that shows the
 * same facts, so the two cannot part.
 */
interface Named {
  readonly key: string;
  readonly label: string;
  /** One sentence under the field: what it is, or where the figure comes from. */
  readonly help?: string;
  /** May be left out; `absent` says which value the contract wants then. */
  readonly optional?: boolean;
  readonly absent?: null;
  /** Whether the heading above says the name already; then it is only spoken. */
  readonly unlabelled?: boolean;
}
export interface FigureField extends Named {
  readonly type: 'figure';
  readonly quantity: Quantity;
  /** Letters that may stand instead of a number (a word of the block that carries it). */
  readonly orLetter?: boolean;
  /** Said in an empty field, where empty has a meaning of its own: "open", "not set". */
  readonly empty?: string;
}
export interface TextField extends Named {
  readonly type: 'text';
  readonly mono?: boolean;
  readonly suggestions?: readonly string[];
}
export interface ChoiceField extends Named {
  readonly type: 'choice';
  readonly choices: readonly Choice[];
}
export interface SeveralField extends Named {
  readonly type: 'several';
  readonly choices: readonly Choice[];
}
export interface Choice {
  readonly value: string;
  readonly label: string;
}
/** Yes or no, each spelt out. */
export interface FlagField extends Named {
  readonly type: 'flag';
  readonly yes: string;
  readonly no: string;
}
export interface MomentField extends Named {
  readonly type: 'moment';
}
/** From … to, stored as a pair. */
export interface IntervalField extends Named {
  readonly type: 'interval';
  /** Beside the box that says it exists: "has its own limits". */
  readonly presence?: string;
  readonly quantity: Quantity;
}
/** A box of which any side may be open. */
export interface BoxField extends Named {
  readonly type: 'box';
}
export interface GroupField extends Named {
  readonly type: 'group';
  readonly fields: readonly FactField[];
  /** Beside the box that says it exists: "it has one". */
  readonly presence?: string;
  /** What an optional group starts from when a person says that it exists. */
  readonly start?: unknown;
  /** Short figures that stand side by side and read as one line (X, Y, Z). */
  readonly inline?: boolean;
}
export interface ListField extends Named {
  readonly type: 'list';
  readonly fields: readonly FactField[];
  /** What one entry is called, lower case: "pocket". */
  readonly entry: string;
  /** The key whose value names an entry in its heading. */
  readonly namedBy?: string;
  readonly start: unknown;
}
/** Entries under keys that a person writes: an offset's name, a parameter's. */
export interface MapField extends Named {
  readonly type: 'map';
  readonly entry: string;
  readonly keyLabel: string;
  readonly keyExample: string;
  readonly value: FactField;
  readonly start: unknown;
}
export type FactField =
  | FigureField
  | TextField
  | ChoiceField
  | SeveralField
  | FlagField
  | MomentField
  | IntervalField
  | BoxField
  | GroupField
  | ListField
  | MapField;

/** Facts that belong under one heading of a page. */
export interface FactSection {
  readonly title: string;
  /** The part of the value whose facts these are, where a form is of several parts. */
  readonly under?: { readonly key: string; readonly label: string };
  readonly help?: string;
  readonly fields: readonly FactField[];
}

/** The fields of a form over sections; sections under the same part are one group of it. */
export function fieldsOf(sections: readonly FactSection[]): readonly FactField[] {
  const parts = new Map<string, { label: string; fields: FactField[] }>();
  const own: FactField[] = [];
  for (const { under, fields } of sections) {
    if (!under) {
      own.push(...fields);
      continue;
    }
    const part = parts.get(under.key) ?? { label: under.label, fields: [] };
    part.fields.push(...fields);
    parts.set(under.key, part);
  }
  const groups = [...parts].map(([key, part]): GroupField => ({ type: 'group', key, ...part }));
  return [...own, ...groups];
}

/** Short ways to write the commonest facts. */
export const length = (key: string, label: string, help?: string): FigureField =>
  figure(key, label, 'length', help);
export function figure(key: string, label: string, quantity: Quantity, help?: string): FigureField {
  return { type: 'figure', key, label, quantity, ...(help === undefined ? {} : { help }) };
}
export function maybe<F extends FactField>(field: F): F {
  return { ...field, optional: true };
}
export function point(key: string, label: string, help?: string): GroupField {
  return {
    type: 'group',
    key,
    label,
    inline: true,
    fields: [length('x', 'X'), length('y', 'Y'), length('z', 'Z')],
    start: { x: 0, y: 0, z: 0 },
    ...(help === undefined ? {} : { help }),
  };
}
export function perAxis(key: string, label: string, quantity: Quantity, help: string): GroupField {
  const axes = ['x', 'y', 'z'] as const;
  return {
    type: 'group',
    key,
    label,
    help,
    inline: true,
    fields: axes.map((axis) => figure(axis, axis.toUpperCase(), quantity)),
  };
}
