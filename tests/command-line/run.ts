import { spawnSync } from 'node:child_process';
import { join } from 'node:path';

export const ROOT = join(import.meta.dirname, '..', '..');

export interface Ran {
  readonly code: number | null;
  readonly out: string;
  readonly err: string;
}

/** Runs one of the commands as a real process, as `npm run --silent NAME -- …` does. */
export function run(name: 'check' | 'trace', ...words: readonly string[]): Ran {
  const script = join('api', 'launch', 'run-cli.mjs');
  const done = spawnSync(process.execPath, [script, name, ...words], {
    cwd: ROOT,
    encoding: 'utf8',
    maxBuffer: 64 * 1024 * 1024,
  });
  return { code: done.status, out: done.stdout, err: done.stderr };
}

export const story = (name: string) => [
  '--setup',
  `fixtures/programs/${name}/setup.json`,
  `fixtures/programs/${name}/program.nc`,
];
