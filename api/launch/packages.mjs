/** Installs the packages of package-lock.json when they are missing or older than the lock. */
import { spawnSync } from 'node:child_process';
import { existsSync, statSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { fail, say } from './debian.mjs';

export const ROOT = resolve(import.meta.dirname, '../..');

export function installPackages() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major !== 20 || minor < 19) {
    fail(
      `Nightlatch runs on Node.js 20.19 or newer of the 20 line; this is ${process.versions.node}.`,
    );
  }
  const installed = join(ROOT, 'node_modules', '.package-lock.json');
  const lock = join(ROOT, 'package-lock.json');
  if (existsSync(installed) && statSync(lock).mtimeMs <= statSync(installed).mtimeMs) return;
  say('Installing packages …');
  const done = spawnSync('npm', ['ci', '--no-audit', '--no-fund'], {
    cwd: ROOT,
    stdio: ['ignore', 'ignore', 'inherit'],
  });
  if (done.status !== 0) {
    fail(
      'The packages could not be installed: see the lines above, mend the connection to your npm registry, and run this command again.',
    );
  }
}
