import type { AuditEvent } from '#contracts';
import { inTransaction, select, selectOne, type StoreContext } from '../store-context';

export interface NewAuditEvent {
  readonly personId: string | null;
  /** What was done, such as `program.upload` or `person.sign-in`. */
  readonly action: string;
  /** To what, in words a person reads: a name, a number. */
  readonly subject: string;
  readonly detail?: Readonly<Record<string, unknown>>;
}
export interface AuditStore {
  add(shopId: string, event: NewAuditEvent): Promise<void>;
  /** Newest first. */
  list(
    shopId: string,
    page: { readonly offset: number; readonly limit: number },
  ): Promise<{ events: AuditEvent[]; total: number }>;
}

export function openAuditStore(ctx: StoreContext): AuditStore {
  return {
    async add(shopId, { personId, action, subject, detail = {} }) {
      await ctx.models.auditEvent.create(
        { shopId, personId, action, subject, detail },
        { ...inTransaction(ctx) },
      );
    },
    async list(shopId, { offset, limit }) {
      // Served by audit_event_newest.
      const rows = await select<Omit<AuditEvent, 'at'> & { at: Date }>(
        ctx,
        `select audit_event.id::text, at, person.name as person, action, subject, detail
         from audit_event left join person on person.id = audit_event.person_id
         where audit_event.shop_id = :shopId
         order by audit_event.id desc offset :offset limit :limit`,
        { shopId, offset, limit },
      );
      const counted = await selectOne<{ total: number }>(
        ctx,
        'select count(*)::int as total from audit_event where shop_id = :shopId',
        { shopId },
      );
      const events = rows.map((row) => ({ ...row, at: row.at.toISOString() }));
      return { events, total: counted?.total ?? 0 };
    },
  };
}
