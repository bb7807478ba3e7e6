import type { z } from 'zod';
import type { FactForm, FactPath, WrongFact } from './fact-form';
import type { FactNode, GroupNode } from './fact-node';

/** A wrong fact with the words that name its place, and the field to go to. */
export interface MarkedFact extends WrongFact {
  /** "Travel, X, to" */
  readonly place: string;
  /** The id of the field that takes the focus; undefined when no field stands for the path. */
  readonly fieldId: string | undefined;
}

/** Sentences for what a contract's schema refused. `path` is kept as the contract writes it. */
export function wordIssues(issues: readonly z.core.$ZodIssue[]): WrongFact[] {
  return issues.map((issue) => ({
    path: issue.path.map((step) => (typeof step === 'number' ? step : String(step))),
    sentence: wordIssue(issue),
  }));
}

/** Faults found in the typed text hide what the schema says about the very same place. */
export function joinWrong(
  typed: readonly WrongFact[],
  refused: readonly WrongFact[],
): readonly WrongFact[] {
  const known = new Set(typed.map(({ path }) => writePath(path)));
  const more = refused.filter(({ path }) => {
    const steps = path.map((_step, index) => writePath(path.slice(0, index + 1)));
    return !steps.some((each) => known.has(each));
  });
  return [...typed, ...more];
}

/** Marks each wrong field, wipes older marks and says where each is. Nothing typed is touched. */
export function markWrong(form: FactForm, wrong: readonly WrongFact[]): readonly MarkedFact[] {
  clear(form.root);
  const marked = wrong.map((fact) => {
    const { node, place } = find(form.root, fact.path);
    if (node) {
      node.wrong.update((known) => (known === null ? fact.sentence : `${known} ${fact.sentence}`));
      node.control.markAsTouched();
    }
    return { ...fact, place, fieldId: node?.id };
  });
  return marked.sort((one, other) => orderOf(one) - orderOf(other));
}

/** Fields are numbered as they are made, which is the order they stand in. */
function orderOf({ fieldId }: MarkedFact): number {
  return Number(fieldId?.split('-').at(-1) ?? Infinity);
}

/**
 * Wrong fields as the server names them: under the part that was sent (`machine.travel.x[1]`), which
 * the form, being of that part alone, does not know.
 */
export function wordProblemFields(
  form: FactForm,
  fields: readonly { readonly path: string; readonly message: string }[],
): readonly WrongFact[] {
  const known = new Set(form.root.children.map((child) => child.field.key));
  return fields.map(({ path, message }) => {
    const steps = splitPath(path);
    const isKnown = known.has(String(steps[0]));
    return { path: isKnown ? steps : steps.slice(1), sentence: message };
  });
}

function splitPath(path: string): FactPath {
  const steps = path.split(/[.[\]]+/).filter((step) => step !== '');
  return steps.map((step) => (/^\d+$/.test(step) ? Number(step) : step));
}

/** The path as setup files and messages write it: `machine.travel.x[1]`. */
export function writePath(path: FactPath): string {
  return path.reduce<string>((written, step) => {
    if (typeof step === 'number') return `${written}[${step}]`;
    return written === '' ? step : `${written}.${step}`;
  }, '');
}

function wordIssue(issue: z.core.$ZodIssue): string {
  switch (issue.code) {
    case 'invalid_type':
      return issue.message.endsWith('received undefined')
        ? `This is missing; ${aKind(issue.expected)} is expected.`
        : `${capital(aKind(issue.expected))} is expected here.`;
    case 'too_small':
      return issue.origin === 'number' || issue.origin === 'int'
        ? `Must be ${issue.inclusive ? 'at least' : 'greater than'} ${issue.minimum}.`
        : issue.origin === 'string'
          ? 'Something must be written here.'
          : `At least ${issue.minimum} needed.`;
    case 'too_big':
      return issue.origin === 'string'
        ? `At most ${issue.maximum} characters fit.`
        : `Must be at most ${issue.maximum}.`;
    case 'invalid_value':
      return `Must be one of: ${issue.values.map(String).join(', ')}.`;
    case 'unrecognized_keys':
      return `Not known here: ${issue.keys.join(', ')}. Check the spelling, or take it out.`;
    case 'invalid_format':
      return issue.format === 'datetime'
        ? 'A date and time is expected, like 2026-11-30T18:00:00Z.'
        : sentence(issue.message);
    default:
      return sentence(issue.message);
  }
}

const KINDS: Readonly<Record<string, string>> = {
  number: 'a number',
  int: 'a whole number',
  string: 'a text',
  boolean: 'true or false',
  object: 'a group of values in { }',
  array: 'a list in [ ]',
  tuple: 'a pair of numbers',
  record: 'a group of values in { }',
  null: 'null',
};
const aKind = (expected: string) => KINDS[expected] ?? expected;
const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
const sentence = (text: string) => (text.endsWith('.') ? capital(text) : `${capital(text)}.`);

function clear(node: FactNode): void {
  node.wrong.set(null);
  for (const child of childrenOf(node)) clear(child.node);
}

/** The deepest field that stands for the path, and the words that lead to it. */
function find(root: GroupNode, path: FactPath): { node: FactNode | undefined; place: string } {
  let node: FactNode = root;
  const words: string[] = [];
  let index = 0;
  while (index < path.length) {
    const rest = path.slice(index);
    const next: Child | undefined = childrenOf(node).find(({ steps }) =>
      steps.every((each, at) => each === rest[at]),
    );
    if (!next) break;
    node = next.node;
    words.push(next.words);
    index += next.steps.length;
  }
  return node === root
    ? { node: undefined, place: writePath(path) }
    : { node, place: words.filter((each) => each !== '').join(', ') };
}

interface Child {
  readonly steps: FactPath;
  readonly words: string;
  readonly node: FactNode;
}
function childrenOf(node: FactNode): readonly Child[] {
  switch (node.kind) {
    case 'group':
      return node.children.map((each) => ({
        steps: [each.field.key],
        words: each.field.label,
        node: each,
      }));
    case 'interval':
      return node.ends.map((each, index) => ({
        steps: [index],
        words: each.field.label,
        node: each,
      }));
    case 'box':
      return node.sides.map((each) => ({
        steps: [each.side, each.axis],
        words: each.node.field.label,
        node: each.node,
      }));
    case 'list':
      return node.entries().map((each, index) => ({
        steps: [index],
        words: `${node.field.entry} ${index + 1}`,
        node: each,
      }));
    case 'map':
      return node.entries().flatMap((each) => [
        { steps: [each.id], words: node.field.keyLabel, node: each.key },
        { steps: [each.key.control.value.trim()], words: each.key.control.value, node: each.value },
      ]);
    default:
      return [];
  }
}
