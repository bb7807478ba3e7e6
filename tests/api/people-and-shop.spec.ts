import { afterAll, beforeAll, expect, test } from 'vitest';
import {
  peopleSchema,
  personSchema,
  shopPolicySchema,
  shopSchema,
  type ValidSetup,
} from '#contracts';
import { openTestHouse, PASSWORD, type SignedInClient, type TestHouse } from './testing/test-house';

let house: TestHouse;
let admin: SignedInClient;
let lead: SignedInClient;
beforeAll(async () => {
  house = await openTestHouse();
  const shopId = await house.addShop();
  admin = await house.signedIn(shopId, 'admin');
  lead = await house.signedIn(shopId, 'lead');
});
afterAll(() => house.close());

const NEW = {
  name: 'Ned New',
  email: 'ned@shop.example',
  password: 'a-first-password-for-ned',
  roles: ['operator', 'programmer'],
};

test('adds a person, who can sign in, and lists everyone', async () => {
  const added = (await admin.post('/people', NEW)).as(personSchema);
  expect(added).toMatchObject({ roles: ['operator', 'programmer'], active: true, units: 'mm' });
  const ned = house.visitor();
  expect((await ned.post('/session', { email: NEW.email, password: NEW.password })).status).toBe(
    201,
  );
  const { people } = (await admin.get('/people')).as(peopleSchema);
  expect(people.map(({ email }) => email)).toContain(NEW.email);
});

test('refuses an e-mail that is taken, in whatever case and in whatever shop', async () => {
  const other = await house.signedIn(await house.addShop('Other'), 'admin');
  for (const client of [admin, other]) {
    const answer = await client.post('/people', { ...NEW, email: 'NED@shop.example' });
    expect([answer.status, answer.problem.code]).toEqual([409, 'already-there']);
  }
});

test('says what is wrong with a new person, one entry a field', async () => {
  const answer = await admin.post('/people', { name: '', email: 'ned', roles: [], extra: 1 });
  expect(answer.problem.fields?.map(({ path }) => path).sort()).toEqual([
    'email',
    'extra',
    'name',
    'password',
    'roles',
  ]);
  expect(answer.problem.fields?.find(({ path }) => path === 'email')).toMatchObject({
    expected: 'an e-mail address',
    example: 'name@example.com',
  });
});

test('gives a person a new password, which ends their sign-ins and their pause', async () => {
  const person = await house.signedIn(admin.shopId, 'operator');
  for (let attempt = 0; attempt < 11; attempt += 1) {
    await house.visitor().post('/session', { email: person.email, password: 'wrong' });
  }
  const password = 'given-by-the-admin-1';
  await admin.patch(`/people/${person.personId}`, { password });
  expect((await person.post('/session/refresh')).status).toBe(401);
  const again = await house.visitor().post('/session', { email: person.email, password });
  expect(again.status).toBe(201);
});

test('refuses an inactive person with the right password, and says why', async () => {
  const person = await house.signedIn(admin.shopId, 'operator');
  await admin.patch(`/people/${person.personId}`, { active: false });
  const answer = await house
    .visitor()
    .post('/session', { email: person.email, password: PASSWORD });
  expect([answer.status, answer.problem.code]).toEqual([401, 'no-longer-active']);
});

test('keeps at least one active admin', async () => {
  for (const change of [{ active: false }, { roles: ['operator'] }]) {
    const answer = await admin.patch(`/people/${admin.personId}`, change);
    expect([answer.status, answer.problem.code]).toEqual([409, 'not-possible-now']);
  }
  expect((await admin.get('/people')).status).toBe(200);
});

test('changes the name and upload limit of the shop', async () => {
  const changed = await lead.patch('/shop', { name: 'Renamed', uploadLimitBytes: 2048 });
  expect(changed.as(shopSchema)).toMatchObject({ name: 'Renamed', uploadLimitBytes: 2048 });
  expect((await admin.get('/shop')).as(shopSchema).name).toBe('Renamed');
  const wrong = await lead.patch('/shop', { uploadLimitBytes: 10 });
  expect(wrong.problem.fields?.[0]?.message).toContain('at least 1024');
});

test('sets the policy, with the defaults of the contract before', async () => {
  const before = (await admin.get('/shop/policy')).as(shopPolicySchema);
  expect(before.unattended).toEqual({
    allowPauses: false,
    lifeMargin: 0.1,
    measuredWithinDays: 30,
  });
  const policy: ValidSetup['policy'] = { ...before, raise: { 'near-travel': 'hold' } };
  expect((await lead.put('/shop/policy', policy)).as(shopPolicySchema)).toEqual(policy);
  expect((await admin.get('/shop/policy')).as(shopPolicySchema)).toEqual(policy);
  const lowered = await lead.put('/shop/policy', { raise: { 'near-travel': 'note' } });
  expect(lowered.problem.fields?.[0]).toMatchObject({
    path: 'raise.near-travel',
    expected: 'one of "hold", "stop"',
  });
});
