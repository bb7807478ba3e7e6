import type { z } from 'zod';
import type { Problem } from './problem';

export type WrongField = NonNullable<Problem['fields']>[number];

type Issue = z.core.$ZodIssue;
type Path = readonly PropertyKey[];

/** Enough to mend a form by; a document with more than this is the wrong document. */
const MOST_FIELDS = 100;

/**
 * One entry a wrong path of `input`: what stands there, what was expected, and an example.
 * Keys that are not known get one entry each, for a misspelt key is the usual reason.
 */
export function wrongFields(issues: readonly Issue[], input: unknown): WrongField[] {
  const seen = new Set<string>();
  const fields: WrongField[] = [];
  for (const field of issues.flatMap((issue) => fieldsOf(issue, [], input))) {
    if (seen.has(field.path)) continue;
    seen.add(field.path);
    fields.push(field);
    if (fields.length === MOST_FIELDS) break;
  }
  return fields;
}

function fieldsOf(issue: Issue, under: Path, input: unknown): WrongField[] {
  const path = [...under, ...issue.path];
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({
      path: spellPath([...path, key]),
      message: `"${key}" is not known here: check its spelling or leave it out.`,
      expected: 'no value of this name',
    }));
  }
  if (issue.code === 'invalid_union') {
    const inner = innerIssues(issue.errors);
    if (inner.length > 0) return inner.flatMap((each) => fieldsOf(each, path, input));
  }
  if (issue.code === 'custom') {
    return [{ path: spellPath(path), message: sentence(issue.message) }];
  }
  if (issue.code === 'invalid_key') {
    const why = issue.issues[0]?.message ?? 'the name cannot be used';
    return [
      { path: spellPath(path), message: sentence(`"${nameOf(path)}" is no name here: ${why}`) },
    ];
  }
  return [plainField(issue, path, input)];
}

function plainField(issue: Issue, path: Path, input: unknown): WrongField {
  const expected = expectation(issue);
  const example = exampleFor(path, issue);
  const found = valueAt(input, path);
  const shown = example === undefined ? '' : `, such as ${JSON.stringify(example)}`;
  const message =
    found === undefined
      ? `${nameOf(path)} is missing: give ${expected}${shown}.`
      : `${nameOf(path)} is ${spell(found, path)}: give ${expected}${shown}.`;
  return {
    path: spellPath(path),
    message,
    expected,
    ...(example === undefined ? {} : { example }),
  };
}

/** The issues inside the one branch of a union that got past its first look at the value. */
function innerIssues(branches: readonly (readonly Issue[])[]): readonly Issue[] {
  const entered = branches.filter((branch) => branch.every((issue) => issue.path.length > 0));
  return entered.length === 1 ? (entered[0] ?? []) : [];
}

const KINDS: Record<string, string> = {
  number: 'a number',
  int: 'a whole number',
  string: 'text',
  boolean: 'true or false',
  array: 'a list',
  tuple: 'a list',
  object: 'a group of values',
  record: 'a group of values',
  null: 'null',
};
const FORMATS: Record<string, string> = {
  email: 'an e-mail address',
  datetime: 'a date and time with its offset from UTC',
  uuid: 'an id as the API gave it',
};

function expectation(issue: Issue): string {
  switch (issue.code) {
    case 'invalid_type':
      return KINDS[issue.expected] ?? issue.expected;
    case 'too_small':
      return bound(issue.origin, issue.inclusive ? 'at least' : 'more than', issue.minimum);
    case 'too_big':
      return bound(issue.origin, issue.inclusive ? 'at most' : 'less than', issue.maximum);
    case 'invalid_format':
      return FORMATS[issue.format] ?? issue.message;
    case 'invalid_value':
      return issue.values.length === 1
        ? JSON.stringify(issue.values[0])
        : `one of ${issue.values.map((value) => JSON.stringify(value)).join(', ')}`;
    case 'invalid_union':
      return issue.errors
        .flatMap((branch) => branch.slice(0, 1))
        .map(expectation)
        .join(' or ');
    default:
      return issue.message;
  }
}

function bound(origin: string, relation: string, limit: number | bigint): string {
  if (origin === 'string') return `${relation} ${limit} characters`;
  if (origin === 'array') return `a list of ${relation} ${limit} entries`;
  return `a number of ${relation} ${limit}`;
}

/** Values a shop would recognise, by the name of the field; mm, rpm and seconds as everywhere. */
const EXAMPLES: Record<string, unknown> = {
  email: 'name@example.com',
  at: '2026-11-30T21:00:00Z',
  asOf: '2026-11-30T21:00:00Z',
  name: '6 mm compression',
  kind: 'compression',
  taper: 'ISO30',
  diameter: 6,
  shank: 6,
  stickOut: 32,
  fluteLength: 22,
  gaugeLength: 78.2,
  maxRpm: 24000,
  minRpm: 6000,
  number: 4,
  tool: 4,
  pocket: 3,
  basedOn: 1,
  travel: { x: [0, 1270], y: [0, 2490], z: [-200, 0] },
  rapid: { x: 30000, y: 30000, z: 15000 },
};
const KIND_EXAMPLES: Record<string, unknown> = { number: 12.5, int: 1, boolean: true };

function exampleFor(path: Path, issue: Issue): unknown {
  if (issue.code === 'invalid_value') return issue.values[0];
  if (issue.code === 'too_small' || issue.code === 'too_big') {
    if (issue.origin !== 'number' && issue.origin !== 'int') return undefined;
  }
  const byName = EXAMPLES[nameOf(path)];
  if (byName !== undefined) return byName;
  return issue.code === 'invalid_type' ? KIND_EXAMPLES[issue.expected] : undefined;
}

/** `["rack","pockets",0,"grip"]` as `rack.pockets[0].grip`; the whole document as `(document)`. */
function spellPath(path: Path): string {
  if (path.length === 0) return '(document)';
  return path
    .map((part, index) => {
      if (typeof part === 'number') return `[${part}]`;
      return index === 0 ? String(part) : `.${String(part)}`;
    })
    .join('');
}

function nameOf(path: Path): string {
  const last = path.findLast((part) => typeof part !== 'number');
  return last === undefined ? 'the document' : String(last);
}

function valueAt(input: unknown, path: Path): unknown {
  let value = input;
  for (const part of path) {
    if (typeof value !== 'object' || value === null) return undefined;
    value = (value as Record<PropertyKey, unknown>)[part];
  }
  return value;
}

/** A refused value as the sentence shows it; a password is never shown, a long one is cut. */
function spell(value: unknown, path: Path): string {
  if (path.some((part) => part === 'password')) return 'not usable';
  if (Array.isArray(value)) return `a list of ${value.length}`;
  if (typeof value === 'object' && value !== null) return 'a group of values';
  if (typeof value === 'number') return String(value);
  const text = JSON.stringify(value) ?? 'not usable';
  return text.length <= 60 ? text : `${text.slice(0, 57)}…"`;
}

function sentence(words: string): string {
  const capital = words.charAt(0).toUpperCase() + words.slice(1);
  return /[.!?]$/.test(capital) ? capital : `${capital}.`;
}
