import jwt from 'jsonwebtoken';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { auditTrailSchema, personSchema, sessionSchema, welcomeSchema } from '#contracts';
import { openTestHouse, PASSWORD, type TestHouse } from './testing/test-house';

let house: TestHouse;
let shopId: string;
beforeAll(async () => {
  house = await openTestHouse();
});
afterAll(() => house.close());

const FIRST = {
  shopName: 'First Joinery',
  name: 'Ada First',
  email: 'ada@first.example',
  password: 'a-very-first-password',
};

test('makes the first person admin and lead, once', async () => {
  const visitor = house.visitor();
  expect((await visitor.get('/welcome')).as(welcomeSchema).needsFirstPerson).toBe(true);
  const made = (await visitor.post('/first-person', FIRST)).as(sessionSchema);
  expect(made.person.roles).toEqual(['lead', 'admin']);
  expect(made.shop).toMatchObject({ name: 'First Joinery', uploadLimitBytes: 268_435_456 });
  shopId = made.shop.id;
  expect((await visitor.get('/welcome')).as(welcomeSchema).needsFirstPerson).toBe(false);

  const late = await house.visitor().post('/first-person', { ...FIRST, email: 'b@first.example' });
  expect(late.status).toBe(409);
  expect(late.problem.next).toContain('Sign in');
});

test('lets only one of two first persons in at the same moment', async () => {
  const other = await openTestHouse();
  try {
    const visitors = [other.visitor(), other.visitor()];
    const answers = await Promise.all(
      visitors.map((visitor, at) =>
        visitor.post('/first-person', { ...FIRST, email: `p${at}@first.example` }),
      ),
    );
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409]);
  } finally {
    await other.close();
  }
});

test('signs in whatever the case of the e-mail, with cookies that no script can read', async () => {
  const person = await house.signedIn(shopId, 'operator');
  const visitor = house.visitor();
  const answer = await visitor.post('/session', {
    email: person.email.toUpperCase(),
    password: PASSWORD,
  });
  expect(answer.as(sessionSchema).person.email).toBe(person.email);
  const set = answer.headers['set-cookie'] as unknown as string[];
  const access = set.find((cookie) => cookie.startsWith('nightlatch_access='));
  const refresh = set.find((cookie) => cookie.startsWith('nightlatch_refresh='));
  expect(access).toMatch(/Path=\/;.*HttpOnly; SameSite=Strict/);
  expect(refresh).toMatch(/Path=\/api\/v1\/session;.*HttpOnly; SameSite=Strict/);
  const csrf = set.find((cookie) => cookie.startsWith('XSRF-TOKEN='));
  expect(csrf).toContain('SameSite=Strict');
  expect(csrf).not.toContain('HttpOnly');
});

test('keeps passwords only as argon2id and refresh tokens only as a hash', async () => {
  const person = await house.signedIn(shopId, 'operator');
  const { people, sessions } = house.deps.database.stores;
  expect(await people.passwordHash(shopId, person.personId)).toMatch(
    /^\$argon2id\$v=19\$m=19456,t=2,p=1\$/,
  );
  expect(await sessions.findByHash(person.cookie('nightlatch_refresh'))).toBeUndefined();
});

test('holds the access token for ten minutes', async () => {
  const person = await house.signedIn(shopId, 'operator');
  const claims = jwt.decode(person.cookie('nightlatch_access')) as jwt.JwtPayload;
  expect((claims.exp ?? 0) - (claims.iat ?? 0)).toBe(600);
  const session = (await person.get('/session')).as(sessionSchema);
  expect(session.expiresAt).toBe(new Date((claims.exp ?? 0) * 1000).toISOString());
});

