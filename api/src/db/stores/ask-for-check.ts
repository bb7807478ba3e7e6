import { canonicalJson, sha256Hex } from '#engine';
import { policySchema, type ValidSetup } from '#contracts';
import type { CheckCause } from '../models/checks';
import { announce } from '../progress-channel';
import { select, selectOne, type BoundContext } from '../store-context';
import { missing } from '../store-refusal';
import { buildSetup, type StandingTool } from './build-setup';
import { readStanding, type MachineStanding } from './machine-standing';
import { openProgramStore, readRevision } from './program-store';
import { openToolStore } from './tool-store';

export interface CheckRequest {
  readonly programRevisionId: string;
  readonly machineId: string;
  readonly askedBy: string | null;
  readonly cause: CheckCause;
}

/**
 * Puts the setup together as it stands, keeps it as a snapshot, makes the check and sends its job,
 * all in one transaction: there is never a check without its job, nor a job without its check.
 */
export async function askForCheck(
  ctx: BoundContext,
  shopId: string,
  request: CheckRequest,
): Promise<string> {
  const { programRevisionId, machineId, askedBy, cause } = request;
  const revision = await readRevision(ctx, shopId, programRevisionId);
  if (!revision) throw missing('program revision');
  const standing = await readStanding(ctx, shopId, machineId);
  if (!standing) throw missing('machine');
  const tools = await openToolStore(ctx).standing(shopId);
  const policy = await readPolicy(ctx, shopId);
  const job = await openProgramStore(ctx).job(shopId, revision.programId);
  const setup = buildSetup({
    standing,
    tools,
    policy: policy.body,
    job: job.job ?? undefined,
    asOf: await momentOfAsking(ctx),
  });
  const row = await ctx.models.checkRun.create(
    {
      shopId,
      programRevisionId,
      machineId,
      setupSnapshotId: await keepSnapshot(ctx, shopId, setup),
      ...revisionKeys(standing),
      jobRevisionId: job.id,
      policyRevisionId: policy.id,
      askedBy,
      cause,
    },
    { transaction: ctx.transaction },
  );
  await keepTools(ctx, row.id, tools);
  await sendJob(ctx, row.id, cause);
  await announce(ctx, {
    shopId,
    checkId: row.id,
    state: 'queued',
    linesRead: 0,
    lines: revision.lines,
    verdict: null,
  });
  return row.id;
}

/** Sends a job for the check in this transaction and keeps its id with the check. */
export async function sendJob(
  { models, queue, sequelize, transaction }: BoundContext,
  checkId: string,
  cause: CheckCause,
): Promise<void> {
  if (!queue) throw new Error('This process was opened without a queue and cannot ask for checks.');
  const urgency = cause === 'loading-changed' ? 'background' : 'asked';
  const jobId = await queue.send({ checkId }, urgency, { sequelize, transaction });
  await models.checkRun.update({ jobId }, { where: { id: checkId }, transaction });
}

/**
 * The programs whose standing check on this machine is put in question by a change there: the newest
 * revision of each program that was ever checked on it.
 */
export async function revisionsCheckedOn(
  ctx: BoundContext,
  shopId: string,
  machineId: string,
): Promise<string[]> {
  const rows = await select<{ id: string }>(
    ctx,
    `select revision.id from program
     cross join lateral (select id from program_revision where program_id = program.id
       order by number desc limit 1) revision
     where program.shop_id = :shopId and exists (
       select 1 from check_run
       where program_revision_id = revision.id and machine_id = :machineId)
     order by program.name`,
    { shopId, machineId },
  );
  return rows.map((row) => row.id);
}

function revisionKeys(standing: MachineStanding) {
  return {
    machineRevisionId: standing.revision.id,
    rackRevisionId: standing.rackRevision.id,
    loadingRevisionId: standing.loadingRevision.id,
    offsetRevisionId: standing.offsetRevision.id,
    macroRevisionId: standing.macroRevision?.id ?? null,
  };
}

/** The database's clock, the same moment that the check's `asked_at` gets. */
async function momentOfAsking(ctx: BoundContext): Promise<string> {
  const row = await selectOne<{ now: Date }>(ctx, 'select now() as now');
  if (!row) throw new Error('The database gave no time.');
  return row.now.toISOString();
}

async function readPolicy(
  { models, transaction }: BoundContext,
  shopId: string,
): Promise<{ id: string | null; body: ValidSetup['policy'] }> {
  const row = await models.policyRevision.findOne({
    where: { shopId },
    order: [['number', 'desc']],
    transaction,
  });
  return row ?? { id: null, body: policySchema.parse({}) };
}

/** Each content once per shop; its hash is the one that the report names. */
async function keepSnapshot(ctx: BoundContext, shopId: string, setup: ValidSetup): Promise<string> {
  const body = canonicalJson(setup);
  const sha256 = sha256Hex(body);
  await select(
    ctx,
    `insert into setup_snapshot (shop_id, sha256, body) values (:shopId, :sha256, :body)
     on conflict (shop_id, sha256) do nothing returning id`,
    { shopId, sha256, body },
  );
  const row = await selectOne<{ id: string }>(
    ctx,
    'select id from setup_snapshot where shop_id = :shopId and sha256 = :sha256',
    { shopId, sha256 },
  );
  if (!row) throw new Error('The setup snapshot was not kept.');
  return row.id;
}

async function keepTools(
  { models, transaction }: BoundContext,
  checkId: string,
  tools: readonly StandingTool[],
): Promise<void> {
  await models.checkTool.bulkCreate(
    tools.map((tool) => ({ checkId, toolRevisionId: tool.revisionId })),
    { transaction },
  );
}
