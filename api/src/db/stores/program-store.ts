import type {
  LineRange,
  ProgramDetails,
  ProgramPage,
  ProgramQuery,
  ProgramRecord,
  ValidSetup,
} from '#contracts';
import { readBytes, readLines } from '../program-text/read-text';
import { writeText, type StoredText } from '../program-text/write-text';
import {
  inTransaction,
  select,
  selectOne,
  together,
  type BoundContext,
  type StoreContext,
} from '../store-context';
import { missing } from '../store-refusal';
import { readChecksOfProgram, readNewestChecks } from './check-record';
import { listPrograms } from './program-page';
import { newestRevision, nextNumber } from './revision-rows';

type Job = NonNullable<ValidSetup['job']>;

export interface NewProgramRevision {
  /** What the program is called in the shop; the same name makes a further revision of it. */
  readonly name: string;
  readonly textId: string;
  /** The file's name as sent, for display. */
  readonly originalName: string;
  readonly uploadedBy: string | null;
}
export interface AddedRevision {
  readonly programId: string;
  readonly revisionId: string;
  readonly revision: number;
  /** Whether the newest revision had exactly these bytes already: nothing was added. */
  readonly unchanged: boolean;
}
export interface RevisionOfProgram {
  readonly id: string;
  readonly programId: string;
  readonly programName: string;
  readonly number: number;
  readonly textId: string;
  readonly sha256: string;
  readonly bytes: number;
  readonly lines: number;
  readonly originalName: string;
}
export interface ProgramStore {
  /** Call it inside a transaction with what belongs to it; memory stays small whatever the size. */
  writeText(shopId: string, source: AsyncIterable<Uint8Array>): Promise<StoredText>;
  addRevision(shopId: string, revision: NewProgramRevision): Promise<AddedRevision>;
  list(shopId: string, query: ProgramQuery): Promise<ProgramPage>;
  details(shopId: string, id: string): Promise<ProgramDetails | undefined>;
  revision(shopId: string, revisionId: string): Promise<RevisionOfProgram | undefined>;
  /** Lines `from` to `to`, both included; reads only the chunks they stand in. */
  lines(
    shopId: string,
    revisionId: string,
    range: { readonly from: number; readonly to: number },
  ): Promise<LineRange | undefined>;
  /** The bytes as stored, one chunk in memory at a time; undefined when the shop has no such revision. */
  bytes(shopId: string, revisionId: string): Promise<AsyncIterable<Uint8Array> | undefined>;
  /** The job sheet that stands now and its revision, 0: none was ever entered. */
  job(
    shopId: string,
    programId: string,
  ): Promise<{ id: string | null; job: Job | null; revision: number }>;
  changeJob(
    shopId: string,
    programId: string,
    change: {
      readonly basedOn: number;
      readonly job: Job;
      readonly madeBy: string | null;
      readonly reason?: string;
    },
  ): Promise<ProgramDetails>;
}

/** Checks of one program shown at once; a shop that re-checks nightly has years of them. */
const CHECKS_SHOWN = 200;

export function openProgramStore(ctx: StoreContext): ProgramStore {
  const store: ProgramStore = {
    writeText: (shopId, source) => together(ctx, (bound) => writeText(bound, shopId, source)),
    addRevision: (shopId, revision) =>
      together(ctx, (bound) => addRevision(bound, shopId, revision)),
    list: (shopId, query) => listPrograms(ctx, shopId, query),
    details: (shopId, id) => readDetails(ctx, shopId, id),
    revision: (shopId, revisionId) => readRevision(ctx, shopId, revisionId),
    async lines(shopId, revisionId, { from, to }) {
      const revision = await readRevision(ctx, shopId, revisionId);
      if (!revision) return undefined;
      const lines = await readLines(ctx, revision.textId, from, Math.min(to, revision.lines));
      return { from, lines, total: revision.lines };
    },
    async bytes(shopId, revisionId) {
      const revision = await readRevision(ctx, shopId, revisionId);
      return revision && readBytes(ctx, revision.textId);
    },
    job: (shopId, programId) => readJob(ctx, shopId, programId),
    changeJob: (shopId, programId, { basedOn, job, madeBy, reason = '' }) =>
      together(ctx, async (bound) => {
        const number = await nextNumber(bound, 'job_revision', shopId, programId, basedOn);
        await bound.models.jobRevision.create(
          { shopId, programId, number, body: job, madeBy, reason },
          { transaction: bound.transaction },
        );
        const details = await readDetails(bound, shopId, programId);
        if (!details) throw missing('program');
        return details;
      }),
  };
  return store;
}