test('refuses tokens that are missing, old, forged or of another kind', async () => {
  const person = await house.signedIn(shopId, 'operator');
  const good = jwt.decode(person.cookie('nightlatch_access')) as jwt.JwtPayload;
  const past = Math.floor(Date.now() / 1000) - 1;
  const tokens = {
    old: jwt.sign({ ...good, exp: past }, house.tokenSecret),
    forged: jwt.sign(good, 'another-secret-of-thirty-two-letters'),
    unsigned: jwt.sign(good, '', { algorithm: 'none' }),
    'another algorithm': jwt.sign(good, house.tokenSecret, { algorithm: 'HS512' }),
    'without a shop': jwt.sign({ ...good, shop: undefined }, house.tokenSecret),
    nonsense: 'x.y.z',
  };
  for (const [kind, token] of Object.entries(tokens)) {
    const visitor = house.visitor();
    const request = visitor.raw('get', '/session').set('Cookie', `nightlatch_access=${token}`);
    const answer = await visitor.settle(request, 'get', '/session');
    expect([kind, answer.status, answer.problem.code]).toEqual([kind, 401, 'session-ended']);
  }
  expect((await house.visitor().get('/session')).problem.code).toBe('not-signed-in');
});

test('names neither the e-mail nor the password as the wrong one', async () => {
  const person = await house.signedIn(shopId, 'operator');
  const visitor = house.visitor();
  const wrong = await visitor.post('/session', { email: person.email, password: 'not this one' });
  const unknown = await visitor.post('/session', { email: 'no@one.example', password: 'not this' });
  expect(wrong.status).toBe(401);
  expect({ ...wrong.problem, requestId: '' }).toEqual({ ...unknown.problem, requestId: '' });
});

test('pauses at the eleventh wrong password and says for how long, known e-mail or not', async () => {
  const person = await house.signedIn(shopId, 'operator');
  for (const email of [person.email, 'nobody.at.all@shop.example']) {
    const visitor = house.visitor();
    for (let attempt = 1; attempt <= 10; attempt += 1) {
      const answer = await visitor.post('/session', { email, password: `wrong ${attempt}` });
      expect([email, attempt, answer.problem.code]).toEqual([email, attempt, 'wrong-sign-in']);
    }
    const eleventh = await visitor.post('/session', { email, password: PASSWORD });
    expect(eleventh.status).toBe(429);
    expect(eleventh.problem.code).toBe('sign-in-paused');
    expect(eleventh.problem.detail).toBe(
      'There were 10 wrong passwords in a row for this e-mail, so sign-in is paused for 15 minutes.',
    );
    expect(Number(eleventh.headers['retry-after'])).toBeGreaterThan(890);
  }
  const lead = await house.signedIn(shopId, 'lead');
  const { events } = (await lead.get('/audit')).as(auditTrailSchema);
  expect(events.filter(({ action }) => action === 'session.pause')).toHaveLength(1);
});

test('lets the right password in again once the pause is over, with ten new attempts', async () => {
  const other = await openTestHouse();
  try {
    const person = await other.signedIn(await other.addShop(), 'operator');
    const visitor = other.visitor();
    const attempt = (password: string) =>
      visitor.post('/session', { email: person.email, password });
    for (let at = 0; at < 10; at += 1) await attempt('wrong');
    expect((await attempt(PASSWORD)).problem.code).toBe('sign-in-paused');
    other.advance(15 * 60 + 1);
    expect((await attempt('wrong')).problem.code).toBe('wrong-sign-in');
    expect((await attempt(PASSWORD)).status).toBe(201);
    for (let at = 0; at < 9; at += 1) await attempt('wrong');
    expect((await attempt(PASSWORD)).status).toBe(201);
  } finally {
    await other.close();
  }
});

test('counts guesses sent side by side', async () => {
  const person = await house.signedIn(shopId, 'operator');
  const visitors = Array.from({ length: 15 }, () => house.visitor());
  for (const visitor of visitors) await visitor.get('/welcome');
  const answers = await Promise.all(
    visitors.map((visitor) => visitor.post('/session', { email: person.email, password: 'wrong' })),
  );
  const codes = answers.map((answer) => answer.problem.code);
  expect(codes.filter((code) => code === 'wrong-sign-in')).toHaveLength(10);
  expect(codes.filter((code) => code === 'sign-in-paused')).toHaveLength(5);
});

test('exchanges the refresh token at every renewal', async () => {
  const person = await house.signedIn(shopId, 'operator');
  const before = person.cookie('nightlatch_refresh');
  expect((await person.post('/session/refresh')).as(sessionSchema).person.id).toBe(person.personId);
  expect(person.cookie('nightlatch_refresh')).not.toBe(before);
  expect((await person.get('/session')).status).toBe(200);
});

