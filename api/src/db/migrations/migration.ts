/**
 * One step of the schema. `up` and `down` are lists of SQL statements, run in order inside one
 * transaction; a merged migration is never edited, a later one corrects it.
 */
export interface Migration {
  /** Date and time it was written, then what it does: 20261201-0900-create-shops. */
  readonly name: string;
  readonly up: readonly string[];
  readonly down: readonly string[];
}

/** A table whose rows are history: never changed and never deleted, by anyone. */
export function keepForEver(table: string): string {
  return `
    create trigger ${table}_is_kept before update or delete on ${table}
      for each row execute function refuse_change();
    create trigger ${table}_is_kept_whole before truncate on ${table}
      for each statement execute function refuse_change();`;
}

/** Columns that every revision of something carries; the thing itself adds its own key. */
export const REVISION_COLUMNS = `
  id uuid primary key default gen_random_uuid(),
  shop_id uuid not null references shop,
  number integer not null check (number >= 1),
  made_by uuid,
  made_at timestamptz not null default now(),
  reason text not null default '' check (length(reason) <= 500)`;