async function addRevision(
  ctx: BoundContext,
  shopId: string,
  { name, textId, originalName, uploadedBy }: NewProgramRevision,
): Promise<AddedRevision> {
  const { transaction, models } = ctx;
  const programId = await findOrMakeProgram(ctx, shopId, name);
  const newest = await selectOne<{ id: string; number: number; textId: string }>(
    ctx,
    `select id, number, text_id as "textId" from program_revision
     where shop_id = :shopId and program_id = :programId order by number desc limit 1`,
    { shopId, programId },
  );
  if (newest?.textId === textId) {
    return { programId, revisionId: newest.id, revision: newest.number, unchanged: true };
  }
  const number = (newest?.number ?? 0) + 1;
  const row = await models.programRevision.create(
    { shopId, programId, number, textId, originalName, uploadedBy },
    { transaction },
  );
  return { programId, revisionId: row.id, revision: number, unchanged: false };
}

/** Made or found, and locked: two uploads of one name at the same moment make two revisions in turn. */
async function findOrMakeProgram(ctx: BoundContext, shopId: string, name: string): Promise<string> {
  await select(
    ctx,
    `insert into program (shop_id, name) values (:shopId, :name)
     on conflict (shop_id, name) do nothing returning id`,
    { shopId, name },
  );
  const row = await selectOne<{ id: string }>(
    ctx,
    'select id from program where shop_id = :shopId and name = :name for update',
    { shopId, name },
  );
  if (!row) throw missing('program');
  return row.id;
}

export async function readRevision(
  ctx: StoreContext,
  shopId: string,
  revisionId: string,
): Promise<RevisionOfProgram | undefined> {
  return await selectOne<RevisionOfProgram>(
    ctx,
    `select program_revision.id, program.id as "programId", program.name as "programName",
       program_revision.number, program_text.id as "textId", sha256, bytes::float8 as bytes, lines,
       original_name as "originalName"
     from program_revision
     join program on program.id = program_id
     join program_text on program_text.id = text_id
     where program_revision.shop_id = :shopId and program_revision.id = :revisionId`,
    { shopId, revisionId },
  );
}

async function readJob(ctx: StoreContext, shopId: string, programId: string) {
  const row = await newestRevision<{ body: Job }>(ctx, 'job_revision', shopId, programId);
  if (!row) return { id: null, job: null, revision: 0 };
  return { id: row.id, job: row.body, revision: row.number };
}

interface RevisionListing {
  readonly id: string;
  readonly number: number;
  readonly sha256: string;
  readonly bytes: number;
  readonly lines: number;
  readonly originalName: string;
  readonly uploadedBy: string | null;
  readonly uploadedAt: Date;
}

async function readDetails(
  ctx: StoreContext,
  shopId: string,
  id: string,
): Promise<ProgramDetails | undefined> {
  const found = await ctx.models.program.findOne({ where: { shopId, id }, ...inTransaction(ctx) });
  if (!found) return undefined;
  const rows = await select<RevisionListing>(
    ctx,
    `select program_revision.id, number, sha256, bytes::float8 as bytes, lines,
       original_name as "originalName", person.name as "uploadedBy", uploaded_at as "uploadedAt"
     from program_revision
     join program_text on program_text.id = text_id
     left join person on person.id = uploaded_by
     where program_revision.shop_id = :shopId and program_id = :id
     order by number desc`,
    { shopId, id },
  );
  const [newest] = rows;
  if (!newest) return undefined;
  const checks = await readChecksOfProgram(ctx, shopId, id, CHECKS_SHOWN);
  const { job, revision: jobRevision } = await readJob(ctx, shopId, id);
  const program: ProgramRecord = {
    id,
    name: found.name,
    revision: newest.number,
    revisionId: newest.id,
    sha256: newest.sha256,
    bytes: newest.bytes,
    lines: newest.lines,
    uploadedBy: newest.uploadedBy,
    uploadedAt: newest.uploadedAt.toISOString(),
    checks: await readNewestChecks(ctx, shopId, [newest.id]),
  };
  const revisions = rows.map((row) => ({
    ...row,
    uploadedAt: row.uploadedAt.toISOString(),
    checks: checks.filter((check) => check.programRevisionId === row.id),
  }));
  return { program, revisions, job, jobRevision };
}
