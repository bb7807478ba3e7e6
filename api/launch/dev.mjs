/** `npm run dev`: the kept database, API and worker restarted on change, and the pages served by ng. */
import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { installPackages, ROOT } from './packages.mjs';
import { startPostgres } from './pg.mjs';

installPackages();
const database = await startPostgres('dev');
const commands = ['tsx watch api/src/main.ts', 'tsx watch worker/src/main.ts', 'ng serve'];
const child = spawn(
  join(ROOT, 'node_modules', '.bin', 'concurrently'),
  ['-k', '-n', 'api,worker,web', ...commands],
  {
    cwd: ROOT,
    stdio: 'inherit',
    env: { NIGHTLATCH_DEMO: '1', ...process.env, DATABASE_URL: database.url },
  },
);
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => child.kill(signal));
const code = await new Promise((done) => child.once('exit', (status) => done(status ?? 0)));
await database.stop();
process.exitCode = code;
