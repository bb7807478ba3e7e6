import type { ProgramPage, ProgramQuery, ProgramRecord } from '#contracts';
import { select, selectOne, type StoreContext } from '../store-context';
import { readNewestChecks } from './check-record';

/**
 * Programs with their newest revision and how its newest checks stand: `labels` is what the page can
 * filter by, `worst` what it can sort by. Served by unique (program_id, number) and check_run_newest.
 */
const PROGRAMS = `
  from program
  cross join lateral (
    select * from program_revision where program_id = program.id order by number desc limit 1
  ) revision
  join program_text on program_text.id = revision.text_id
  left join person on person.id = revision.uploaded_by
  cross join lateral (
    select array_agg(label) as labels, array_agg(machine_id) as machines,
      coalesce(max(array_position(array['waiting', 'clear', 'failed', 'held', 'stopped'], label)), 0)
        as worst
    from (
      select distinct on (machine_id) machine_id,
        case state when 'done' then verdict when 'failed' then 'failed' else 'waiting' end as label
      from check_run
      where program_revision_id = revision.id
        and (cast(:machineId as uuid) is null or machine_id = :machineId)
      order by machine_id, asked_at desc, id desc
    ) newest
  ) standing
  where program.shop_id = :shopId
    and (:search = '' or 0 < position(lower(:search) in lower(program.name)))
    and (:verdict = '' or :verdict = any (labels))
    and (cast(:machineId as uuid) is null or machines is not null)`;

const SORT: Readonly<Record<ProgramQuery['sort'], string>> = {
  name: 'lower(program.name)',
  uploadedAt: 'revision.uploaded_at',
  lines: 'program_text.lines',
  verdict: 'standing.worst',
};

interface ProgramListing extends Omit<ProgramRecord, 'uploadedAt' | 'checks'> {
  readonly uploadedAt: Date;
}

export async function listPrograms(
  ctx: StoreContext,
  shopId: string,
  query: ProgramQuery,
): Promise<ProgramPage> {
  const { search, verdict, offset, limit, machineId = null } = query;
  const values = { shopId, search, verdict, machineId, offset, limit };
  const direction = query.direction === 'asc' ? 'asc' : 'desc';
  const rows = await select<ProgramListing>(
    ctx,
    `select program.id, program.name, revision.number as revision, revision.id as "revisionId",
       sha256, bytes::float8 as bytes, lines, person.name as "uploadedBy",
       revision.uploaded_at as "uploadedAt"
     ${PROGRAMS}
     order by ${SORT[query.sort]} ${direction}, program.id
     offset :offset limit :limit`,
    values,
  );
  const counted = await selectOne<{ total: number }>(
    ctx,
    `select count(*)::int as total ${PROGRAMS}`,
    values,
  );
  const checks = await readNewestChecks(
    ctx,
    shopId,
    rows.map((row) => row.revisionId),
  );
  const programs = rows.map((row) => ({
    ...row,
    uploadedAt: row.uploadedAt.toISOString(),
    checks: checks.filter((check) => check.programRevisionId === row.revisionId),
  }));
  return { programs, total: counted?.total ?? 0 };
}
