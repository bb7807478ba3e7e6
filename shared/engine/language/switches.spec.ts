import { describe, expect, test } from 'vitest';
import { startTrace, type TraceMotion } from '../index';
import { runProgram } from '../testing/check-rule';
import { testSetup } from '../testing/test-shop';
import { SWITCHES, type Switch } from './switches';

/** Everything a program comes to under one value: what moves, what is found, how long it takes. */
function outcome({ key, example, setup }: Switch, value: string | number | boolean): unknown {
  const change = {
    ...setup,
    controller: {
      ...(setup as { controller?: object })?.controller,
      ...nested(key.split('.'), value),
    },
  };
  const program = example.includes('M30') ? example : `${example}\nM30\n`;
  const moved: TraceMotion[] = [];
  const trace = startTrace(testSetup(change), (motion) => moved.push(motion));
  const bytes = new TextEncoder().encode(program);
  do trace.push(bytes);
  while (trace.endOfText() === 'read-again');
  const report = { ...runProgram(program, change), setup: undefined };
  return { moved, report };
}

function nested(path: readonly string[], value: unknown): object {
  return path.reduceRight<unknown>((inner, key) => ({ [key]: inner }), value) as object;
}

describe.each(SWITCHES.map((each) => [each.key, each] as const))('%s', (_key, each) => {
  test('its values each come out differently', () => {
    const outcomes = each.values.map((value) => JSON.stringify(outcome(each, value)));
    expect(new Set(outcomes).size).toBe(each.values.length);
  });
  test('the first value is the default', () => {
    const stated = testSetup({ controller: nested(each.key.split('.'), each.values[0]) });
    expect(stated.controller).toEqual(testSetup().controller);
  });
});
