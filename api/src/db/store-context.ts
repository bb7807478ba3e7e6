import {
  QueryTypes,
  UniqueConstraintError,
  type QueryOptions,
  type Sequelize,
  type Transaction,
} from 'sequelize';
import type { CheckQueue } from './check-queue';
import type { Models } from './models/models';

/** What every store works with. Stores bound to a transaction carry it; the others have none. */
export interface StoreContext {
  readonly sequelize: Sequelize;
  readonly models: Models;
  readonly transaction: Transaction | undefined;
  readonly queue: CheckQueue | undefined;
}
export type BoundContext = StoreContext & { readonly transaction: Transaction };

/** Named values of a query, `:name` in its text. */
export type Values = Readonly<Record<string, unknown>>;

export async function select<Row extends object>(
  ctx: StoreContext,
  sql: string,
  values: Values = {},
): Promise<Row[]> {
  return await ctx.sequelize.query<Row>(sql, {
    type: QueryTypes.SELECT,
    replacements: values,
    ...inTransaction(ctx),
  });
}

export async function selectOne<Row extends object>(
  ctx: StoreContext,
  sql: string,
  values: Values = {},
): Promise<Row | undefined> {
  return (await select<Row>(ctx, sql, values))[0];
}

/** Runs the work in the store's own transaction, or in the one it is bound to already. */
export async function together<T>(
  ctx: StoreContext,
  work: (bound: BoundContext) => Promise<T>,
): Promise<T> {
  if (ctx.transaction) return await work(ctx as BoundContext);
  return await ctx.sequelize.transaction((transaction) => work({ ...ctx, transaction }));
}

/** The `transaction` option of a query, left out when there is none. */
export function inTransaction(ctx: StoreContext): Pick<QueryOptions, 'transaction'> {
  return ctx.transaction ? { transaction: ctx.transaction } : {};
}

/** Runs a write whose only expected error is a unique constraint; hands that to `refuse`. */
export async function refusingTwins<T>(write: () => Promise<T>, refuse: () => Error): Promise<T> {
  try {
    return await write();
  } catch (error) {
    if (error instanceof UniqueConstraintError) throw refuse();
    throw error;
  }
}
