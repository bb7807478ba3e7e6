import { expect, test } from 'vitest';
import { openTurnstile } from './turnstile';

interface Held {
  readonly name: string;
  finish(): void;
  fail(): void;
}

function openHeld() {
  const turnstile = openTurnstile(2);
  const running: Held[] = [];
  const enter = (name: string) =>
    turnstile.pass(
      () =>
        new Promise<string>((resolve, reject) => {
          running.push({ name, finish: () => resolve(name), fail: () => reject(new Error(name)) });
        }),
    );
  return { running, enter };
}
const settle = () => new Promise((resolve) => setImmediate(resolve));

test('lets two in at once and the others in turn', async () => {
  const { running, enter } = openHeld();
  const all = ['a', 'b', 'c', 'd'].map(enter);
  await settle();
  expect(running.map((each) => each.name)).toEqual(['a', 'b']);
  running[1]?.finish();
  await all[1];
  await settle();
  expect(running.map((each) => each.name)).toEqual(['a', 'b', 'c']);
  running[0]?.finish();
  running[2]?.finish();
  await settle();
  running[3]?.finish();
  expect(await Promise.all(all)).toEqual(['a', 'b', 'c', 'd']);
});

test('gives the place of a failed task to the next', async () => {
  const { running, enter } = openHeld();
  const failing = enter('a');
  const others = [enter('b'), enter('c')];
  await settle();
  running[0]?.fail();
  await expect(failing).rejects.toThrow('a');
  await settle();
  expect(running.map((each) => each.name)).toEqual(['a', 'b', 'c']);
  running[1]?.finish();
  running[2]?.finish();
  await Promise.all(others);
});
