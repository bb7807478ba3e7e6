import type { CheckCause } from '../models/checks';
import { announce } from '../progress-channel';
import { readBytes } from '../program-text/read-text';
import {
  select,
  selectOne,
  together,
  type BoundContext,
  type StoreContext,
} from '../store-context';
import { sendJob } from './ask-for-check';
import { saveResult, type CheckResult } from './save-result';

/** A check as a worker takes it up: the setup as it was kept, the program by name and size. */
export interface CheckToRun {
  readonly checkId: string;
  readonly shopId: string;
  /** As it was kept; whoever uses it parses it, for a later contract may refuse it. */
  readonly setup: unknown;
  readonly program: {
    readonly name: string;
    readonly sha256: string;
    readonly bytes: number;
    readonly lines: number;
  };
  /** The program's bytes from the start, one stored chunk at a time; may be asked for again. */
  text(): AsyncIterable<Uint8Array>;
}

/**
 * What a worker does to a check. A job names its check alone, so these methods are the only ones that
 * do not ask for the shop: they read the check's own row and what it points at.
 */
export interface CheckRuns {
  /** Marks it running and hands it out; undefined when it is finished already or is not there. */
  begin(checkId: string): Promise<CheckToRun | undefined>;
  /** Tells listeners how far the walk is. */
  tell(run: CheckToRun, linesRead: number): Promise<void>;
  /** Keeps how far the walk is, for a page that is opened in between. */
  keepProgress(checkId: string, linesRead: number): Promise<void>;
  /** Whether this call saved the result; false when the check was finished before. */
  save(checkId: string, result: CheckResult, beforeCommit?: () => Promise<void>): Promise<boolean>;
  /** A worker that was asked to stop leaves it to the next one; that was no failed attempt. */
  giveBack(checkId: string): Promise<void>;
  /** Marks it failed, with a sentence for the person who asked. */
  fail(checkId: string, sentence: string): Promise<void>;
  /** Checks that nobody works on although they are not finished get a new job; their ids. */
  requeueOrphans(): Promise<string[]>;
}

/** A check that ended its worker this often is given up: it would end every worker, for ever. */
export const MOST_ATTEMPTS = 10;
/** A worker claims a check within moments of taking its job; one that has not by then is dead. */
const TAKEN_SECONDS = 30;

export function openCheckRuns(ctx: StoreContext): CheckRuns {
  return {
    begin: (checkId) => together(ctx, (bound) => begin(ctx, bound, checkId)),
    async tell({ checkId, shopId, program }, linesRead) {
      const { lines } = program;
      await announce(ctx, { shopId, checkId, state: 'running', linesRead, lines, verdict: null });
    },
    async keepProgress(checkId, linesRead) {
      await select(
        ctx,
        `update check_run set lines_read = :linesRead
         where id = :checkId and state = 'running' returning id`,
        { checkId, linesRead },
      );
    },
    save: (checkId, result, beforeCommit) =>
      together(ctx, async (bound) => {
        const isNew = await saveResult(bound, checkId, result);
        await beforeCommit?.();
        return isNew;
      }),
    giveBack: (checkId) => together(ctx, (bound) => giveBack(bound, checkId)),
    fail: (checkId, sentence) => together(ctx, (bound) => fail(bound, checkId, sentence)),
    requeueOrphans: () => requeueOrphans(ctx),
  };
}

interface RunRow {
  readonly shopId: string;
  readonly name: string;
  readonly textId: string;
  readonly sha256: string;
  readonly bytes: number;
  readonly lines: number;
  readonly attempts: number;
  readonly setup: unknown;
}

async function begin(
  ctx: StoreContext,
  bound: BoundContext,
  checkId: string,
): Promise<CheckToRun | undefined> {
  const row = await selectOne<RunRow>(
    bound,
    `update check_run set state = 'running', started_at = coalesce(started_at, now()),
       attempts = attempts + 1, lines_read = 0
     from program_revision
     join program on program.id = program_revision.program_id
     join program_text on program_text.id = program_revision.text_id,
     setup_snapshot
     where check_run.id = :checkId and check_run.state in ('queued', 'running')
       and program_revision.id = check_run.program_revision_id
       and setup_snapshot.id = check_run.setup_snapshot_id
     returning check_run.shop_id as "shopId", program.name, program_text.id as "textId",
       program_text.sha256, program_text.bytes::float8 as bytes, program_text.lines,
       check_run.attempts, setup_snapshot.body as setup`,
    { checkId },
  );
  if (!row) return undefined;
  if (MOST_ATTEMPTS < row.attempts) {
    await fail(bound, checkId, WORKERS_ENDED);
    return undefined;
  }
  const { shopId, name, sha256, bytes, lines, textId, setup } = row;
  return {
    checkId,
    shopId,
    setup,
    program: { name, sha256, bytes, lines },
    text: () => readBytes(ctx, textId),
  };
}

