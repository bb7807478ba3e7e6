import type { FactPath } from './fact-form';
import { isRecord } from './fact-node';

/** One value that differs. `undefined` stands for "was not there". */
export interface Difference {
  readonly path: FactPath;
  readonly was: unknown;
  readonly is: unknown;
}

/**
 * What differs between two values of a contract, leaf by leaf. Lists of the same length are compared
 * entry by entry, others as a whole: which entry moved where cannot be told.
 */
export function differencesOf(was: unknown, is: unknown, path: FactPath = []): Difference[] {
  if (isRecord(was) && isRecord(is)) {
    const keys = [...new Set([...Object.keys(was), ...Object.keys(is)])];
    return keys.flatMap((key) => differencesOf(was[key], is[key], [...path, key]));
  }
  if (Array.isArray(was) && Array.isArray(is) && was.length === is.length) {
    return was.flatMap((each, index) => differencesOf(each, is[index], [...path, index]));
  }
  return isSame(was, is) ? [] : [{ path, was, is }];
}

export function isSame(one: unknown, other: unknown): boolean {
  if (Object.is(one, other)) return true;
  if (Array.isArray(one) && Array.isArray(other)) {
    return one.length === other.length && one.every((each, index) => isSame(each, other[index]));
  }
  if (!isRecord(one) || !isRecord(other)) return false;
  const keys = new Set([...Object.keys(one), ...Object.keys(other)]);
  return [...keys].every((key) => isSame(one[key], other[key]));
}

export interface Rebased {
  /** Theirs with my changes on top. */
  readonly value: unknown;
  /** Places that both changed, differently; mine stand in `value`. */
  readonly clashes: readonly { readonly path: FactPath; readonly theirs: unknown }[];
}

/**
 * Puts my changes since `base` onto what another saved meanwhile. Where the other made a list longer
 * or shorter, entries cannot be matched: my whole list stands, and is named as a clash.
 */
export function rebase(base: unknown, mine: unknown, theirs: unknown): Rebased {
  const changed = new Map<string, FactPath>();
  for (const { path } of differencesOf(base, mine)) {
    const settable = path.slice(0, lengthThatMatches(base, theirs, path));
    changed.set(JSON.stringify(settable), settable);
  }
  const paths = [...changed.values()];
  const value = paths.reduce((onto, path) => setAt(onto, path, valueAt(mine, path)), theirs);
  const clashes = paths.flatMap((path) => {
    const there = valueAt(theirs, path);
    const isMineAlone = isSame(there, valueAt(base, path)) || isSame(there, valueAt(mine, path));
    return isMineAlone ? [] : [{ path, theirs: there }];
  });
  return { value, clashes };
}

/** How far along the path lists of both sides still have the same length. */
function lengthThatMatches(base: unknown, theirs: unknown, path: FactPath): number {
  for (let steps = 0; steps < path.length; steps += 1) {
    const before = valueAt(base, path.slice(0, steps));
    const now = valueAt(theirs, path.slice(0, steps));
    if (Array.isArray(before) && !(Array.isArray(now) && now.length === before.length)) {
      return steps;
    }
  }
  return path.length;
}

export function valueAt(value: unknown, path: FactPath): unknown {
  return path.reduce<unknown>((at, step) => {
    if (Array.isArray(at)) return typeof step === 'number' ? (at as unknown[])[step] : undefined;
    return isRecord(at) ? at[String(step)] : undefined;
  }, value);
}

function setAt(value: unknown, path: FactPath, is: unknown): unknown {
  const [step, ...rest] = path;
  if (step === undefined) return is;
  if (typeof step === 'number' && Array.isArray(value)) {
    return (value as unknown[]).map((each, index) =>
      index === step ? setAt(each, rest, is) : each,
    );
  }
  const onto: Record<string, unknown> = isRecord(value) ? { ...value } : {};
  const put = setAt(onto[String(step)], rest, is);
  if (put !== undefined) return { ...onto, [String(step)]: put };
  return Object.fromEntries(Object.entries(onto).filter(([key]) => key !== String(step)));
}
