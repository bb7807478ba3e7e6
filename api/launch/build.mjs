/** Builds web and server when a source is newer than what was built last. */
import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync, statSync, utimesSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fail, say } from './debian.mjs';
import { ROOT } from './packages.mjs';

const SOURCES = ['api', 'worker', 'shared', 'web', 'fixtures', 'package-lock.json', 'angular.json'];
const STAMP = join(ROOT, 'dist', 'built');

export async function buildAll({ always = false } = {}) {
  const newest = Math.max(...SOURCES.map((each) => newestChange(join(ROOT, each))));
  if (!always && existsSync(STAMP) && newest <= statSync(STAMP).mtimeMs) return;
  say('Building …');
  const ng = join(ROOT, 'node_modules', '.bin', 'ng');
  const web = spawnSync(ng, ['build', '--no-progress'], {
    cwd: ROOT,
    stdio: ['ignore', 'ignore', 'inherit'],
  });
  if (web.status !== 0) fail('The pages could not be built: see the lines above.');
  // esbuild is itself one of the packages, so it is loaded only now that they are there.
  const { buildServer } = await import('./build-server.mjs');
  await buildServer();
  writeFileSync(STAMP, '');
  utimesSync(STAMP, new Date(), new Date(newest));
}

function newestChange(path) {
  const found = statSync(path);
  if (!found.isDirectory()) return found.mtimeMs;
  return Math.max(0, ...readdirSync(path).map((name) => newestChange(join(path, name))));
}
