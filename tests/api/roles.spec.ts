import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { ROLES, type Role } from '#contracts';
import { openTestHouse, type SignedInClient, type TestHouse } from './testing/test-house';

/**
 * Who may call which writing route: the role table of the product, written out by hand and not taken
 * from the code, so that a slip there shows here. Reading is everyone's but where it says otherwise.
 */
const EVERYONE: readonly Role[] = ['operator', 'programmer', 'lead', 'admin'];
const AT_THE_MACHINE: readonly Role[] = ['operator', 'programmer', 'lead'];
const TABLE: Record<string, readonly Role[]> = {
  'patch /session/person': EVERYONE,
  'post /programs': EVERYONE,
  'post /program-revisions/:id/checks': EVERYONE,
  'put /machines/:id/loading': AT_THE_MACHINE,
  'post /tools/:id/measurements': AT_THE_MACHINE,
  'post /tools': ['programmer', 'lead'],
  'put /tools/:id': ['programmer', 'lead'],
  'put /machines/:id/offsets': ['programmer', 'lead'],
  'put /programs/:id/job': ['programmer', 'lead'],
  'post /machines': ['lead', 'admin'],
  'put /machines/:id/description': ['lead', 'admin'],
  'put /machines/:id/rack': ['lead', 'admin'],
  'put /machines/:id/macro': ['lead', 'admin'],
  'put /machines/:id/setup': ['lead', 'admin'],
  'patch /shop': ['lead'],
  'put /shop/policy': ['lead'],
  'get /audit': ['lead', 'admin'],
  'get /people': ['admin'],
  'post /people': ['admin'],
  'patch /people/:id': ['admin'],
};
const OPEN = new Set([
  'get /welcome',
  'post /first-person',
  'post /session',
  'post /session/refresh',
  'delete /session',
  'get /openapi.json',
  'get /reference',
  'get /reference.css',
  'get /health',
  'get /ready',
]);
/** These answer only when the check is done with, and a stream would keep the test waiting. */
const STREAMS = new Set(['get /events']);

let house: TestHouse;
const people = new Map<Role, SignedInClient>();
beforeAll(async () => {
  house = await openTestHouse();
  const shopId = await house.addShop();
  for (const role of ROLES) people.set(role, await house.signedIn(shopId, role));
});
afterAll(() => house.close());

const nameOf = (route: { method: string; path: string }) => `${route.method} ${route.path}`;

test('lets in exactly the roles of the product table, on every route', async () => {
  for (const { base, route } of house.routes) {
    const name = nameOf(route);
    if (OPEN.has(name) || STREAMS.has(name)) continue;
    const able = TABLE[name] ?? EVERYONE;
    if (route.method !== 'get') expect(Object.keys(TABLE)).toContain(name);
    for (const role of ROLES) {
      const person = people.get(role)!;
      // An empty body and an id of nothing: whoever is let in is refused for that instead.
      const path = `${base}${route.path.replace(':id', randomUUID())}`;
      const request = person
        .raw(route.method, path)
        .set('X-XSRF-TOKEN', person.cookie('XSRF-TOKEN'));
      const answer = await person.settle(
        route.method === 'get' ? request : request.send({}),
        route.method,
        path,
      );
      const refused = answer.status === 403;
      expect([name, role, refused]).toEqual([name, role, !able.includes(role)]);
      if (refused) expect(answer.problem.code).toBe('not-allowed');
    }
  }
});

test('says as what one is signed in and which roles would do', async () => {
  const answer = await people.get('operator')!.post('/tools', {});
  expect(answer.problem.detail).toBe(
    'You are signed in as operator; this needs programmer or lead.',
  );
});

test('asks for a sign-in on every route that is not open', async () => {
  const visitor = house.visitor();
  await visitor.get('/welcome');
  for (const { base, route } of house.routes) {
    const name = nameOf(route);
    if (OPEN.has(name)) continue;
    const path = `${base}${route.path.replace(':id', randomUUID())}`;
    const request = visitor
      .raw(route.method, path)
      .set('X-XSRF-TOKEN', visitor.cookie('XSRF-TOKEN'));
    const answer = await visitor.settle(request, route.method, path);
    expect([name, answer.status, answer.problem.code]).toEqual([name, 401, 'not-signed-in']);
  }
});

test('takes a role away at once, and access altogether', async () => {
  const admin = people.get('admin')!;
  const person = await house.signedIn(admin.shopId, 'programmer', 'operator');
  expect((await person.post('/tools', {})).status).toBe(400);
  await admin.patch(`/people/${person.personId}`, { roles: ['operator'] });
  expect((await person.post('/tools', {})).status).toBe(403);
  await admin.patch(`/people/${person.personId}`, { active: false });
  const refused = await person.get('/bench');
  expect([refused.status, refused.problem.code]).toEqual([401, 'no-longer-active']);
  expect((await person.post('/session/refresh')).status).toBe(401);
});
