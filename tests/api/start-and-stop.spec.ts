import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, readFileSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { makeTestDatabase, type TestDatabase } from '../../api/src/db/testing/test-database';

let test_: TestDatabase;
let dataFolder: string;
beforeAll(async () => {
  test_ = await makeTestDatabase({ unmigrated: true });
  dataFolder = mkdtempSync(join(tmpdir(), 'nightlatch-data-'));
});
afterAll(async () => {
  rmSync(dataFolder, { recursive: true });
  await test_.drop();
});

interface Started {
  readonly child: ChildProcess;
  readonly address: string;
  readonly log: () => string;
}

/** The real process, from its sources; settles once it says where it listens. */
async function start(settings: Record<string, string> = {}): Promise<Started> {
  const child = spawn(process.execPath, ['--import', 'tsx', 'api/src/main.ts'], {
    cwd: resolve('.'),
    env: {
      PATH: process.env['PATH'],
      DATABASE_URL: test_.url,
      PORT: '0',
      NIGHTLATCH_DATA: dataFolder,
      ...settings,
    },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let log = '';
  const port = await new Promise<number>((settle, reject) => {
    const read = (chunk: Buffer) => {
      log += chunk.toString();
      const found = /"port":(\d+)/.exec(log)?.[1];
      if (found) settle(Number(found));
    };
    child.stdout.on('data', read);
    child.stderr.on('data', read);
    child.once('exit', (code) => reject(new Error(`it ended with ${code}: ${log}`)));
  });
  return { child, address: `http://127.0.0.1:${port}`, log: () => log };
}

async function stop({ child }: Started, signal: NodeJS.Signals): Promise<number | null> {
  const ended = once(child, 'exit') as Promise<[number | null]>;
  child.kill(signal);
  return (await ended)[0];
}

test('migrates, answers, and ends cleanly when asked to, twice over the same data', async () => {
  const first = await start();
  expect((await fetch(`${first.address}/ready`)).status).toBe(200);
  const welcome = await (await fetch(`${first.address}/api/v1/welcome`)).json();
  expect(welcome).toEqual({ needsFirstPerson: true, demo: [] });
  const secretFile = join(dataFolder, 'token-secret');
  expect(statSync(secretFile).mode & 0o777).toBe(0o600);
  const secret = readFileSync(secretFile, 'utf8');
  expect(await stop(first, 'SIGTERM')).toBe(0);

  const second = await start();
  expect((await fetch(`${second.address}/ready`)).status).toBe(200);
  expect(readFileSync(secretFile, 'utf8')).toBe(secret);
  expect(second.log()).not.toContain(secret);
  expect(await stop(second, 'SIGINT')).toBe(0);
});

test('says in one sentence which setting it cannot start with', async () => {
  await expect(start({ DATABASE_URL: 'nowhere' })).rejects.toThrow(
    'Nightlatch cannot start with these settings. DATABASE_URL: set it to a PostgreSQL address',
  );
});
