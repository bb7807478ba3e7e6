import { z } from 'zod';
import type { FactField } from './fact-field';
import { figure, length, maybe, point } from './fact-field';
import {
  addEntry,
  addMapEntry,
  childOf,
  copyEntry,
  openFactForm,
  readFactForm,
  removeEntry,
  setEntries,
} from './fact-form';
import type { FactForm } from './fact-form';
import type { FactNode } from './fact-node';
import { joinWrong, markWrong, wordIssues, writePath } from './wrong-facts';

const FIELDS: readonly FactField[] = [
  { type: 'text', key: 'name', label: 'Name' },
  length('width', 'Width'),
  maybe(length('depth', 'Depth')),
  { type: 'interval', key: 'travel', label: 'Travel', quantity: 'length', optional: true },
  { ...maybe(point('start', 'Start')), absent: null },
  { type: 'box', key: 'box', label: 'Box' },
  { type: 'flag', key: 'waits', label: 'Waits', yes: 'yes', no: 'no' },
  {
    type: 'list',
    key: 'steps',
    label: 'Steps',
    entry: 'step',
    fields: [length('length', 'Length')],
    start: { length: 10 },
  },
  {
    type: 'map',
    key: 'parameters',
    label: 'Parameters',
    entry: 'parameter',
    keyLabel: 'Parameter',
    keyExample: '#500',
    value: figure('value', 'Value', 'plain'),
    start: 0,
  },
];
const VALUE = {
  name: 'North',
  width: 92.4,
  travel: [0, 1300],
  start: { x: 0, y: 10, z: 0 },
  box: { min: { x: -60, z: 0 }, max: { x: 60 } },
  waits: true,
  steps: [{ length: 12 }, { length: 40.4 }],
  parameters: { '#500': 4 },
};

function type(form: FactForm, key: string, text: string): void {
  typeInto(childOf(form.root, key), text);
}
function typeInto(node: FactNode, text: string): void {
  if (node.kind !== 'figure' && node.kind !== 'text') throw new Error('This is no typed field');
  node.control.setValue(text);
}
function list(form: FactForm, key: string) {
  const node = childOf(form.root, key);
  if (node.kind !== 'list') throw new Error(`${key} is no list`);
  return node;
}

describe('a form over facts', () => {
  it.each(['mm', 'inch'] as const)(
    'gives back untouched what it was opened with, in %s',
    (units) => {
      // 92.4 mm is no round figure in inches: read off the screen it would come back as 92.39999.
      expect(readFactForm(openFactForm(FIELDS, VALUE, units))).toEqual({ value: VALUE, wrong: [] });
    },
  );

  it('stores millimetres of what is typed in inches', () => {
    const form = openFactForm(FIELDS, VALUE, 'inch');
    type(form, 'width', '3/8');
    expect(readFactForm(form).value['width']).toBe(9.525);
  });

  it('leaves out what is optional and empty, and writes null where the contract wants it', () => {
    const form = openFactForm(FIELDS, { ...VALUE, depth: 5 }, 'mm');
    type(form, 'depth', '');
    const start = childOf(form.root, 'start');
    if (start.kind === 'group') start.present.setValue(false);
    const { value } = readFactForm(form);
    expect('depth' in value).toBe(false);
    expect(value['start']).toBeNull();
  });

  it('names what is missing or no number, and keeps what was typed', () => {
    const form = openFactForm(FIELDS, VALUE, 'mm');
    type(form, 'width', 'wide');
    const { wrong } = readFactForm(form);
    expect(wrong).toEqual([{ path: ['width'], sentence: '“wide” is not a number.' }]);
    const marked = markWrong(form, wrong);
    expect(marked[0]?.place).toBe('Width');
    expect(childOf(form.root, 'width').wrong()).toBe('“wide” is not a number.');
    expect(childOf(form.root, 'width').control.value).toBe('wide');
  });

  it('adds, copies as typed, removes and replaces entries of a list', () => {
    const form = openFactForm(FIELDS, VALUE, 'mm');
    const steps = list(form, 'steps');
    addEntry(form, steps);
    const first = steps.entries()[0]!;
    typeInto(first.children[0]!, '13');
    copyEntry(form, steps, first);
    expect(readFactForm(form).value['steps']).toEqual([
      { length: 13 },
      { length: 13 },
      { length: 40.4 },
      { length: 10 },
    ]);
    removeEntry(steps, steps.entries()[2]!);
    expect(readFactForm(form).value['steps']).toHaveLength(3);
    setEntries(form, steps, [{ length: 1 }]);
    expect(readFactForm(form).value['steps']).toEqual([{ length: 1 }]);
    expect(steps.control.length).toBe(1);
  });

  it('refuses a nameless or a double entry of a map', () => {
    const form = openFactForm(FIELDS, VALUE, 'mm');
    const map = childOf(form.root, 'parameters');
    if (map.kind !== 'map') throw new Error('no map');
    addMapEntry(form, map);
    expect(readFactForm(form).wrong[0]?.sentence).toBe('A name is needed here.');
    map.entries()[1]!.key.control.setValue('#500');
    const { wrong, value } = readFactForm(form);
    expect(wrong[0]?.sentence).toBe('#500 stands here twice.');
    expect(value['parameters']).toEqual({ '#500': 4 });
    expect(markWrong(form, wrong)[0]?.place).toBe('Parameters, Parameter');
  });
});

