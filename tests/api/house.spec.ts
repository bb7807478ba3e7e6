import { mkdtempSync, mkdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Writable } from 'node:stream';
import supertest from 'supertest';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { problemSchema } from '#contracts';
import { buildApp } from '../../api/src/app';
import { PROBLEMS } from '../../api/src/http/problems';
import { openLog } from '../../api/src/http/request-log';
import { openTestHouse, PASSWORD, type SignedInClient, type TestHouse } from './testing/test-house';

let house: TestHouse;
let lead: SignedInClient;
let webFolder: string;
beforeAll(async () => {
  house = await openTestHouse();
  lead = await house.signedIn(await house.addShop(), 'lead');
  webFolder = mkdtempSync(join(tmpdir(), 'nightlatch-web-'));
  mkdirSync(join(webFolder, 'media'));
  writeFileSync(
    join(webFolder, 'index.html'),
    '<nl-app ngCspNonce="__CSP_NONCE__"></nl-app><script nonce="__CSP_NONCE__"></script>',
  );
  writeFileSync(join(webFolder, 'main-ABCD1234.js'), 'export {};');
  writeFileSync(join(webFolder, 'robots.txt'), 'User-agent: *');
});
afterAll(async () => {
  rmSync(webFolder, { recursive: true });
  await house.close();
});

const withClient = () =>
  supertest(buildApp({ ...house.deps, config: { ...house.deps.config, webFolder } }));

test('is healthy and ready', async () => {
  expect((await supertest(house.app).get('/health')).body).toEqual({ status: 'up' });
  expect((await supertest(house.app).get('/ready')).body).toEqual({
    status: 'ready',
    database: 'answers',
    migrations: 'done',
    queue: 'there',
  });
});

test('is not ready while it stops, without its database or queue, or before its migrations', async () => {
  const { database } = house.deps;
  const cases = [
    { isStopping: () => true },
    { database: { ...database, answers: () => Promise.reject(new Error('gone')) } },
    { queue: { answers: () => Promise.reject(new Error('gone')) } },
    { database: { ...database, pendingMigrations: () => Promise.resolve(['one']) } },
  ];
  const details = [];
  for (const change of cases) {
    const answer = await supertest(buildApp({ ...house.deps, ...change })).get('/ready');
    expect(answer.status).toBe(503);
    details.push(problemSchema.parse(JSON.parse(answer.text)).detail);
  }
  expect(details).toEqual([
    'The server is stopping.',
    'The database does not answer.',
    'The queue of checks does not answer.',
    '1 migrations of the database are not yet run.',
  ]);
});

test('writes the nonce of the policy into the page, another one each time', async () => {
  const answers = [await withClient().get('/'), await withClient().get('/programs/anything')];
  const nonces = answers.map((answer) => {
    expect(answer.headers['cache-control']).toBe('no-store');
    const nonce = /'nonce-([^']+)'/.exec(String(answer.headers['content-security-policy']))?.[1];
    expect(answer.text).toBe(
      `<nl-app ngCspNonce="${nonce}"></nl-app><script nonce="${nonce}"></script>`,
    );
    return nonce;
  });
  expect(nonces[0]).not.toBe(nonces[1]);
});

test('allows nothing inline and nothing from elsewhere, on any reply', async () => {
  for (const path of [
    '/',
    '/api/v1/welcome',
    '/api/v1/reference',
    '/main-ABCD1234.js',
    '/nowhere.js',
  ]) {
    const { headers } = await withClient().get(path);
    const policy = String(headers['content-security-policy']);
    expect(policy.replace(/'nonce-[^']+'/, "'nonce'")).toBe(
      "default-src 'self';script-src 'self';style-src 'self' 'nonce';img-src 'self' data:;" +
        "font-src 'self';connect-src 'self';worker-src 'self';base-uri 'self';form-action 'self';" +
        "object-src 'none';frame-ancestors 'none'",
    );
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['x-powered-by']).toBeUndefined();
  }
});

test('lets files with a hash in their name be kept for ever, and no others', async () => {
  const hashed = await withClient().get('/main-ABCD1234.js');
  expect(hashed.headers['cache-control']).toBe('public, max-age=31536000, immutable');
  expect(hashed.headers['set-cookie']).toBeUndefined();
  expect((await withClient().get('/robots.txt')).headers['cache-control']).toBe('no-cache');
  expect((await withClient().get('/missing-ABCD1234.js')).status).toBe(404);
});

test('does not serve the page with its placeholder', async () => {
  for (const path of ['/index.html', '/./index.html', '/%69ndex.html']) {
    const { text } = await withClient().get(path);
    expect(text).not.toContain('__CSP_NONCE__');
  }
});

