import type { DeathPoint } from '../config';

/** Called at each point of a check's course that a test may choose for the worker to die at. */
export interface Deaths {
  reached(at: Exclude<DeathPoint['at'], 'walk'>): Promise<void>;
  /** Between two chunks of the walk. */
  walked(lines: number): Promise<void>;
}

/** Outside tests there is no such point and this does nothing at all. */
export function dieAt(point: DeathPoint | undefined): Deaths {
  return {
    async reached(at) {
      if (point?.at === at) await die();
    },
    async walked(lines) {
      if (point?.at === 'walk' && point.lines <= lines) await die();
    },
  };
}

/** SIGKILL, which no handler sees: the process ends as in a power cut. Nothing runs after it. */
async function die(): Promise<never> {
  process.kill(process.pid, 'SIGKILL');
  return await new Promise<never>(() => undefined);
}
