import { spawn, type ChildProcess } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pg from 'pg';

const ROOT = join(import.meta.dirname, '..', '..', '..');

/** The built product, running on a database of its own: what a person gets from `npm start`. */
export interface Product {
  readonly address: string;
  readonly databaseUrl: string;
  stop(): Promise<void>;
}

/**
 * Starts the bundles in dist/ (build first) on a fresh database of the server in DATABASE_URL.
 * @throws Error when DATABASE_URL is missing or the API does not become ready.
 */
export async function startProduct({ demo }: { readonly demo: boolean }): Promise<Product> {
  const server = process.env['DATABASE_URL'];
  if (!server)
    throw new Error('DATABASE_URL is missing: run with node api/launch/pg.mjs test -- …');
  const name = `browser_${randomBytes(6).toString('hex')}`;
  await onServer(server, `create database ${name}`);
  const databaseUrl = Object.assign(new URL(server), { pathname: `/${name}` }).href;
  const data = mkdtempSync(join(tmpdir(), 'nightlatch-browser-'));
  const port = await freePort();
  const env = {
    ...process.env,
    NODE_ENV: 'production',
    DATABASE_URL: databaseUrl,
    PORT: String(port),
    NIGHTLATCH_DATA: data,
    NIGHTLATCH_DEMO: demo ? '1' : '0',
    NIGHTLATCH_LOG: 'warn',
  };
  const address = `http://127.0.0.1:${port}`;
  const api = launch('api', env);
  await becomeReady(address, api);
  const worker = launch('worker', env);
  return {
    address,
    databaseUrl,
    stop: async () => {
      await Promise.all([end(worker), end(api)]);
      await onServer(server, `drop database if exists ${name} with (force)`);
      rmSync(data, { recursive: true, force: true });
    },
  };
}

function launch(name: 'api' | 'worker', env: NodeJS.ProcessEnv): ChildProcess {
  const bundle = join('dist', 'server', `${name}.js`);
  return spawn(process.execPath, ['--enable-source-maps', bundle], {
    cwd: ROOT,
    env,
    stdio: ['ignore', 'inherit', 'inherit'],
  });
}

async function becomeReady(address: string, api: ChildProcess): Promise<void> {
  const deadline = Date.now() + 60_000;
  while (Date.now() < deadline && api.exitCode === null) {
    const answer = await fetch(`${address}/ready`).catch(() => undefined);
    if (answer?.ok) return;
    await new Promise((done) => setTimeout(done, 50));
  }
  throw new Error(`The API did not become ready (exit code ${api.exitCode}).`);
}

async function end(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null) return;
  const ended = new Promise((done) => child.once('exit', done));
  child.kill('SIGTERM');
  await ended;
}

async function onServer(url: string, sql: string): Promise<void> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  await client.query(sql);
  await client.end();
}

function freePort(): Promise<number> {
  return new Promise((done, fail) => {
    const probe = createServer()
      .once('error', fail)
      .listen(0, '127.0.0.1', () => {
        const address = probe.address();
        probe.close(() => {
          if (address === null || typeof address === 'string') fail(new Error('no port'));
          else done(address.port);
        });
      });
  });
}
