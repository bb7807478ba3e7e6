import { keepForEver, type Migration } from './migration';

/** Who did what, when: appended to, never rewritten. */
export const createAuditTrail: Migration = {
  name: '20261201-0940-create-audit-trail',
  up: [
    `create table audit_event (
       id bigserial primary key,
       shop_id uuid not null references shop,
       at timestamptz not null default now(),
       person_id uuid,
       action text not null check (length(action) between 1 and 100),
       subject text not null,
       detail jsonb not null default '{}',
       foreign key (shop_id, person_id) references person (shop_id, id)
     )`,
    `create index audit_event_newest on audit_event (shop_id, id desc)`,
    keepForEver('audit_event'),
  ],
  down: ['drop table audit_event'],
};