const WORKERS_ENDED =
  `The check was begun ${MOST_ATTEMPTS} times and each time the worker ended before it was done. ` +
  'Nothing is known about this program: do not run it unproven. Ask for the check again once the server ' +
  'has been looked at.';

async function fail(ctx: BoundContext, checkId: string, sentence: string): Promise<void> {
  const row = await selectOne<{ shopId: string; linesRead: number; lines: number }>(
    ctx,
    `update check_run set state = 'failed', finished_at = now(), failure = :sentence
     from program_revision join program_text on program_text.id = program_revision.text_id
     where check_run.id = :checkId and state in ('queued', 'running')
       and program_revision.id = program_revision_id
     returning check_run.shop_id as "shopId", lines_read as "linesRead", lines`,
    { checkId, sentence },
  );
  if (row) await announce(ctx, { ...row, checkId, state: 'failed', verdict: null });
}

async function giveBack(ctx: BoundContext, checkId: string): Promise<void> {
  const row = await selectOne<{ cause: CheckCause }>(
    ctx,
    `update check_run set state = 'queued', attempts = attempts - 1, lines_read = 0
     where id = :checkId and state = 'running' returning cause`,
    { checkId },
  );
  if (row) await sendJob(ctx, checkId, row.cause);
}

async function requeueOrphans(ctx: StoreContext): Promise<string[]> {
  // Served by check_run_unfinished.
  const unfinished = await select<{ id: string }>(
    ctx,
    `select id from check_run where state in ('queued', 'running') order by asked_at`,
  );
  const requeued: string[] = [];
  for (const { id } of unfinished) {
    if (await together(ctx, (bound) => requeueOrphan(bound, id))) requeued.push(id);
  }
  return requeued;
}

interface OrphanRow {
  readonly state: 'queued' | 'running';
  readonly jobId: string | null;
  readonly cause: CheckCause;
}

/** Whether the check was without a worker and has a new job now. */
async function requeueOrphan(ctx: BoundContext, checkId: string): Promise<boolean> {
  const row = await selectOne<OrphanRow>(
    ctx,
    `select state, job_id as "jobId", cause from check_run
     where id = :checkId and state in ('queued', 'running') for update skip locked`,
    { checkId },
  );
  if (!row || !(await isUnclaimed(ctx, checkId))) return false;
  if (row.state === 'queued' && (await hasLiveJob(ctx, row.jobId))) return false;
  if (row.jobId !== null) await ctx.queue?.cancel(row.jobId);
  await select(ctx, `update check_run set state = 'queued' where id = :checkId returning id`, {
    checkId,
  });
  await sendJob(ctx, checkId, row.cause);
  return true;
}

/** A worker holds the lock of its check on a connection of its own: no lock, no living worker. */
async function isUnclaimed(ctx: BoundContext, checkId: string): Promise<boolean> {
  const row = await selectOne<{ free: boolean }>(
    ctx,
    `select pg_try_advisory_xact_lock(hashtextextended(:key, 0)) as free`,
    { key: claimKey(checkId) },
  );
  return row?.free ?? false;
}

async function hasLiveJob(ctx: BoundContext, jobId: string | null): Promise<boolean> {
  if (jobId === null || !ctx.queue) return false;
  const job = await ctx.queue.standing(jobId);
  if (job.state === 'waiting') return true;
  if (job.state === 'over') return false;
  const row = await selectOne<{ fresh: boolean }>(
    ctx,
    'select :since::timestamptz > now() - make_interval(secs => :seconds) as fresh',
    { since: job.since.toISOString(), seconds: TAKEN_SECONDS },
  );
  return row?.fresh ?? false;
}

/** What the advisory lock of a check is made of. */
export function claimKey(checkId: string): string {
  return `check_run ${checkId}`;
}