test('says that the client is not built when it is not', async () => {
  const answer = await supertest(house.app).get('/');
  expect(answer.status).toBe(503);
  expect(problemSchema.parse(JSON.parse(answer.text)).next).toContain('npm run build');
});

test('answers a problem for what is not there and what cannot be read', async () => {
  const cases = [
    ['/api/v1/nothing', 404, 'not-found'],
    ['/api/v1/machines/%E0%A4%A', 400, 'unreadable-body'],
  ] as const;
  for (const [path, status, code] of cases) {
    const answer = await lead.get(path);
    expect([answer.status, answer.problem.code]).toEqual([status, code]);
    expect(answer.problem.requestId).toBe(answer.headers['x-request-id']);
  }
});

test('refuses a body that is too large, and one that is no JSON', async () => {
  const large = await lead.patch('/session/person', { name: 'x'.repeat(300_000) });
  expect([large.status, large.problem.code]).toEqual([413, 'too-large']);
  expect(large.problem.detail).toContain('262144 bytes');
  const request = lead
    .raw('patch', '/session/person')
    .set('X-XSRF-TOKEN', lead.cookie('XSRF-TOKEN'))
    .set('Content-Type', 'text/plain')
    .send('units=inch');
  const plain = await lead.settle(request, 'patch', '/session/person');
  expect([plain.status, plain.problem.code]).toEqual([400, 'unreadable-body']);
});

test('answers a fault of ours without its inside, and logs it under the request id', async () => {
  const lines: string[] = [];
  const logger = openLog('info', new Writable({ write: keepIn(lines) }));
  const shops = {
    ...house.deps.database.stores.shops,
    find: () => Promise.reject(new Error('inner')),
  };
  const stores = { ...house.deps.database.stores, shops };
  const broken = buildApp({ ...house.deps, logger, database: { ...house.deps.database, stores } });
  const answer = await supertest(broken).get('/api/v1/shop').set('Cookie', lead.cookies());
  const problem = problemSchema.parse(JSON.parse(answer.text));
  expect([answer.status, problem.code]).toEqual([500, 'our-fault']);
  expect(answer.text).not.toContain('inner');
  const logged = lines.find((line) => line.includes('inner'));
  expect(logged).toContain(problem.requestId);
});

test('logs no secret', async () => {
  const lines: string[] = [];
  const logger = openLog('debug', new Writable({ write: keepIn(lines) }));
  const app = supertest(buildApp({ ...house.deps, logger }));
  await app
    .post('/api/v1/session')
    .set('Cookie', lead.cookies())
    .set('X-XSRF-TOKEN', lead.cookie('XSRF-TOKEN'))
    .send({ email: lead.email, password: PASSWORD })
    .expect(201);
  const log = lines.join('');
  expect(log).toContain('/api/v1/session');
  for (const secret of [PASSWORD, lead.cookie('nightlatch_access'), lead.cookie('XSRF-TOKEN')]) {
    expect(log).not.toContain(secret);
  }
  expect(log).not.toContain('Set-Cookie');
});

test('describes every route it has, with schemas that are all there', async () => {
  const document = (await house.visitor().get('/openapi.json')).body as {
    openapi: string;
    paths: Record<string, Record<string, { operationId: string }>>;
    components: { schemas: Record<string, unknown> };
  };
  expect(document.openapi).toBe('3.1.0');
  const described = Object.entries(document.paths).flatMap(([path, methods]) =>
    Object.keys(methods).map((method) => `${method} ${path}`),
  );
  const mounted = house.routes.map(
    ({ base, route }) => `${route.method} ${base}${route.path.replace(':id', '{id}')}`,
  );
  expect(described.sort()).toEqual(mounted.sort());
  const text = JSON.stringify(document);
  const names = [...text.matchAll(/"#\/components\/schemas\/([^"]+)"/g)].map((match) => match[1]!);
  expect(names.length).toBeGreaterThan(50);
  for (const name of names) expect(Object.keys(document.components.schemas)).toContain(name);
  const ids = Object.values(document.paths).flatMap((methods) =>
    Object.values(methods).map((operation) => operation.operationId),
  );
  expect(new Set(ids).size).toBe(ids.length);
});

test('shows every route and every refusal on a page without script or inline style', async () => {
  const page = await house.visitor().get('/reference');
  for (const { base, route } of house.routes) {
    expect(page.text).toContain(`<code>${route.method.toUpperCase()} ${base}${route.path}</code>`);
  }
  for (const code of Object.keys(PROBLEMS)) expect(page.text).toContain(`id="problem-${code}"`);
  expect(page.text).not.toMatch(/<script|style="|<style|https?:\/\//);
});

function keepIn(lines: string[]) {
  return (chunk: Buffer, _encoding: string, done: () => void) => {
    lines.push(chunk.toString());
    done();
  };
}
