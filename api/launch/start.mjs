/**
 * `npm start`: everything the product needs on one machine. Installs what is missing, starts its own
 * PostgreSQL on 127.0.0.1, builds, migrates, seeds the demo once, runs API and worker, and stops all of it
 * on Ctrl-C. DATABASE_URL names a server to use instead; PORT another port than 3000; NIGHTLATCH_DEMO=0
 * begins with an empty shop.
 */
import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { buildAll } from './build.mjs';
import { fail, say } from './debian.mjs';
import { installPackages, ROOT } from './packages.mjs';
import { freePort, startPostgres } from './pg.mjs';

const DATA = join(ROOT, '.data');
const RUNNING = join(DATA, 'running.json');
/** A process that falls over is started again this often before the whole is given up. */
const RESTARTS = 5;

refuseSecondStart();
installPackages();
await buildAll();
const database = await startPostgres('dev');
const wantedPort = Number(process.env.PORT ?? 3000);
const port = await freePort(wantedPort);
if (port !== wantedPort) say(`Port ${wantedPort} is taken; using ${port}.`);
const address = `http://127.0.0.1:${port}`;
writeFileSync(RUNNING, JSON.stringify({ pid: process.pid, address }));

const env = {
  ...process.env,
  NODE_ENV: 'production',
  DATABASE_URL: database.url,
  PORT: String(port),
  NIGHTLATCH_DEMO: process.env.NIGHTLATCH_DEMO ?? '1',
};
let stopping = false;
let worker;
const api = keepRunning('api');
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => void stop(0));
if (!(await isReady(address))) {
  say('The API did not become ready: see the lines above.');
  await stop(1);
}
worker = keepRunning('worker');
await sayWelcome();

function refuseSecondStart() {
  mkdirSync(DATA, { recursive: true });
  if (!existsSync(RUNNING)) return;
  const { pid, address: where } = JSON.parse(readFileSync(RUNNING, 'utf8'));
  if (isAlive(pid))
    fail(`Nightlatch already runs at ${where} (process ${pid}); stop that one first.`);
}

function isAlive(pid) {
  try {
    process.kill(pid, 0);
  } catch {
    // No such process: what stands in the file is left over from a run that ended without warning.
    return false;
  }
  const line = existsSync(`/proc/${pid}/cmdline`)
    ? readFileSync(`/proc/${pid}/cmdline`, 'utf8')
    : 'start.mjs';
  return line.includes('start.mjs');
}

function keepRunning(name) {
  const process_ = { child: undefined, restarts: 0 };
  const launch = () => {
    const child = spawn(
      process.execPath,
      ['--enable-source-maps', join('dist', 'server', `${name}.js`)],
      {
        cwd: ROOT,
        env,
        // Its own group: Ctrl-C reaches this script alone, which then stops the parts in order.
        detached: true,
        stdio: ['ignore', 'inherit', 'inherit'],
      },
    );
    process_.child = child;
    child.once('exit', (code, signal) => {
      if (stopping) return;
      say(`The ${name} ended unexpectedly (${signal ?? `exit code ${code}`}).`);
      if (process_.restarts++ < RESTARTS) launch();
      else void stop(1);
    });
  };
  launch();
  return process_;
}

async function isReady(where) {
  for (let tries = 0; tries < 600 && !stopping && api.restarts <= 1; tries++) {
    const answer = await fetch(`${where}/ready`).catch(() => undefined);
    if (answer?.ok) return true;
    await new Promise((done) => setTimeout(done, 100));
  }
  return false;
}

async function sayWelcome() {
  const welcome = await (await fetch(`${address}/api/v1/welcome`)).json();
  say(`\nNightlatch is ready at ${address}\n`);
  if (welcome.needsFirstPerson) say('Open it to enter the first person of your shop.');
  if (welcome.demo.length > 0) say('Demo sign-ins:');
  for (const { email, password, roles } of welcome.demo) {
    say(`  ${email.padEnd(32)} ${password.padEnd(28)} ${roles.join(', ')}`);
  }
  say('\nCtrl-C stops it; the data stays.');
}

async function stop(code) {
  if (stopping) return;
  stopping = true;
  await Promise.all([worker, api].map((each) => end(each?.child)));
  await database.stop();
  rmSync(RUNNING, { force: true });
  process.exit(code);
}

async function end(child) {
  if (!child || child.exitCode !== null || child.signalCode !== null) return;
  const ended = new Promise((done) => child.once('exit', done));
  child.kill('SIGTERM');
  const patience = setTimeout(() => child.kill('SIGKILL'), 20_000);
  await ended;
  clearTimeout(patience);
}
