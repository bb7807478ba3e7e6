import type { Report, Setup, startCheck } from '#engine';
import type { PlanPath } from '#contracts';
import type { CheckToRun } from '../../../api/src/db/stores/check-runs';
import { buildPlanPath } from './plan-path';

/** The engine threw, or gave something that is no report: a fault of ours, and no verdict at all. */
export class EngineFault extends Error {
  constructor(
    readonly line: number,
    override readonly cause: unknown,
  ) {
    super(`The engine failed at line ${line}.`);
    this.name = 'EngineFault';
  }
}

export interface WalkOptions {
  readonly startCheck: typeof startCheck;
  /** Aborts between two chunks; the walk then rejects with the signal's reason. */
  readonly signal: AbortSignal;
  /** Called between two chunks with the lines read so far; never goes back. */
  readonly onProgress: (linesRead: number) => Promise<void>;
}
export interface Walked {
  readonly report: Report;
  readonly path: PlanPath;
}

/** Streams the program through the engine, again for as long as the check asks for it. */
export async function walkProgram(
  run: CheckToRun,
  setup: Setup,
  options: WalkOptions,
): Promise<Walked> {
  const { program } = run;
  let plan = buildPlanPath();
  const observe = () => {
    plan = buildPlanPath();
    return [plan.observer];
  };
  const check = options.startCheck(setup, { observe, digests: false });
  const guarded = <T>(step: () => T): T => {
    try {
      return step();
    } catch (error) {
      // Anything thrown here is a bug of the engine: it has no input that may make it throw.
      throw new EngineFault(check.linesRead, error);
    }
  };
  let farthest = 0;
  const readOnce = async (): Promise<'done' | 'read-again'> => {
    for await (const bytes of run.text()) {
      options.signal.throwIfAborted();
      guarded(() => check.push(bytes));
      farthest = Math.max(farthest, check.linesRead);
      await options.onProgress(farthest);
    }
    options.signal.throwIfAborted();
    if (check.bytesRead !== program.bytes) {
      throw new Error(`${check.bytesRead} of ${program.bytes} bytes of the program could be read.`);
    }
    return guarded(() => check.endOfText());
  };
  while ((await readOnce()) === 'read-again');
  const { name, sha256 } = program;
  return { report: guarded(() => check.report({ name, sha256 })), path: plan.result() };
}
