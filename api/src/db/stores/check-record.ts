import type { CheckRecord, CheckState } from '#contracts';
import { select, selectOne, type StoreContext } from '../store-context';

type Verdict = 'stopped' | 'held' | 'clear';

/** A check as the contract shows it, one row each; callers add `where` and `order by`. */
const CHECKS = `
  select check_run.id, program.id as "programId", program.name as "programName",
    program_revision.number as "programRevision", program_revision.id as "programRevisionId",
    machine.id as "machineId", machine.name as "machineName", check_run.state,
    check_run.lines_read as "linesRead", program_text.lines, check_run.verdict,
    check_run.unattended_verdict as "unattendedVerdict", check_run.stop_count as "stopCount",
    check_run.hold_count as "holdCount", check_run.note_count as "noteCount",
    person.name as "askedBy", check_run.asked_at as "askedAt", check_run.started_at as "startedAt",
    check_run.finished_at as "finishedAt", check_run.failure,
    machine_revision.number as "machineRevision", rack_revision.number as "rackRevision",
    loading_revision.number as "loadingRevision", offset_revision.number as "offsetRevision",
    macro_revision.number as "macroRevision", setup_snapshot.sha256 as "setupSha256",
    (${outOfDate()}) as "outOfDate"
  from check_run
  join program_revision on program_revision.id = check_run.program_revision_id
  join program on program.id = program_revision.program_id
  join program_text on program_text.id = program_revision.text_id
  join machine on machine.id = check_run.machine_id
  join machine_revision on machine_revision.id = check_run.machine_revision_id
  join rack_revision on rack_revision.id = check_run.rack_revision_id
  join loading_revision on loading_revision.id = check_run.loading_revision_id
  join offset_revision on offset_revision.id = check_run.offset_revision_id
  left join macro_revision on macro_revision.id = check_run.macro_revision_id
  left join job_revision on job_revision.id = check_run.job_revision_id
  left join policy_revision on policy_revision.id = check_run.policy_revision_id
  join setup_snapshot on setup_snapshot.id = check_run.setup_snapshot_id
  left join person on person.id = check_run.asked_by`;

/**
 * Whether anything the check was held against has a newer revision. Each part is a probe of the unique
 * index on (owner, number). Of the tools only those count that the result rests on; while a check is
 * not done, any of them may.
 */
function outOfDate(): string {
  const newer = (table: string, column: string, owner: string, known: string) =>
    `exists (select 1 from ${table} newer
       where newer.${column} = ${owner} and coalesce(${known}, 0) < newer.number)`;
  return [
    newer('machine_revision', 'machine_id', 'machine.id', 'machine_revision.number'),
    newer('rack_revision', 'machine_id', 'machine.id', 'rack_revision.number'),
    newer('loading_revision', 'machine_id', 'machine.id', 'loading_revision.number'),
    newer('offset_revision', 'machine_id', 'machine.id', 'offset_revision.number'),
    newer('macro_revision', 'machine_id', 'machine.id', 'macro_revision.number'),
    newer('job_revision', 'program_id', 'program.id', 'job_revision.number'),
    newer('policy_revision', 'shop_id', 'check_run.shop_id', 'policy_revision.number'),
    `exists (
       select 1 from tool_revision newer
       left join (check_tool join tool_revision known on known.id = check_tool.tool_revision_id)
         on check_tool.check_id = check_run.id and known.tool_id = newer.tool_id
       where newer.shop_id = check_run.shop_id and coalesce(known.number, 0) < newer.number
         and (check_run.depends_on_tools is null
           or (newer.body->>'number')::int = any (check_run.depends_on_tools)
           or (known.body->>'number')::int = any (check_run.depends_on_tools)))`,
  ].join('\n or ');
}

