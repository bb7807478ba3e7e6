import { once } from 'node:events';
import { createServer, type Server } from 'node:http';
import { buildApp } from './app';
import { openProgressFeed } from './checks/progress-feed';
import { readConfig, type Config } from './config';
import { openCheckQueue } from './db/check-queue';
import { openDatabase } from './db/database';
import { seedDemo } from './demo/seed-demo';
import type { Dependencies } from './dependencies';
import { openLog, type Logger } from './http/request-log';
import { openTurnstile } from './programs/turnstile';
import { openPasswords } from './sessions/passwords';
import { countAttempts } from './sessions/sign-in-attempts';
import { keepTokenSecret } from './sessions/token-secret';

/** Uploads hold a connection each; the rest of the pool is for everyone else. */
const UPLOADS_AT_ONCE = 6;
const POOL_SIZE = 16;
/** A 256 MB file over a slow shop network takes minutes, not the five that Node allows. */
const REQUEST_MILLISECONDS = 30 * 60 * 1000;
/** What is under way at a stop may finish within this; then connections are cut. */
const GRACE_MILLISECONDS = 8_000;

await start(readConfig());

async function start(config: Config): Promise<void> {
  const logger = openLog(config.logLevel);
  const onError = (error: unknown) => logger.error({ err: error }, 'the check queue has a fault');
  const queue = await openCheckQueue({ url: config.databaseUrl, onError });
  const database = openDatabase({
    url: config.databaseUrl,
    poolSize: POOL_SIZE,
    queue,
    applicationName: 'nightlatch-api',
  });
  await database.migrate();
  let isStopping = false;
  const now = () => new Date();
  const passwords = await openPasswords();
  const feed = await openProgressFeed(config.databaseUrl, logger);
  const deps: Dependencies = {
    config,
    logger,
    database,
    queue,
    feed,
    passwords,
    attempts: countAttempts(),
    uploads: openTurnstile(UPLOADS_AT_ONCE),
    tokenSecret: await keepTokenSecret(config),
    demoSignIns: config.demo ? await seedDemo({ config, database, passwords, now }) : [],
    isStopping: () => isStopping,
    now,
  };
  const server = createServer(buildApp(deps));
  server.requestTimeout = REQUEST_MILLISECONDS;
  const port = await listen(server, config.port);
  logger.info({ port }, 'the API listens on 127.0.0.1');

  onStopSignal(logger, async () => {
    isStopping = true;
    await feed.stop();
    await closeServer(server);
    await queue.stop();
    await database.close();
  });
}

/** Loopback only: whoever wants it on a network puts a proxy with TLS before it. */
async function listen(server: Server, port: number): Promise<number> {
  server.listen(port, '127.0.0.1');
  await once(server, 'listening');
  const address = server.address();
  return typeof address === 'object' && address ? address.port : port;
}

function onStopSignal(logger: Logger, stop: () => Promise<void>): void {
  let asked = false;
  const onSignal = (signal: NodeJS.Signals) => {
    if (asked) return;
    asked = true;
    logger.info({ signal }, 'stopping');
    stop().then(
      () => process.exit(0),
      (error: unknown) => {
        logger.fatal({ err: error }, 'the stop failed');
        process.exit(1);
      },
    );
  };
  process.on('SIGTERM', onSignal);
  process.on('SIGINT', onSignal);
}

async function closeServer(server: Server): Promise<void> {
  const closed = once(server, 'close');
  server.close();
  server.closeIdleConnections();
  const cut = setTimeout(() => server.closeAllConnections(), GRACE_MILLISECONDS);
  await closed;
  clearTimeout(cut);
}