describe('what a schema refused', () => {
  const schema = z.strictObject({
    name: z.string().min(1),
    width: z.number().positive(),
    travel: z
      .tuple([z.number(), z.number()])
      .refine(([from, to]) => from <= to, { message: 'the first must not exceed the second' }),
    steps: z.array(z.strictObject({ length: z.number().positive() })),
    kind: z.enum(['fork', 'cup']),
  });
  function refused(value: unknown) {
    const result = schema.safeParse(value);
    return result.success ? [] : wordIssues(result.error.issues);
  }

  it('is said as path and sentence', () => {
    const wrong = refused({
      name: '',
      width: -1,
      travel: [5, 1],
      steps: [{ length: 'x' }],
      kind: 'box',
      more: 1,
    });
    expect(wrong.map(({ path, sentence }) => `${writePath(path)}: ${sentence}`)).toEqual([
      'name: Something must be written here.',
      'width: Must be greater than 0.',
      'travel: The first must not exceed the second.',
      'steps[0].length: A number is expected here.',
      'kind: Must be one of: fork, cup.',
      ': Not known here: more. Check the spelling, or take it out.',
    ]);
    expect(refused({})[1]?.sentence).toBe('This is missing; a number is expected.');
  });

  it('is marked at the deepest field of its path, told in the form’s order, and wiped by the next marking', () => {
    const form = openFactForm(FIELDS, VALUE, 'mm');
    const marked = markWrong(form, [
      { path: ['steps', 1, 'length'], sentence: 'Must be greater than 0.' },
      { path: ['travel', 1], sentence: 'A number is expected here.' },
      { path: ['box', 'max', 'x'], sentence: 'Too far.' },
      { path: ['nowhere'], sentence: 'Lost.' },
    ]);
    expect(marked.map((each) => each.place)).toEqual([
      'Travel, to',
      'Box, X to',
      'Steps, step 2, Length',
      'nowhere',
    ]);
    expect(marked[3]?.fieldId).toBeUndefined();
    const step = list(form, 'steps').entries()[1]!.children[0]!;
    expect(step.wrong()).toBe('Must be greater than 0.');
    markWrong(form, []);
    expect(step.wrong()).toBeNull();
  });

  it('does not repeat what the typed text already showed to be wrong', () => {
    const typed = [{ path: ['width'], sentence: '“wide” is not a number.' }];
    const schemaSays = [
      { path: ['width'], sentence: 'This is missing; a number is expected.' },
      { path: ['name'], sentence: 'Something must be written here.' },
    ];
    expect(joinWrong(typed, schemaSays).map((each) => each.path)).toEqual([['width'], ['name']]);
  });
});
