import { get, type IncomingMessage } from 'node:http';
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { CheckProgress } from '#contracts';
import { addMachine, uploadOne } from './testing/set-up-shop';
import { openTestHouse, type SignedInClient, type TestHouse } from './testing/test-house';

let house: TestHouse;
let lead: SignedInClient;
let machineId: string;
beforeAll(async () => {
  house = await openTestHouse();
  lead = await house.signedIn(await house.addShop(), 'lead');
  machineId = (await addMachine(lead)).id;
});
afterAll(() => house.close());

interface Stream {
  readonly status: number;
  readonly headers: IncomingMessage['headers'];
  /** The next event; waits for it. */
  next(): Promise<CheckProgress>;
  readonly ended: Promise<void>;
  close(): void;
}

async function listen(client: SignedInClient, path: string): Promise<Stream> {
  const response = await new Promise<IncomingMessage>((resolve, reject) => {
    const headers = { Cookie: client.cookies() };
    get(`${house.address}/api/v1${path}`, { headers }, resolve).on('error', reject);
  });
  const events: CheckProgress[] = [];
  const waiting: ((event: CheckProgress) => void)[] = [];
  let text = '';
  response.setEncoding('utf8').on('data', (chunk: string) => {
    text += chunk;
    const blocks = text.split('\n\n');
    text = blocks.pop() ?? '';
    for (const block of blocks.filter((each) => each.startsWith('data: '))) {
      const event = JSON.parse(block.slice('data: '.length)) as CheckProgress;
      const taker = waiting.shift();
      if (taker) taker(event);
      else events.push(event);
    }
  });
  const ended = new Promise<void>((resolve) => response.once('close', resolve));
  return {
    status: response.statusCode ?? 0,
    headers: response.headers,
    next: () => {
      const event = events.shift();
      if (event) return Promise.resolve(event);
      return new Promise((resolve) => waiting.push(resolve));
    },
    ended,
    close: () => response.destroy(),
  };
}

/** What a worker would say. */
async function say(shopId: string, progress: CheckProgress): Promise<void> {
  await house.deps.database.sequelize.query(`select pg_notify('check_progress', :notice)`, {
    replacements: { notice: JSON.stringify({ ...progress, shopId }) },
  });
}
const running = (checkId: string, linesRead: number): CheckProgress => ({
  checkId,
  state: 'running',
  linesRead,
  lines: 9,
  verdict: null,
});
const done = (checkId: string): CheckProgress => ({
  checkId,
  state: 'done',
  linesRead: 9,
  lines: 9,
  verdict: 'clear',
});

test('sends the state of a check first, then each step, and ends when it is done', async () => {
  const { checkId } = await uploadOne(lead, machineId);
  const stream = await listen(lead, `/checks/${checkId}/events`);
  expect(stream.headers).toMatchObject({
    'content-type': 'text/event-stream',
    'cache-control': 'no-store, no-transform',
  });
  expect(stream.headers['content-encoding']).toBeUndefined();
  expect(await stream.next()).toEqual({
    checkId,
    state: 'queued',
    linesRead: 0,
    lines: 9,
    verdict: null,
  });
  await say(lead.shopId, running(checkId, 3));
  await say(lead.shopId, running(checkId, 3));
  await say(lead.shopId, running(checkId, 6));
  await say(lead.shopId, done(checkId));
  expect(await stream.next()).toEqual(running(checkId, 3));
  expect(await stream.next()).toEqual(running(checkId, 6));
  expect(await stream.next()).toEqual(done(checkId));
  await stream.ended;
});

test('never goes back from done to running', async () => {
  const { checkId } = await uploadOne(lead, machineId);
  const stream = await listen(lead, `/checks/${checkId}/events`);
  await stream.next();
  await say(lead.shopId, done(checkId));
  await say(lead.shopId, running(checkId, 3));
  expect((await stream.next()).state).toBe('done');
  await stream.ended;
});

test('sends the shop its own checks and no others', async () => {
  const other = await house.signedIn(await house.addShop('Other'), 'lead');
  const theirs = await uploadOne(other, (await addMachine(other, 'Other router')).id);
  const ours = await uploadOne(lead, machineId, { name: 'ours.nc' });
  const stream = await listen(other, '/events');
  expect(await stream.next()).toMatchObject({ checkId: theirs.checkId, state: 'queued' });
  await say(lead.shopId, running(ours.checkId, 3));
  await say(other.shopId, running(theirs.checkId, 4));
  expect(await stream.next()).toEqual(running(theirs.checkId, 4));
  stream.close();
  await stream.ended;
});

test('takes no notice that is not of its form', async () => {
  const { checkId } = await uploadOne(lead, machineId);
  const stream = await listen(lead, `/checks/${checkId}/events`);
  await stream.next();
  await house.deps.database.sequelize.query(`select pg_notify('check_progress', 'not json')`);
  await house.deps.database.sequelize.query(
    `select pg_notify('check_progress', '{"state":"done"}')`,
  );
  await say(lead.shopId, running(checkId, 5));
  expect(await stream.next()).toEqual(running(checkId, 5));
  stream.close();
  await stream.ended;
});

test('hears the workers again after its connection broke, and says what was missed', async () => {
  const { checkId } = await uploadOne(lead, machineId);
  const stream = await listen(lead, `/checks/${checkId}/events`);
  expect((await stream.next()).linesRead).toBe(0);
  await house.deps.database.sequelize.query(
    `update check_run set state = 'running', started_at = now(), lines_read = 4 where id = :checkId`,
    { replacements: { checkId } },
  );
  await house.deps.database.sequelize.query(
    `select pg_terminate_backend(pid) from pg_stat_activity
     where datname = current_database() and query ilike 'listen %'`,
  );
  expect(await stream.next()).toEqual(running(checkId, 4));
  await say(lead.shopId, done(checkId));
  expect((await stream.next()).state).toBe('done');
});

test('tells that a report or path is not there yet', async () => {
  const { checkId } = await uploadOne(lead, machineId);
  for (const part of ['report', 'path']) {
    const answer = await lead.get(`/checks/${checkId}/${part}`);
    expect([answer.status, answer.problem.code]).toEqual([409, 'not-possible-now']);
    expect(answer.problem.detail).toBe('The check is queued; its report is not there yet.');
  }
});

test('ends every stream when the server stops', async () => {
  const other = await openTestHouse();
  const person = await other.signedIn(await other.addShop(), 'lead');
  const kept = house;
  house = other;
  const stream = await listen(person, '/events');
  house = kept;
  await other.deps.feed.stop();
  await stream.ended;
  await other.close();
});
