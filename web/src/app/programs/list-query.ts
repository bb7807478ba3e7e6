import type { Params } from '@angular/router';
import type { ProgramQuery } from '#contracts';
import { programQuerySchema } from '#contracts';

export type ListQuery = ProgramQuery;
export const PAGE_SIZES = [10, 25, 50, 100] as const;

/** What the address asks of the list. Anything unreadable in it falls back to the plain list. */
export function readListQuery(params: Params): ListQuery {
  const query = programQuerySchema.safeParse(params);
  return query.success ? query.data : programQuerySchema.parse({});
}

/** The same as address parameters, leaving out what is as usual, so that the address stays short. */
export function listParams(query: ListQuery): Params {
  const usual = programQuerySchema.parse({}) as Readonly<Record<string, unknown>>;
  return Object.fromEntries(
    Object.entries(query).filter(([name, value]) => value !== undefined && value !== usual[name]),
  );
}

/** The query changed by a person: any change but a turn of the page begins at the first page. */
export function changed(query: ListQuery, change: Partial<ListQuery>): ListQuery {
  return { ...query, offset: 0, ...change };
}
