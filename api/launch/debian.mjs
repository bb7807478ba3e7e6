/** What the launch scripts need of Debian: find a program, or install its package when allowed to. */
import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import { getuid } from 'node:process';

export const isRoot = getuid?.() === 0;
let listsAreFresh = false;

/** Installs a Debian package, or says in one sentence what to do and ends the process. */
export function installOrSay(pkg, why) {
  if (!isRoot || !existsSync('/usr/bin/apt-get')) {
    fail(`${why} Install it with "apt-get install ${pkg}" as root, then run this command again.`);
  }
  say(`Installing ${pkg} from Debian's packages …`);
  if (!listsAreFresh) {
    apt(['update']);
    listsAreFresh = true;
  }
  if (!apt(['install', '-y', '--no-install-recommends', pkg])) {
    fail(`${pkg} could not be installed. ${why} See the lines above for Debian's reason.`);
  }
}

function apt(args) {
  const done = spawnSync('apt-get', ['-qq', ...args], {
    stdio: ['ignore', 'ignore', 'inherit'],
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
  });
  return done.status === 0;
}

const POSTGRES_HOME = '/usr/lib/postgresql';
/** The newest PostgreSQL server of Debian's: its folder of programs and its major version. */
export function findPostgres() {
  const versions = existsSync(POSTGRES_HOME)
    ? readdirSync(POSTGRES_HOME).filter((v) => existsSync(`${POSTGRES_HOME}/${v}/bin/postgres`))
    : [];
  const version = versions.sort((a, b) => Number(b) - Number(a))[0];
  return version ? { version, bin: `${POSTGRES_HOME}/${version}/bin` } : undefined;
}

export function findChromium() {
  return ['/usr/bin/chromium', '/usr/bin/chromium-browser'].find((path) => existsSync(path));
}

export function say(sentence) {
  process.stderr.write(`${sentence}\n`);
}

export function fail(sentence) {
  say(sentence);
  process.exit(1);
}
