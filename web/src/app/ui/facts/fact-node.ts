import type { WritableSignal } from '@angular/core';
import { signal } from '@angular/core';
import type { AbstractControl } from '@angular/forms';
import { FormArray, FormControl, FormGroup } from '@angular/forms';
import type { Units } from '#contracts';
import type {
  BoxField,
  ChoiceField,
  FactField,
  FigureField,
  FlagField,
  GroupField,
  IntervalField,
  ListField,
  MapField,
  MomentField,
  SeveralField,
  TextField,
} from './fact-field';
import { figure } from './fact-field';
import { showFigure } from './measure';
import { showMoment } from './moment';

/**
 * The form of one fact: its control, and beside it what the control was filled from. A figure that
 * nobody touched reads back as the very number that was stored, not as its rounding on the screen.
 */
interface Common {
  readonly id: string;
  /** Why this fact cannot be kept as typed, in a sentence; null: nothing known against it. */
  readonly wrong: WritableSignal<string | null>;
}
export interface FigureNode extends Common {
  readonly kind: 'figure';
  readonly field: FigureField;
  readonly control: FormControl<string>;
  readonly shown: string;
  readonly stored: number | undefined;
}
export interface MomentNode extends Common {
  readonly kind: 'moment';
  readonly field: MomentField;
  readonly control: FormControl<string>;
  readonly shown: string;
  readonly stored: string | undefined;
}
export interface TextNode extends Common {
  readonly kind: 'text';
  readonly field: TextField;
  readonly control: FormControl<string>;
}
export interface ChoiceNode extends Common {
  readonly kind: 'choice';
  readonly field: ChoiceField;
  readonly control: FormControl<string>;
}
export interface SeveralNode extends Common {
  readonly kind: 'several';
  readonly field: SeveralField;
  readonly control: FormControl<readonly string[]>;
}
export interface FlagNode extends Common {
  readonly kind: 'flag';
  readonly field: FlagField;
  readonly control: FormControl<boolean>;
}
export interface IntervalNode extends Common {
  readonly kind: 'interval';
  readonly field: IntervalField;
  readonly control: FormGroup;
  readonly present: FormControl<boolean>;
  readonly ends: readonly [FigureNode, FigureNode];
}
export interface BoxNode extends Common {
  readonly kind: 'box';
  readonly field: BoxField;
  readonly control: FormGroup;
  readonly sides: readonly {
    readonly side: 'min' | 'max';
    readonly axis: 'x' | 'y' | 'z';
    readonly node: FigureNode;
  }[];
}
export interface GroupNode extends Common {
  readonly kind: 'group';
  readonly field: GroupField;
  readonly control: FormGroup;
  /** Whether the shop has this at all; always true where it is not optional. */
  readonly present: FormControl<boolean>;
  readonly children: readonly FactNode[];
}
export interface ListNode extends Common {
  readonly kind: 'list';
  readonly field: ListField;
  readonly control: FormArray;
  readonly entries: WritableSignal<readonly GroupNode[]>;
}
export interface MapEntry {
  readonly id: string;
  readonly key: TextNode;
  readonly value: FactNode;
  readonly control: FormGroup;
  readonly matcher: { isErrorState: () => boolean };
}
export interface MapNode extends Common {
  readonly kind: 'map';
  readonly field: MapField;
  readonly control: FormArray;
  readonly entries: WritableSignal<readonly MapEntry[]>;
}
export type FactNode =
  | FigureNode
  | MomentNode
  | TextNode
  | ChoiceNode
  | SeveralNode
  | FlagNode
  | IntervalNode
  | BoxNode
  | GroupNode
  | ListNode
  | MapNode;

/** What every node of one form shares: the person's unit, and ids that no two fields share. */
export interface FormMaking {
  readonly units: Units;
  readonly nextId: () => string;
}

export function makeNode(field: FactField, value: unknown, making: FormMaking): FactNode {
  switch (field.type) {
    case 'figure':
      return makeFigure(field, value, making);
    case 'text':
      return { ...common(making), kind: 'text', field, control: textControl(value) };
    case 'choice':
      return { ...common(making), kind: 'choice', field, control: textControl(value) };
    case 'several':
      return makeSeveral(field, value, making);
    case 'flag':
      return { ...common(making), kind: 'flag', field, control: flagControl(value === true) };
    case 'moment':
      return makeMoment(field, value, making);
    case 'interval':
      return makeInterval(field, value, making);
    case 'box':
      return makeBox(field, value, making);
    case 'group':
      return makeGroup(field, value, making);
    case 'list':
      return makeList(field, value, making);
    case 'map':
      return makeMap(field, value, making);
  }
}

