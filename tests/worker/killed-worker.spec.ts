import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { checkProgram } from '#engine';
import { setupSchema } from '#contracts';
import { addProgram, stockShop, type StockedShop } from '../../api/src/db/testing/stock-shop';
import { makeTestDatabase, type TestDatabase } from '../../api/src/db/testing/test-database';
import { ask, whenDone } from './testing/checks';
import { engraving } from './testing/engraving';
import { startWorker } from './testing/worker-process';

/** Where in the walk the worker dies: a line of the program, drawn once and kept. */
const LINES = 20_000;
const SEED = 20261201;
const MID_WALK = 1 + (SEED % (LINES - 1));

/** Two processes start in each test, on a machine that may be busy with other tests. */
const PROCESS_TIMEOUT = 90_000;

let house: TestDatabase;
let shop: StockedShop;
beforeAll(async () => {
  house = await makeTestDatabase();
  shop = await stockShop(house.database);
});
afterAll(() => house.drop());

const POINTS = [
  { point: 'begun', when: 'before it reads the first block', state: 'running' },
  { point: `walk:${MID_WALK}`, when: 'in the middle of the walk', state: 'running' },
  { point: 'before-save', when: 'before the transaction that saves', state: 'running' },
  { point: 'within-save', when: 'within the transaction that saves', state: 'running' },
  { point: 'after-save', when: 'after the transaction that saves', state: 'done' },
] as const;

test.each(POINTS)(
  'a worker killed $when loses nothing: the next one leaves one set of findings',
  { timeout: PROCESS_TIMEOUT },
  async ({ point, state }) => {
    const { stores } = house.database;
    const text = engraving(LINES);
    const { revisionId } = await addProgram(stores, shop, `${point}.nc`, text);
    const { id } = await ask(stores, shop, revisionId);

    const doomed = startWorker(house.url, { NIGHTLATCH_STOP_AT: point });
    expect(await doomed.ended, doomed.log()).toBe('SIGKILL');
    expect((await stores.checks.find(shop.shopId, id))?.state).toBe(state);
    const kept = await countRows(id);
    expect(kept.findings === 0).toBe(state === 'running');

    const next = startWorker(house.url);
    await next.says('the worker waits for checks');
    const check = await whenDone(stores, shop.shopId, id);
    expect(check.state).toBe('done');
    expect(await next.stop()).toBe(0);

    const details = await stores.checks.details(shop.shopId, id);
    const alone = checkProgram(text, setupSchema.parse(details?.setup), `${point}.nc`);
    expect(alone.findings.length).toBeGreaterThan(3);
    expect(await countRows(id)).toEqual({ findings: alone.findings.length, paths: 1 });
    expect(JSON.stringify(await stores.checks.report(shop.shopId, id))).toBe(JSON.stringify(alone));
  },
);

async function countRows(id: string): Promise<{ findings: number; paths: number }> {
  const [row] = await house.database.sequelize.query<{ findings: number; paths: number }>(
    `select (select count(*)::int from finding where check_id = :id) as findings,
       (select count(*)::int from check_path where check_id = :id) as paths`,
    { type: QueryTypes.SELECT, replacements: { id } },
  );
  return row!;
}
