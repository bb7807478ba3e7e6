import type { FormGroup } from '@angular/forms';
import type { Units } from '#contracts';
import type { FactField } from './fact-field';
import type {
  BoxNode,
  FactNode,
  FigureNode,
  FormMaking,
  GroupNode,
  IntervalNode,
  ListNode,
  MapNode,
} from './fact-node';
import { makeEntry, makeGroup, makeMapEntry } from './fact-node';
import { readFigure } from './measure';
import { readMoment } from './moment';

export type FactPath = readonly (string | number)[];
/** One thing that is wrong, where it is, and a sentence about it. */
export interface WrongFact {
  readonly path: FactPath;
  readonly sentence: string;
}
export interface FactForm {
  readonly root: GroupNode;
  readonly control: FormGroup;
  readonly making: FormMaking;
}
export interface FactReading {
  /** What the form says, in the contract's form; wrong figures are left out of it. */
  readonly value: Record<string, unknown>;
  readonly wrong: readonly WrongFact[];
}

/** A form over a value of the contract. `value` may be anything: what does not fit stays empty. */
export function openFactForm(
  fields: readonly FactField[],
  value: unknown,
  units: Units,
  prefix = 'fact',
): FactForm {
  let given = 0;
  const making: FormMaking = { units, nextId: () => `${prefix}-${(given += 1)}` };
  const root = makeGroup({ type: 'group', key: '', label: '', fields }, value, making);
  return { root, control: root.control, making };
}

/** What the form says now. Nothing is changed by reading. */
export function readFactForm(form: FactForm): FactReading {
  const wrong: WrongFact[] = [];
  const value = readChildren(form.root, [], form.making.units, wrong);
  return { value, wrong };
}

export function addEntry(form: FactForm, list: ListNode, value: unknown = list.field.start): void {
  const entry = makeEntry(list.field, value, form.making);
  list.control.push(entry.control);
  list.entries.update((entries) => [...entries, entry]);
  list.control.markAsDirty();
}
export function setEntries(form: FactForm, list: ListNode, values: readonly unknown[]): void {
  const entries = values.map((each) => makeEntry(list.field, each, form.making));
  list.control.clear();
  for (const entry of entries) list.control.push(entry.control);
  list.entries.set(entries);
  list.control.markAsDirty();
}
/** Puts a copy of an entry, as it is typed now, behind it. */
export function copyEntry(form: FactForm, list: ListNode, entry: GroupNode): void {
  const at = list.entries().indexOf(entry);
  const copy = makeEntry(list.field, readChildren(entry, [], form.making.units, []), form.making);
  list.control.insert(at + 1, copy.control);
  list.entries.update((entries) => entries.toSpliced(at + 1, 0, copy));
  list.control.markAsDirty();
}
export function removeEntry(list: ListNode, entry: GroupNode): void {
  const at = list.entries().indexOf(entry);
  list.control.removeAt(at);
  list.entries.update((entries) => entries.toSpliced(at, 1));
  list.control.markAsDirty();
}
export function readEntry(form: FactForm, entry: GroupNode): Record<string, unknown> {
  return readChildren(entry, [], form.making.units, []);
}
export function addMapEntry(form: FactForm, map: MapNode): void {
  const entry = makeMapEntry(map.field, '', map.field.start, form.making);
  map.control.push(entry.control);
  map.entries.update((entries) => [...entries, entry]);
  map.control.markAsDirty();
}
export function removeMapEntry(map: MapNode, id: string): void {
  const at = map.entries().findIndex((each) => each.id === id);
  map.control.removeAt(at);
  map.entries.update((entries) => entries.toSpliced(at, 1));
  map.control.markAsDirty();
}

/** The child of a group by its key; the fields are known at the call, so a miss is our bug. */
export function childOf(group: GroupNode, key: string): FactNode {
  const child = group.children.find((each) => each.field.key === key);
  if (!child) throw new Error(`No field ${key} in ${group.field.label}`);
  return child;
}

function readChildren(
  group: GroupNode,
  path: FactPath,
  units: Units,
  wrong: WrongFact[],
): Record<string, unknown> {
  const value: Record<string, unknown> = {};
  for (const child of group.children) {
    const read = readNode(child, [...path, child.field.key], units, wrong);
    if (read !== undefined) value[child.field.key] = read;
  }
  return value;
}

function readNode(node: FactNode, path: FactPath, units: Units, wrong: WrongFact[]): unknown {
  switch (node.kind) {
    case 'figure':
      return readFigureNode(node, path, units, wrong);
    case 'text': {
      const text = node.control.value.trim();
      return text === '' && node.field.optional ? node.field.absent : text;
    }
    case 'choice':
      if (node.control.value !== '') return node.control.value;
      if (!node.field.optional) wrong.push({ path, sentence: 'Choose one.' });
      return node.field.absent;
    case 'several':
      return [...node.control.value];
    case 'flag':
      return node.control.value;
    case 'moment':
      if (node.control.value === node.shown && node.stored !== undefined) return node.stored;
      return readMoment(node.control.value) ?? node.field.absent;
    case 'interval':
      return readInterval(node, path, units, wrong);
    case 'box':
      return readBox(node, path, units, wrong);
    case 'group':
      if (!node.present.value) return node.field.absent;
      return readChildren(node, path, units, wrong);
    case 'list':
      return node
        .entries()
        .map((each, index) => readChildren(each, [...path, index], units, wrong));
    case 'map':
      return readMap(node, path, units, wrong);
  }
}

function readFigureNode(
  node: FigureNode,
  path: FactPath,
  units: Units,
  wrong: WrongFact[],
): unknown {
  const typed = node.control.value;
  if (typed === node.shown && node.stored !== undefined) return node.stored;
  const letter = typed.trim().toUpperCase();
  if (node.field.orLetter && /^[A-Z]$/.test(letter)) return letter;
  const read = readFigure(typed, node.field.quantity, units);
  if ('stored' in read) return read.stored;
  if ('sentence' in read) {
    wrong.push({ path, sentence: read.sentence });
    return undefined;
  }
  if (!node.field.optional) wrong.push({ path, sentence: 'A figure is needed here.' });
  return node.field.absent;
}

function readInterval(
  node: IntervalNode,
  path: FactPath,
  units: Units,
  wrong: WrongFact[],
): unknown {
  if (!node.present.value) return undefined;
  return node.ends.map((end, index) => readFigureNode(end, [...path, index], units, wrong));
}

function readBox(node: BoxNode, path: FactPath, units: Units, wrong: WrongFact[]): unknown {
  const box: Record<'min' | 'max', Record<string, unknown>> = { min: {}, max: {} };
  for (const { side, axis, node: figure } of node.sides) {
    const read = readFigureNode(figure, [...path, side, axis], units, wrong);
    if (read !== undefined) box[side][axis] = read;
  }
  return box;
}

function readMap(node: MapNode, path: FactPath, units: Units, wrong: WrongFact[]): unknown {
  if (node.field.optional && node.entries().length === 0) return node.field.absent;
  const value: Record<string, unknown> = {};
  for (const entry of node.entries()) {
    const key = entry.key.control.value.trim();
    if (key === '' || key in value) {
      const sentence = key === '' ? 'A name is needed here.' : `${key} stands here twice.`;
      wrong.push({ path: [...path, entry.id], sentence });
      continue;
    }
    const read = readNode(entry.value, [...path, key], units, wrong);
    if (read !== undefined) value[key] = read;
  }
  return value;
}