export function makeGroup(field: GroupField, value: unknown, making: FormMaking): GroupNode {
  const isThere = isRecord(value);
  const filledFrom = isThere ? value : field.start;
  const children = field.fields.map((child) =>
    makeNode(child, part(filledFrom, child.key), making),
  );
  const present = flagControl(isThere || field.optional !== true);
  const control = new FormGroup<Record<string, AbstractControl>>({ ' present': present });
  for (const child of children) control.addControl(child.field.key, child.control);
  return { ...common(making), kind: 'group', field, control, present, children };
}

export function makeEntry(field: ListField, value: unknown, making: FormMaking): GroupNode {
  return makeGroup(
    { type: 'group', key: '', label: field.entry, fields: field.fields },
    value,
    making,
  );
}

export function makeMapEntry(
  field: MapField,
  key: string,
  value: unknown,
  making: FormMaking,
): MapEntry {
  const keyField: TextField = { type: 'text', key: '', label: field.keyLabel, mono: true };
  const keyNode: TextNode = {
    ...common(making),
    kind: 'text',
    field: keyField,
    control: textControl(key),
  };
  const valueNode = makeNode(field.value, value, making);
  const control = new FormGroup({ key: keyNode.control, value: valueNode.control });
  const matcher = { isErrorState: () => keyNode.wrong() !== null };
  return { id: making.nextId(), key: keyNode, value: valueNode, control, matcher };
}

function makeFigure(field: FigureField, value: unknown, making: FormMaking): FigureNode {
  const stored = typeof value === 'number' ? value : undefined;
  const letter = typeof value === 'string' ? value : '';
  const shown = stored === undefined ? letter : showFigure(stored, field.quantity, making.units);
  const control = textControl(shown);
  return { ...common(making), kind: 'figure', field, control, shown, stored };
}

function makeSeveral(field: SeveralField, value: unknown, making: FormMaking): SeveralNode {
  const chosen = Array.isArray(value) ? value.map(String) : [];
  const control = new FormControl<readonly string[]>(chosen, { nonNullable: true });
  return { ...common(making), kind: 'several', field, control };
}

function makeMoment(field: MomentField, value: unknown, making: FormMaking): MomentNode {
  const stored = typeof value === 'string' ? value : undefined;
  const shown = stored === undefined ? '' : showMoment(stored);
  return { ...common(making), kind: 'moment', field, control: textControl(shown), shown, stored };
}

function makeInterval(field: IntervalField, value: unknown, making: FormMaking): IntervalNode {
  const pair: readonly unknown[] = Array.isArray(value) ? value : [];
  const end = (key: string, label: string, at: unknown) =>
    makeFigure(figure(key, label, field.quantity), at, making);
  const ends = [end('0', 'from', pair[0]), end('1', 'to', pair[1])] as const;
  const present = flagControl(pair.length > 0 || field.optional !== true);
  const control = new FormGroup({ present, from: ends[0].control, to: ends[1].control });
  return { ...common(making), kind: 'interval', field, control, present, ends };
}

function makeBox(field: BoxField, value: unknown, making: FormMaking): BoxNode {
  const control = new FormGroup<Record<string, AbstractControl>>({});
  const sides = (['min', 'max'] as const).flatMap((side) =>
    (['x', 'y', 'z'] as const).map((axis) => {
      const label = `${axis.toUpperCase()} ${side === 'min' ? 'from' : 'to'}`;
      const sideField: FigureField = {
        ...figure(axis, label, 'length'),
        optional: true,
        empty: 'open',
      };
      const node = makeFigure(sideField, part(part(value, side), axis), making);
      control.addControl(`${side} ${axis}`, node.control);
      return { side, axis, node };
    }),
  );
  return { ...common(making), kind: 'box', field, control, sides };
}

function makeList(field: ListField, value: unknown, making: FormMaking): ListNode {
  const entries = Array.isArray(value) ? value.map((each) => makeEntry(field, each, making)) : [];
  const control = new FormArray<AbstractControl>(entries.map((each) => each.control));
  return { ...common(making), kind: 'list', field, control, entries: signal(entries) };
}

function makeMap(field: MapField, value: unknown, making: FormMaking): MapNode {
  const pairs = isRecord(value) ? Object.entries(value) : [];
  const entries = pairs.map(([key, each]) => makeMapEntry(field, key, each, making));
  const control = new FormArray<AbstractControl>(entries.map((each) => each.control));
  return { ...common(making), kind: 'map', field, control, entries: signal(entries) };
}

function common(making: FormMaking): Common {
  return { id: making.nextId(), wrong: signal<string | null>(null) };
}

function textControl(value: unknown): FormControl<string> {
  const text = typeof value === 'string' || typeof value === 'number' ? String(value) : '';
  return new FormControl(text, { nonNullable: true });
}

function flagControl(value: boolean): FormControl<boolean> {
  return new FormControl(value, { nonNullable: true });
}

export function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

export function part(value: unknown, key: string): unknown {
  return isRecord(value) ? value[key] : undefined;
}