test('ends every page of a sign-in when a refresh token is used twice', async () => {
  const other = await openTestHouse();
  try {
    const id = await other.addShop();
    const person = await other.signedIn(id, 'operator');
    const lead = await other.signedIn(id, 'lead');
    const stolen = person.cookies();
    await person.post('/session/refresh');
    other.advance(11);
    const replay = other.visitor();
    const request = replay
      .raw('post', '/session/refresh')
      .set('Cookie', stolen)
      .set('X-XSRF-TOKEN', person.cookie('XSRF-TOKEN'));
    const answer = await replay.settle(request, 'post', '/session/refresh');
    expect([answer.status, answer.problem.code]).toEqual([401, 'session-ended']);
    const owner = await person.post('/session/refresh');
    expect([owner.status, owner.problem.code]).toEqual([401, 'session-ended']);
    const trail = (await lead.get('/audit')).as(auditTrailSchema);
    expect(trail.events.map((event) => event.action)).toContain('session.token-used-twice');
  } finally {
    await other.close();
  }
});

test('does not take two pages that renew at the same moment for a thief', async () => {
  const person = await house.signedIn(shopId, 'operator');
  const both = await Promise.all([
    person.post('/session/refresh'),
    person.post('/session/refresh'),
  ]);
  expect(both.map((answer) => answer.status).sort()).toEqual([200, 409]);
  const late = both.find((answer) => answer.status === 409);
  expect(late?.problem.code).toBe('session-just-renewed');
  expect((await person.post('/session/refresh')).status).toBe(200);
});

test('has nothing to renew without a session', async () => {
  const answer = await house.visitor().post('/session/refresh');
  expect([answer.status, answer.problem.code]).toEqual([401, 'not-signed-in']);
});

test('signs out: both tokens are dead and the cookies are gone', async () => {
  const person = await house.signedIn(shopId, 'operator');
  const kept = person.cookies();
  expect((await person.delete('/session')).status).toBe(204);
  expect(person.cookie('nightlatch_access')).toBe('');
  const replay = house.visitor();
  const token = /XSRF-TOKEN=([^;]+)/.exec(kept)?.[1] ?? '';
  const request = replay
    .raw('post', '/session/refresh')
    .set('Cookie', kept)
    .set('X-XSRF-TOKEN', token);
  expect((await replay.settle(request, 'post', '/session/refresh')).status).toBe(401);
  const read = replay.raw('get', '/session').set('Cookie', kept);
  expect((await replay.settle(read, 'get', '/session')).problem.code).toBe('session-ended');
  expect((await person.delete('/session')).status).toBe(204);
});

test('changes what people may change of themselves', async () => {
  const person = await house.signedIn(shopId, 'operator');
  const changed = await person.patch('/session/person', { units: 'inch', name: 'New Name' });
  expect(changed.as(personSchema)).toMatchObject({ units: 'inch', name: 'New Name' });
  expect(
    (await person.patch('/session/person', { roles: ['admin'] })).problem.fields?.[0]?.path,
  ).toBe('roles');
});

test('takes a new password only with the present one, and ends the other sign-ins', async () => {
  const person = await house.signedIn(shopId, 'operator');
  const elsewhere = house.visitor();
  await elsewhere.post('/session', { email: person.email, password: PASSWORD });
  const next = 'quite-another-password';
  const wrong = await person.patch('/session/person', { password: { current: 'no', next } });
  expect(wrong.problem.fields?.[0]?.path).toBe('password.current');
  const right = await person.patch('/session/person', { password: { current: PASSWORD, next } });
  expect(right.status).toBe(200);
  expect((await person.post('/session/refresh')).status).toBe(200);
  expect((await elsewhere.post('/session/refresh')).status).toBe(401);
  const again = house.visitor();
  expect((await again.post('/session', { email: person.email, password: next })).status).toBe(201);
});

test('needs a password of twelve characters', async () => {
  const person = await house.signedIn(shopId, 'operator');
  const answer = await person.patch('/session/person', {
    password: { current: PASSWORD, next: 'too short' },
  });
  expect(answer.problem.fields).toEqual([
    {
      path: 'password.next',
      message: 'next is not usable: give at least 12 characters.',
      expected: 'at least 12 characters',
    },
  ]);
});
