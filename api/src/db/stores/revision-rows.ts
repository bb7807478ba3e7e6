import type { Revision } from '#contracts';
import { select, selectOne, type BoundContext, type StoreContext } from '../store-context';
import { missing, stale } from '../store-refusal';

/** What each revision table revises: the table of the thing, and the column that names it. */
const REVISES = {
  machine_revision: { owner: 'machine', column: 'machine_id', what: 'machine' },
  rack_revision: { owner: 'machine', column: 'machine_id', what: 'rack' },
  loading_revision: { owner: 'machine', column: 'machine_id', what: 'loading' },
  offset_revision: { owner: 'machine', column: 'machine_id', what: 'work offsets' },
  macro_revision: { owner: 'machine', column: 'machine_id', what: 'tool-change macro' },
  tool_revision: { owner: 'tool', column: 'tool_id', what: 'tool' },
  job_revision: { owner: 'program', column: 'program_id', what: 'job sheet' },
} as const;
export type RevisionTable = keyof typeof REVISES;

/** A revision row as read: who made it is the person's name. */
export interface RevisionRow {
  readonly id: string;
  readonly number: number;
  readonly made_by_name: string | null;
  readonly made_at: Date;
  readonly reason: string;
}

export function asRevision(row: RevisionRow): Revision {
  return {
    number: row.number,
    madeBy: row.made_by_name,
    madeAt: row.made_at.toISOString(),
    reason: row.reason,
  };
}

/** The newest revision of one thing, with all its columns. Served by unique (owner, number). */
export async function newestRevision<Row extends object>(
  ctx: StoreContext,
  table: RevisionTable,
  shopId: string,
  ownerId: string,
): Promise<(Row & RevisionRow) | undefined> {
  return await selectOne<Row & RevisionRow>(
    ctx,
    `select ${table}.*, person.name as made_by_name
     from ${table} left join person on person.id = made_by
     where ${table}.shop_id = :shopId and ${REVISES[table].column} = :ownerId
     order by number desc limit 1`,
    { shopId, ownerId },
  );
}

/** All revisions of one thing with all their columns, newest first. */
export async function revisionRows<Row extends object>(
  ctx: StoreContext,
  table: RevisionTable,
  shopId: string,
  ownerId: string,
): Promise<(Row & RevisionRow)[]> {
  return await select<Row & RevisionRow>(
    ctx,
    `select ${table}.*, person.name as made_by_name
     from ${table} left join person on person.id = made_by
     where ${table}.shop_id = :shopId and ${REVISES[table].column} = :ownerId
     order by number desc`,
    { shopId, ownerId },
  );
}

/**
 * The number of the revision about to be made. Locks the thing itself, so that of two changes made at
 * the same moment the second one sees the first. Refuses when the thing is not the shop's, or when
 * `basedOn` is not the newest revision (0: there is none yet).
 */
export async function nextNumber(
  ctx: BoundContext,
  table: RevisionTable,
  shopId: string,
  ownerId: string,
  basedOn: number,
): Promise<number> {
  const newest = await lockNewest(ctx, table, shopId, ownerId);
  if (newest === basedOn) return newest + 1;
  const revision = await newestRevision(ctx, table, shopId, ownerId);
  throw stale(REVISES[table].what, basedOn, newest, revision && asRevision(revision));
}

/** Locks the thing and says which revision of it stands now; 0: none yet. */
export async function lockNewest(
  ctx: BoundContext,
  table: RevisionTable,
  shopId: string,
  ownerId: string,
): Promise<number> {
  const { owner, column } = REVISES[table];
  const locked = await selectOne(
    ctx,
    `select id from ${owner} where shop_id = :shopId and id = :ownerId for update`,
    { shopId, ownerId },
  );
  if (!locked) throw missing(owner);
  const newest = await selectOne<{ newest: number }>(
    ctx,
    `select coalesce(max(number), 0) as newest from ${table}
     where shop_id = :shopId and ${column} = :ownerId`,
    { shopId, ownerId },
  );
  return newest?.newest ?? 0;
}
