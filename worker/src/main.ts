import { startCheck } from '#engine';
import pino, { type Logger } from 'pino';
import { openCheckQueue } from '../../api/src/db/check-queue';
import { openDatabase } from '../../api/src/db/database';
import type { CheckRuns } from '../../api/src/db/stores/check-runs';
import { checkProgram } from './check-program/check-program';
import { dieAt } from './check-program/die-at';
import { readConfig, type Config } from './config';

/** A check under way may finish within this after a stop signal; then it is given back to the queue. */
const GRACE_MILLISECONDS = 5_000;
/** Giving a check back takes a few statements more. */
const LAST_MILLISECONDS = 5_000;
const POOL_SIZE = 4;

await start(readConfig());

async function start(config: Config): Promise<void> {
  const logger = pino({ level: config.logLevel, name: 'worker' });
  const url = config.databaseUrl;
  const onError = (error: Error) => logger.error({ err: error }, 'the check queue has a fault');
  const queue = await openCheckQueue({ url, onError });
  const database = openDatabase({
    url,
    queue,
    poolSize: POOL_SIZE,
    applicationName: 'nightlatch-worker',
  });
  await database.migrate();
  const { runs } = database.stores.checks;
  const stopping = new AbortController();
  const parts = {
    runs,
    startCheck,
    databaseUrl: url,
    logger,
    deaths: dieAt(config.dieAt),
    stopping: stopping.signal,
    now: () => performance.now(),
  };
  const sweeping = sweepNowAndThen(runs, logger, config.sweepSeconds);
  // Before the first check is taken: a signal that came sooner would end the process in the middle of it.
  onStopSignal(logger, async () => {
    const grace = setTimeout(() => stopping.abort(), GRACE_MILLISECONDS);
    await sweeping.stop();
    await queue.stop({ timeout: GRACE_MILLISECONDS + LAST_MILLISECONDS });
    clearTimeout(grace);
    await database.close();
  });
  await queue.work(config.pollSeconds, ({ checkId }) => checkProgram(parts, checkId));
  logger.info('the worker waits for checks');
}

/** Looks for checks that a dead worker left behind: at the start, and again and again after that. */
function sweepNowAndThen(
  runs: CheckRuns,
  logger: Logger,
  seconds: number,
): { stop(): Promise<void> } {
  let timer: NodeJS.Timeout | undefined;
  let isStopped = false;
  const sweep = async (): Promise<void> => {
    try {
      const requeued = await runs.requeueOrphans();
      if (0 < requeued.length) logger.warn({ requeued }, 'checks left behind are queued again');
    } catch (error) {
      // Expected while the database restarts; the next round finds the same checks.
      logger.error({ err: error }, 'checks left behind could not be looked for');
    }
    if (!isStopped) timer = setTimeout(next, seconds * 1000);
  };
  let current = sweep();
  function next(): void {
    current = sweep();
  }
  return {
    async stop() {
      isStopped = true;
      clearTimeout(timer);
      await current;
    },
  };
}

function onStopSignal(logger: Logger, stop: () => Promise<void>): void {
  let asked = false;
  const onSignal = (signal: NodeJS.Signals) => {
    if (asked) return;
    asked = true;
    logger.info({ signal }, 'the worker stops');
    stop().then(
      () => process.exit(0),
      (error: unknown) => {
        logger.fatal({ err: error }, 'the worker did not stop cleanly');
        process.exit(1);
      },
    );
  };
  process.on('SIGTERM', onSignal);
  process.on('SIGINT', onSignal);
}
