import { describe, expect, test } from 'vitest';
import type { Grammar } from '../expressions/grammar';
import type { Value } from '../expressions/value';
import { parameterKey, type ParameterKey } from './parameter-name';
import { ParameterStore, type LiveParameter } from './parameter-store';

const PUBLISHED: Grammar = { isMacro: false, isStrict: false };
const MACRO: Grammar = { isMacro: true, isStrict: false };

const open = (
  grammar: Grammar,
  stated: Readonly<Record<string, number>> = {},
  live: ReadonlyMap<ParameterKey, LiveParameter> = new Map(),
) =>
  new ParameterStore(
    grammar,
    live,
    new Map(Object.entries(stated).map(([name, value]) => [parameterKey(name), value])),
  );

const unknown = (of: string) => ({ least: -Infinity, greatest: Infinity, of });

describe('in the published language', () => {
  test('a parameter holds what it was set to', () => {
    const store = open(PUBLISHED);
    expect(store.set(100, 7)).toBe(undefined);
    expect(store.read(100)).toBe(7);
  });

  test('1 … 5399 exist and no others (facts sheet 10.4), but those the setup states', () => {
    const store = open({ isMacro: false, isStrict: true }, { '#5400': 3 });
    expect(store.read(0)).toMatchObject({ reason: 'parameter-number' });
    expect(store.set(0, 1)).toMatchObject({ reason: 'parameter-number' });
    expect(store.read(5399)).toEqual(unknown('#5399'));
    expect(store.read(5400)).toBe(3);
    expect(store.set(5401, 1)).toEqual({ reason: 'parameter-number', what: '#5401' });
  });

  test('if not strict, numbers above are the controller’s own: not known, and not followed when set', () => {
    const store = open(PUBLISHED);
    expect(store.read(5420)).toEqual(unknown('#5420'));
    expect(store.set(5420, 1)).toEqual({ reason: 'system', what: '#5420' });
    expect(store.read(100_000)).toMatchObject({ reason: 'parameter-number' });
  });

  test('one that nobody set or stated is not known, because all are kept between runs (4.3)', () => {
    const store = open(PUBLISHED, { '#7': 2 });
    expect(store.read(8)).toEqual(unknown('#8'));
    expect(store.read(7)).toBe(2);
  });

  test('names are local, or global with an underscore (12.2.4)', () => {
    const store = open(PUBLISHED, { '#<Clear_Z>': 5 });
    expect(store.readNamed('depth')).toEqual({ reason: 'never-set', what: '#<depth>' });
    expect(store.readNamed('_feed')).toEqual(unknown('#<_feed>'));
    expect(store.readNamed('clear_z')).toBe(5);
    store.set('depth', 3);
    store.set('_feed', 250);
    store.enterSubroutine([]);
    expect(store.exists('depth')).toBe(false);
    expect(store.readNamed('_feed')).toBe(250);
    store.leave();
    expect(store.readNamed('depth')).toBe(3);
  });

  test('a subroutine has #1 … #30 of its own, filled from the call, else the caller’s (12.2.2)', () => {
    const store = open(PUBLISHED);
    store.set(1, 10);
    store.set(2, 20);
    store.set(31, 30);
    store.enterSubroutine([99]);
    expect([store.read(1), store.read(2)]).toEqual([99, 20]);
    store.set(2, 0);
    store.set(31, 31);
    store.leave();
    expect([store.read(1), store.read(2), store.read(31)]).toEqual([10, 20, 31]);
  });
});

describe('in a macro dialect (facts sheet 12.1.1)', () => {
  test('locals are null until they are set, and #0 always', () => {
    const store = open(MACRO);
    expect([store.read(0), store.read(33)]).toEqual([null, null]);
    expect(store.set(0, 1)).toMatchObject({ reason: 'read-only' });
    expect(store.read(34)).toMatchObject({ reason: 'parameter-number' });
  });

  test('common variables and the controller’s own are not known unless stated', () => {
    const store = open(MACRO, { '#1001': 4 });
    expect(store.read(100)).toEqual(unknown('#100'));
    expect(store.read(1000)).toEqual(unknown('#1000'));
    expect(store.read(1001)).toBe(4);
    expect(store.set(1001, 5)).toBe(undefined);
    expect(store.set(1002, 5)).toMatchObject({ reason: 'system' });
  });

  test('a macro call has locals of its own, those not given null; common ones are shared', () => {
    const store = open(MACRO);
    store.set(1, 10);
    store.set(500, 1);
    store.enterMacro(new Map<number, Value>([[2, 20]]));
    expect([store.read(1), store.read(2)]).toEqual([null, 20]);
    store.set(500, 2);
    store.leave();
    expect([store.read(1), store.read(2), store.read(500)]).toEqual([10, null, 2]);
  });
});

test('live parameters are asked each time, and take what they can', () => {
  let worth = 1;
  const live = new Map<ParameterKey, LiveParameter>([
    [5220, { read: () => worth }],
    [5221, { read: () => worth, write: (value) => (value === 9 ? 'unknown' : undefined) }],
  ]);
  const store = open(PUBLISHED, {}, live);
  worth = 2;
  expect(store.read(5220)).toBe(2);
  expect(store.set(5220, 1)).toEqual({ reason: 'system', what: '#5220' });
  expect(store.set(5221, 1)).toBe(undefined);
  expect(store.set(5221, 9)).toEqual({ reason: 'unknown', what: '#5221' });
});

test('a copy goes its own way', () => {
  const store = open(MACRO);
  store.set(1, 1);
  store.set(100, 100);
  store.set('_a', 5);
  const copy = store.copy(new Map());
  copy.set(1, 2);
  copy.set(100, 200);
  copy.set('_a', 6);
  expect([store.read(1), store.read(100), store.readNamed('_a')]).toEqual([1, 100, 5]);
  expect([copy.read(1), copy.read(100), copy.readNamed('_a')]).toEqual([2, 200, 6]);
});
