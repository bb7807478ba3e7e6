import { afterAll, beforeAll, expect, test } from 'vitest';
import { openTestHouse, PASSWORD, type SignedInClient, type TestHouse } from './testing/test-house';

let house: TestHouse;
let lead: SignedInClient;
beforeAll(async () => {
  house = await openTestHouse();
  lead = await house.signedIn(await house.addShop(), 'lead', 'admin');
});
afterAll(() => house.close());

test('refuses every writing route without the token of the page', async () => {
  const writing = house.routes.filter(({ route }) => route.method !== 'get');
  expect(writing.length).toBeGreaterThan(15);
  for (const { base, route } of writing) {
    const path = `${base}${route.path.replace(':id', lead.personId)}`;
    const answer = await lead.settle(lead.raw(route.method, path).send({}), route.method, path);
    expect([path, answer.status, answer.problem.code]).toEqual([path, 403, 'page-out-of-date']);
  }
});

test.each([
  ['another token than the cookie', (own: string) => `${own.slice(0, -1)}!`],
  ['a token of its own making', () => 'made.up'],
  ['nothing', () => ''],
])('refuses %s', async (_what, tokenFor) => {
  const request = lead
    .raw('patch', '/session/person')
    .set('X-XSRF-TOKEN', tokenFor(lead.cookie('XSRF-TOKEN')))
    .send({ units: 'inch' });
  const answer = await lead.settle(request, 'patch', '/session/person');
  expect(answer.problem.code).toBe('page-out-of-date');
});

test('refuses a cookie and header that agree but are not signed by this server', async () => {
  const planted = 'planted.by-a-neighbour';
  const visitor = house.visitor();
  const request = visitor
    .raw('post', '/session')
    .set('Cookie', `XSRF-TOKEN=${planted}`)
    .set('X-XSRF-TOKEN', planted)
    .send({ email: lead.email, password: PASSWORD });
  expect((await visitor.settle(request, 'post', '/session')).problem.code).toBe('page-out-of-date');
});

test('gives a new token at sign-in', async () => {
  const visitor = house.visitor();
  await visitor.get('/welcome');
  const before = visitor.cookie('XSRF-TOKEN');
  await visitor.post('/session', { email: lead.email, password: PASSWORD });
  expect(visitor.cookie('XSRF-TOKEN')).not.toBe(before);
});
