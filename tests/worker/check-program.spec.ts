import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { checkProgram } from '#engine';
import { pathSchema, setupSchema } from '#contracts';
import { listenForProgress, type ShopProgress } from '../../api/src/db/progress-channel';
import { addProgram, stockShop, type StockedShop } from '../../api/src/db/testing/stock-shop';
import { makeTestDatabase, type TestDatabase } from '../../api/src/db/testing/test-database';
import { engraving } from './testing/engraving';
import { ask, whenDone } from './testing/checks';
import { startWorker, type WorkerProcess } from './testing/worker-process';

// Real processes, on a machine that may be busy with other tests.
vi.setConfig({ testTimeout: 90_000, hookTimeout: 60_000 });

/** Real worker processes on a real database. */
let house: TestDatabase;
let shop: StockedShop;
let workers: WorkerProcess[];
let listening: { stop(): Promise<void> };
const told: ShopProgress[] = [];

beforeAll(async () => {
  house = await makeTestDatabase();
  shop = await stockShop(house.database);
  listening = await listenForProgress({
    url: house.url,
    onProgress: (progress) => told.push(progress),
    onError: (error) => {
      throw error;
    },
  });
  workers = [startWorker(house.url), startWorker(house.url)];
});
afterAll(async () => {
  const ends = await Promise.all(workers.map((worker) => worker.stop()));
  await listening.stop();
  await house.drop();
  // A stop signal ends a worker by itself, with nothing left to do.
  expect(ends).toEqual([0, 0]);
});

test('a check comes out exactly as the engine alone gives it', async () => {
  const { stores } = house.database;
  const text = engraving(60_000);
  const { revisionId } = await addProgram(stores, shop, 'relief.nc', text);
  const { id } = await ask(stores, shop, revisionId);
  const check = await whenDone(stores, shop.shopId, id);
  expect(check).toMatchObject({ state: 'done', linesRead: check.lines, failure: null });

  const details = await stores.checks.details(shop.shopId, id);
  const alone = checkProgram(text, setupSchema.parse(details?.setup), 'relief.nc');
  expect(alone.findings.length).toBeGreaterThan(3);
  expect(JSON.stringify(await stores.checks.report(shop.shopId, id))).toBe(JSON.stringify(alone));
  expect(check.counts).toEqual(alone.counts);

  const path = pathSchema.parse(await stores.checks.path(shop.shopId, id));
  expect(path).toMatchObject({ truncated: false, tolerance: 0.2 });
  expect(path.runs.map((run) => run.kind)).toContain('feed');
});

test('the second walk of a program with blocks that may be skipped reads all of it again', async () => {
  const { stores } = house.database;
  const text = engraving(20_000).replace('G1 X23.700', '/G1 X-900');
  const { revisionId } = await addProgram(stores, shop, 'skip.nc', text);
  const { id } = await ask(stores, shop, revisionId);
  const check = await whenDone(stores, shop.shopId, id);
  const details = await stores.checks.details(shop.shopId, id);
  const alone = checkProgram(text, setupSchema.parse(details?.setup), 'skip.nc');
  expect(check.counts).toEqual(alone.counts);
  expect(JSON.stringify(await stores.checks.report(shop.shopId, id))).toBe(JSON.stringify(alone));
});

test('a program that calls, loops and leaves a branch open comes out as the engine alone gives it', async () => {
  const { stores } = house.database;
  const text =
    'G21 G90 G17 G54\no100 sub\nG0 X[#1*10]\no100 endsub\no100 call [3]\nM66 P1 L0\n' +
    'o10 if [#5399 EQ 1]\nG0 X5000\no10 else\nG0 X10\no10 endif\nM30\n';
  const { revisionId } = await addProgram(stores, shop, 'branch.nc', text);
  const { id } = await ask(stores, shop, revisionId);
  await whenDone(stores, shop.shopId, id);
  const details = await stores.checks.details(shop.shopId, id);
  const alone = checkProgram(text, setupSchema.parse(details?.setup), 'branch.nc');
  const assumed = alone.findings.find(({ rule }) => rule === 'beyond-travel')?.assumed;
  expect(assumed).toEqual([{ line: 7, condition: '[#5399 EQ 1] holds' }]);
  expect(JSON.stringify(await stores.checks.report(shop.shopId, id))).toBe(JSON.stringify(alone));
});

test('whoever listens is told how far a check is, forward only, and that it is done', async () => {
  const { stores } = house.database;
  const { revisionId } = await addProgram(stores, shop, 'long.nc', engraving(150_000));
  const { id, lines } = await ask(stores, shop, revisionId);
  await whenDone(stores, shop.shopId, id);
  await expect.poll(() => told.filter((each) => each.checkId === id).at(-1)?.state).toBe('done');
  const own = told.filter((each) => each.checkId === id);
  expect(own[0]).toMatchObject({ state: 'queued', linesRead: 0, lines, shopId: shop.shopId });
  expect(own.filter((each) => each.state === 'running').length).toBeGreaterThan(3);
  const read = own.map((each) => each.linesRead);
  expect(read).toEqual(read.toSorted((one, other) => one - other));
  expect(read.at(-1)).toBe(lines);
});

test('two workers side by side carry out each check once', async () => {
  const { stores } = house.database;
  const ids: string[] = [];
  for (let number = 1; number <= 12; number += 1) {
    const { revisionId } = await addProgram(stores, shop, `part-${number}.nc`, engraving(number));
    ids.push((await ask(stores, shop, revisionId)).id);
  }
  for (const id of ids) expect((await whenDone(stores, shop.shopId, id)).state).toBe('done');
  const log = workers.map((worker) => worker.log()).join('');
  const begun = log.split('\n').filter((line) => line.includes('the check begins'));
  for (const id of ids) expect(begun.filter((line) => line.includes(id))).toHaveLength(1);
});
