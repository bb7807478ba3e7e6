/**
 * `npm test`: lint, type check and every suite, on a throwaway PostgreSQL and Debian's Chromium, both
 * installed when missing and allowed. Its last line sums all suites. `--long` (npm run test:long) runs
 * the property and fuzz suites with their full counts.
 */
import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { buildAll } from './build.mjs';
import { findChromium, installOrSay, say } from './debian.mjs';
import { installPackages, ROOT } from './packages.mjs';
import { startPostgres } from './pg.mjs';

const REPORTS = join(ROOT, 'dist', 'test');
const long = process.argv.includes('--long');

installPackages();
if (!findChromium()) installOrSay('chromium', 'The browser tests need Chromium.');
rmSync(REPORTS, { recursive: true, force: true });
mkdirSync(REPORTS, { recursive: true });

const database = await startPostgres('test');
const env = {
  ...process.env,
  DATABASE_URL: database.url,
  NG_CLI_ANALYTICS: 'false',
  ...(long ? { NIGHTLATCH_LONG: '1' } : {}),
};
let running;
for (const signal of ['SIGINT', 'SIGTERM']) {
  process.on(signal, async () => {
    running?.kill(signal);
    await database.stop();
    process.exit(130);
  });
}

const total = { passed: 0, failed: 0, skipped: 0 };
await step('Lint', 'npm', ['run', '--silent', 'lint']);
await step('Type check', 'npm', ['run', '--silent', 'typecheck']);
await suite('Node', 'node.json', 'vitest', ['run', ...jsonReport('node.json')]);
await suite('Pages', 'web.json', 'ng', ['test', '--no-watch', '--no-progress']);
await buildAll({ always: true });
await suite('Browser', 'browser.json', 'vitest', [
  'run',
  ...['--config', 'vitest.browser.config.ts'],
  ...jsonReport('browser.json'),
]);
await database.stop();
process.exitCode = total.failed === 0 ? 0 : 1;
process.stdout.write(`${total.passed} passed, ${total.failed} failed, ${total.skipped} skipped\n`);

function jsonReport(file) {
  return ['--reporter=default', '--reporter=json', `--outputFile.json=${join(REPORTS, file)}`];
}

/** A step that is right or wrong as a whole counts as one. */
async function step(name, command, args) {
  const right = (await run(name, command, args)) === 0;
  total[right ? 'passed' : 'failed']++;
}

/** A suite whose runner fell over before writing its report, or failed outside a test, counts as failed. */
async function suite(name, file, command, args) {
  const code = await run(name, join(ROOT, 'node_modules', '.bin', command), args);
  const path = join(REPORTS, file);
  if (!existsSync(path)) {
    say(`${name}: the runner wrote no report.`);
    total.failed++;
    return;
  }
  const report = JSON.parse(readFileSync(path, 'utf8'));
  total.passed += report.numPassedTests;
  total.failed += report.numFailedTests;
  total.skipped += report.numPendingTests + (report.numTodoTests ?? 0);
  if (report.numTotalTests === 0 || (code !== 0 && report.numFailedTests === 0)) total.failed++;
}

async function run(name, command, args) {
  const began = Date.now();
  say(`\n${name} …`);
  running = spawn(command, args, { cwd: ROOT, env, stdio: ['ignore', 'inherit', 'inherit'] });
  const code = await new Promise((done) => {
    running.once('exit', (status) => done(status ?? 1));
    running.once('error', () => done(1));
  });
  say(
    `${name}: ${code === 0 ? 'right' : 'WRONG'} after ${Math.round((Date.now() - began) / 1000)} s`,
  );
  return code;
}
