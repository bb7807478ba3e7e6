import { promisify } from 'node:util';
import { gunzip } from 'node:zlib';
import {
  reportSchema,
  type Bench,
  type CheckDetails,
  type CheckProgress,
  type CheckRecord,
  type FindingPage,
  type FindingQuery,
  type PlanPath,
  type ReportDocument,
  type ReportSummary,
} from '#contracts';
import { select, selectOne, together, type StoreContext } from '../store-context';
import { askForCheck, revisionsCheckedOn, type CheckRequest } from './ask-for-check';
import { readBench } from './bench-view';
import { readCheck } from './check-record';
import { openCheckRuns, type CheckRuns } from './check-runs';
import { asFinding, type FindingColumns } from './finding-rows';

const expand = promisify(gunzip);

export interface CheckStore {
  /** Makes the check and sends its job in the same transaction. */
  ask(shopId: string, request: CheckRequest): Promise<CheckRecord>;
  /** After the loading changed, in its transaction: every program ever checked there is checked again. */
  askAgainOn(
    shopId: string,
    machineId: string,
    request: { readonly askedBy: string | null },
  ): Promise<CheckRecord[]>;
  find(shopId: string, id: string): Promise<CheckRecord | undefined>;
  details(shopId: string, id: string): Promise<CheckDetails | undefined>;
  /** In report order; empty until the check is done. */
  findings(shopId: string, id: string, query: FindingQuery): Promise<FindingPage | undefined>;
  /** The whole report document; undefined too while the check is not done. */
  report(shopId: string, id: string): Promise<ReportDocument | undefined>;
  /** Undefined too while the check is not done. */
  path(shopId: string, id: string): Promise<PlanPath | undefined>;
  progress(shopId: string, id: string): Promise<CheckProgress | undefined>;
  bench(shopId: string): Promise<Bench>;
  /** The worker's side of a check. */
  readonly runs: CheckRuns;
}

export function openCheckStore(ctx: StoreContext): CheckStore {
  const ask = (shopId: string, request: CheckRequest) =>
    together(ctx, async (bound) => {
      const id = await askForCheck(bound, shopId, request);
      const check = await readCheck(bound, shopId, id);
      if (!check) throw new Error('The check just made is not there.');
      return check;
    });
  return {
    ask,
    askAgainOn: (shopId, machineId, { askedBy }) =>
      together(ctx, async (bound) => {
        const store = openCheckStore(bound);
        const checks: CheckRecord[] = [];
        for (const programRevisionId of await revisionsCheckedOn(bound, shopId, machineId)) {
          const cause = 'loading-changed';
          checks.push(await store.ask(shopId, { programRevisionId, machineId, askedBy, cause }));
        }
        return checks;
      }),
    find: (shopId, id) => readCheck(ctx, shopId, id),
    details: (shopId, id) => readDetails(ctx, shopId, id),
    findings: (shopId, id, query) => readFindings(ctx, shopId, id, query),
    report: (shopId, id) => readReport(ctx, shopId, id),
    path: (shopId, id) => readPath(ctx, shopId, id),
    async progress(shopId, id) {
      return await selectOne<CheckProgress>(
        ctx,
        `select check_run.id as "checkId", state, lines_read as "linesRead", lines, verdict
         from check_run
         join program_revision on program_revision.id = program_revision_id
         join program_text on program_text.id = text_id
         where check_run.shop_id = :shopId and check_run.id = :id`,
        { shopId, id },
      );
    },
    bench: (shopId) => readBench(ctx, shopId),
    runs: openCheckRuns(ctx),
  };
}

interface DetailColumns {
  readonly summary: ReportSummary | null;
  readonly setup: unknown;
  readonly sha256: string;
  readonly newestRevision: number;
}

async function readDetails(
  ctx: StoreContext,
  shopId: string,
  id: string,
): Promise<CheckDetails | undefined> {
  const check = await readCheck(ctx, shopId, id);
  const row = await selectOne<DetailColumns>(
    ctx,
    `select summary, setup_snapshot.body as setup, program_text.sha256,
       (select max(number) from program_revision newer
        where newer.program_id = program_revision.program_id) as "newestRevision"
     from check_run
     join setup_snapshot on setup_snapshot.id = setup_snapshot_id
     join program_revision on program_revision.id = program_revision_id
     join program_text on program_text.id = text_id
     where check_run.shop_id = :shopId and check_run.id = :id`,
    { shopId, id },
  );
  return check && row && { check, ...row };
}

async function readFindings(
  ctx: StoreContext,
  shopId: string,
  id: string,
  { severity, tool, rule, offset = 0, limit = 2000 }: FindingQuery,
): Promise<FindingPage | undefined> {
  if (!(await readCheck(ctx, shopId, id))) return undefined;
  const filter = { severity: severity ?? null, tool: tool ?? null, rule: rule ?? null };
  const values = { shopId, id, ...filter, offset, limit };
  // Served by unique (check_id, ordinal).
  const from = `
    from finding join check_run on check_run.id = check_id
    where check_run.shop_id = :shopId and check_id = :id
      and (cast(:severity as text) is null or severity = :severity)
      and (cast(:tool as integer) is null or tool = :tool)
      and (cast(:rule as text) is null or rule = :rule)`;
  const rows = await select<FindingColumns>(
    ctx,
    `select finding.* ${from} order by ordinal offset :offset limit :limit`,
    values,
  );
  const counted = await selectOne<{ total: number }>(
    ctx,
    `select count(*)::int as total ${from}`,
    values,
  );
  return { findings: rows.map(asFinding), total: counted?.total ?? 0 };
}

async function readReport(
  ctx: StoreContext,
  shopId: string,
  id: string,
): Promise<ReportDocument | undefined> {
  const run = await selectOne<{ summary: ReportSummary | null }>(
    ctx,
    'select summary from check_run where shop_id = :shopId and id = :id',
    { shopId, id },
  );
  if (!run?.summary) return undefined;
  const rows = await select<FindingColumns>(
    ctx,
    'select * from finding where check_id = :id order by ordinal',
    { id },
  );
  const findings = rows.map(asFinding).map(({ id: _, ...finding }) => finding);
  return inContractOrder({ ...run.summary, findings });
}

/** Findings stand between `unattended` and `tools`, as the engine writes a report. */
function inContractOrder(report: ReportDocument): ReportDocument {
  const { format, version, engine, program, setup, verdict, counts, unattended } = report;
  const { findings, ...rest } = reportSchema.parse(report);
  const head = { format, version, engine, program, setup, verdict, counts, unattended, findings };
  return { ...head, ...rest };
}

async function readPath(
  ctx: StoreContext,
  shopId: string,
  id: string,
): Promise<PlanPath | undefined> {
  const row = await selectOne<{ tolerance: number; truncated: boolean; runs: Buffer }>(
    ctx,
    `select tolerance, truncated, runs from check_path
     join check_run on check_run.id = check_id
     where check_run.shop_id = :shopId and check_id = :id`,
    { shopId, id },
  );
  if (!row) return undefined;
  // Only saveResult writes this column, from a PlanPath.
  const runs = JSON.parse((await expand(row.runs)).toString('utf8')) as PlanPath['runs'];
  return { tolerance: row.tolerance, truncated: row.truncated, runs };
}
