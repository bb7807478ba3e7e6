import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from 'vitest';
import {
  benchSchema,
  machineListSchema,
  peopleSchema,
  programPageSchema,
  toolListSchema,
} from '#contracts';
import { addMachine, northSetup, uploadOne } from './testing/set-up-shop';
import { openTestHouse, type SignedInClient, type TestHouse } from './testing/test-house';

let house: TestHouse;
let owner: SignedInClient;
let stranger: SignedInClient;
/** An id of the owner's shop for every kind of thing a path names. */
const ids: Record<string, string> = {};

beforeAll(async () => {
  house = await openTestHouse();
  owner = await house.signedIn(await house.addShop('Ours'), 'lead', 'admin', 'programmer');
  stranger = await house.signedIn(await house.addShop('Theirs'), 'lead', 'admin', 'programmer');
  const machine = await addMachine(owner);
  const tools = (await owner.get('/tools')).as(toolListSchema);
  const uploaded = await uploadOne(owner, machine.id);
  ids['machine'] = machine.id;
  ids['tool'] = tools.tools[0]!.id;
  ids['program'] = uploaded.programId;
  ids['program revision'] = uploaded.revisionId;
  ids['check'] = uploaded.checkId;
  ids['person'] = owner.personId;
});
afterAll(() => house.close());

/** Bodies that would be carried out, were the id one's own. */
function bodies(): Record<string, object> {
  const setup = northSetup();
  const { machine, controller, rack, loading, offsets, tools } = setup;
  const change = { basedOn: 1, reason: 'Guessing' };
  return {
    'put /machines/:id/description': { ...change, machine, controller },
    'put /machines/:id/rack': { ...change, rack },
    'put /machines/:id/loading': { ...change, loading },
    'put /machines/:id/offsets': { ...change, work: offsets.work },
    'put /machines/:id/macro': { ...change, macro: { name: 'M', text: 'M30' } },
    'put /machines/:id/setup': { setup },
    'put /tools/:id': { ...change, tool: tools[0]! },
    'post /tools/:id/measurements': { gaugeLength: 80, method: 'setter' },
    'put /programs/:id/job': { basedOn: 0, job: {} },
    'post /program-revisions/:id/checks': { machineId: ids['machine'] },
    'patch /people/:id': { name: 'Taken over' },
  };
}

test('answers 404 to a person of another shop, on every route that takes an id', async () => {
  const withId = house.routes.filter(({ route }) => route.path.includes(':id'));
  expect(withId.length).toBeGreaterThan(20);
  for (const { base, route } of withId) {
    const name = `${route.method} ${route.path}`;
    const id = ids[route.names];
    const body = bodies()[name];
    if (!id) throw new Error(`no id of a ${route.names} for ${name}`);
    if (route.body && !body) throw new Error(`no body for ${name}`);
    const query = QUERIES[route.path.split('/').at(-1) ?? ''] ?? '';
    const refusals = [];
    for (const tried of [id, randomUUID(), 'not-an-id']) {
      const path = `${base}${route.path.replace(':id', tried)}${query}`;
      const request = stranger
        .raw(route.method, path)
        .set('X-XSRF-TOKEN', stranger.cookie('XSRF-TOKEN'));
      const answer = await stranger.settle(body ? request.send(body) : request, route.method, path);
      expect([name, tried, answer.status]).toEqual([name, tried, 404]);
      refusals.push({ ...answer.problem, instance: '', requestId: '' });
    }
    // What is another's and what is nobody's must not be told apart.
    expect(refusals[1]).toEqual(refusals[0]);
  }
});

test('changed nothing of what was guessed at', async () => {
  expect((await owner.get(`/machines/${ids['machine']}`)).body).toMatchObject({
    name: 'North router',
    revision: { number: 1 },
    loadingRevision: { number: 1 },
  });
  expect((await owner.get('/people')).as(peopleSchema).people[0]?.name).not.toBe('Taken over');
});

test('refuses to upload to, or check on, a machine of another shop', async () => {
  const upload = await stranger.upload(`/programs?machineId=${ids['machine']}`, [
    { name: 'a.nc', content: 'M30\n' },
  ]);
  expect(upload.status).toBe(404);
  const own = await addMachine(stranger, 'Their router');
  const { revisionId } = await uploadOne(stranger, own.id);
  const check = await stranger.post(`/program-revisions/${revisionId}/checks`, {
    machineId: ids['machine'],
  });
  expect(check.status).toBe(404);
});

test('lists nothing of another shop', async () => {
  const lists = [
    (await stranger.get('/machines')).as(machineListSchema).machines.map(({ id }) => id),
    (await stranger.get('/tools')).as(toolListSchema).tools.map(({ id }) => id),
    (await stranger.get('/programs')).as(programPageSchema).programs.map(({ id }) => id),
    (await stranger.get('/bench')).as(benchSchema).checks.map(({ id }) => id),
    (await stranger.get('/people')).as(peopleSchema).people.map(({ id }) => id),
  ];
  for (const id of Object.values(ids)) expect(lists.flat()).not.toContain(id);
  expect((await stranger.get('/audit')).text).not.toContain('North router');
});

/** What a route refuses to answer without, so that the id is all that is wrong. */
const QUERIES: Readonly<Record<string, string>> = { lines: '?from=1&to=2', words: '?line=1' };