interface CheckRow {
  readonly id: string;
  readonly programId: string;
  readonly programName: string;
  readonly programRevision: number;
  readonly programRevisionId: string;
  readonly machineId: string;
  readonly machineName: string;
  readonly state: CheckState;
  readonly linesRead: number;
  readonly lines: number;
  readonly verdict: Verdict | null;
  readonly unattendedVerdict: Verdict | null;
  readonly stopCount: number | null;
  readonly holdCount: number | null;
  readonly noteCount: number | null;
  readonly askedBy: string | null;
  readonly askedAt: Date;
  readonly startedAt: Date | null;
  readonly finishedAt: Date | null;
  readonly failure: string | null;
  readonly machineRevision: number;
  readonly rackRevision: number;
  readonly loadingRevision: number;
  readonly offsetRevision: number;
  readonly macroRevision: number | null;
  readonly setupSha256: string;
  readonly outOfDate: boolean;
}

export async function readCheck(
  ctx: StoreContext,
  shopId: string,
  id: string,
): Promise<CheckRecord | undefined> {
  const row = await selectOne<CheckRow>(
    ctx,
    `${CHECKS} where check_run.shop_id = :shopId and check_run.id = :id`,
    { shopId, id },
  );
  return row && asCheck(row);
}

/** The newest check of each of these program revisions on each machine, newest first. */
export async function readNewestChecks(
  ctx: StoreContext,
  shopId: string,
  revisionIds: readonly string[],
): Promise<CheckRecord[]> {
  if (revisionIds.length === 0) return [];
  const rows = await select<CheckRow>(
    ctx,
    // Served by check_run_newest.
    `${CHECKS}
     where check_run.shop_id = :shopId and check_run.id in (
       select distinct on (program_revision_id, machine_id) id from check_run
       where shop_id = :shopId and program_revision_id in (:revisionIds)
       order by program_revision_id, machine_id, asked_at desc, id desc)
     order by check_run.asked_at desc, check_run.id desc`,
    { shopId, revisionIds },
  );
  return rows.map(asCheck);
}

/** Every check of a program, newest first, `limit` at most. */
export async function readChecksOfProgram(
  ctx: StoreContext,
  shopId: string,
  programId: string,
  limit: number,
): Promise<CheckRecord[]> {
  const rows = await select<CheckRow>(
    ctx,
    `${CHECKS}
     where check_run.shop_id = :shopId and program.id = :programId
     order by check_run.asked_at desc, check_run.id desc limit :limit`,
    { shopId, programId, limit },
  );
  return rows.map(asCheck);
}

/** The checks that stand: the newest of each program's newest revision on each machine, newest first. */
export async function readStandingChecks(
  ctx: StoreContext,
  shopId: string,
): Promise<CheckRecord[]> {
  const rows = await select<CheckRow>(
    ctx,
    `${CHECKS}
     where check_run.shop_id = :shopId and check_run.id in (
       select newest.id from program
       cross join lateral (select id from program_revision where program_id = program.id
         order by number desc limit 1) revision
       cross join lateral (select distinct on (machine_id) id from check_run
         where program_revision_id = revision.id
         order by machine_id, asked_at desc, id desc) newest
       where program.shop_id = :shopId)
     order by check_run.asked_at desc, check_run.id desc`,
    { shopId },
  );
  return rows.map(asCheck);
}

function asCheck(row: CheckRow): CheckRecord {
  const { stopCount, holdCount, noteCount, askedAt, startedAt, finishedAt, ...rest } = row;
  const { machineRevision, rackRevision, loadingRevision, offsetRevision, ...others } = rest;
  const { macroRevision, setupSha256, ...check } = others;
  const counts =
    stopCount === null || holdCount === null || noteCount === null
      ? null
      : { stop: stopCount, hold: holdCount, note: noteCount };
  return {
    ...check,
    counts,
    askedAt: askedAt.toISOString(),
    startedAt: startedAt?.toISOString() ?? null,
    finishedAt: finishedAt?.toISOString() ?? null,
    against: {
      machineRevision,
      rackRevision,
      loadingRevision,
      offsetRevision,
      macroRevision,
      setupSha256,
    },
  };
}
