import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';

/** A real worker process on a real database. */
export interface WorkerProcess {
  readonly child: ChildProcess;
  /** What it wrote to its log so far. */
  log(): string;
  /** Resolves when the log holds `words`, rejects when the process ends before. */
  says(words: string): Promise<void>;
  /** How it ended: an exit code, or the signal that ended it. */
  readonly ended: Promise<number | NodeJS.Signals>;
  stop(signal?: NodeJS.Signals): Promise<number | NodeJS.Signals>;
}

/** `settings` are added to its environment; sweeps and polls are as quick as they may be. */
export function startWorker(
  databaseUrl: string,
  settings: Readonly<Record<string, string>> = {},
): WorkerProcess {
  const child = spawn(process.execPath, ['--import', 'tsx', 'worker/src/main.ts'], {
    env: {
      ...process.env,
      DATABASE_URL: databaseUrl,
      NIGHTLATCH_LOG: 'info',
      NIGHTLATCH_SWEEP_SECONDS: '0.2',
      ...settings,
    },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let log = '';
  const listeners = new Set<() => void>();
  const gather = (piece: Buffer): void => {
    log += piece.toString('utf8');
    for (const listener of listeners) listener();
  };
  child.stdout.on('data', gather);
  child.stderr.on('data', gather);
  const ended = once(child, 'exit').then(([code, signal]) => (code ?? signal) as number);
  return {
    child,
    ended,
    log: () => log,
    says: (words) =>
      new Promise((resolve, reject) => {
        const look = (): void => {
          if (log.includes(words)) resolve();
        };
        listeners.add(look);
        void ended.then((how) => reject(new Error(`The worker ended (${how}):\n${log}`)));
        look();
      }),
    async stop(signal = 'SIGTERM') {
      child.kill(signal);
      return await ended;
    },
  };
}
