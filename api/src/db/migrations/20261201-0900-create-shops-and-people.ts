import { keepForEver, REVISION_COLUMNS, type Migration } from './migration';

/** Shops, the people of a shop with their roles, their refresh tokens, and the shop's policy. */
export const createShopsAndPeople: Migration = {
  name: '20261201-0900-create-shops-and-people',
  up: [
    `create function refuse_change() returns trigger language plpgsql as $$
     begin
       raise exception 'rows of % are history and are never changed or deleted', tg_table_name
         using errcode = 'restrict_violation';
     end $$`,
    `create table shop (
       id uuid primary key default gen_random_uuid(),
       name text not null check (length(name) between 1 and 200),
       upload_limit_bytes bigint not null default 268435456
         check (upload_limit_bytes between 1024 and 4294967296),
       created_at timestamptz not null default now()
     )`,
    `create table person (
       id uuid primary key default gen_random_uuid(),
       shop_id uuid not null references shop,
       email text not null check (length(email) between 3 and 200),
       name text not null check (length(name) between 1 and 200),
       password_hash text not null,
       units text not null default 'mm' check (units in ('mm', 'inch')),
       active boolean not null default true,
       failed_sign_ins integer not null default 0 check (failed_sign_ins >= 0),
       locked_until timestamptz,
       created_at timestamptz not null default now(),
       unique (shop_id, id)
     )`,
    // A person signs in by address alone, before any shop is known: one person per address.
    `create unique index person_email on person (lower(email))`,
    `create table person_role (
       shop_id uuid not null,
       person_id uuid not null,
       role text not null check (role in ('operator', 'programmer', 'lead', 'admin')),
       primary key (person_id, role),
       foreign key (shop_id, person_id) references person (shop_id, id) on delete cascade
     )`,
    `create table refresh_token (
       id uuid primary key default gen_random_uuid(),
       shop_id uuid not null,
       person_id uuid not null,
       family_id uuid not null,
       token_hash text not null unique,
       created_at timestamptz not null default now(),
       expires_at timestamptz not null,
       used_at timestamptz,
       revoked_at timestamptz,
       foreign key (shop_id, person_id) references person (shop_id, id) on delete cascade
     )`,
    `create index refresh_token_family on refresh_token (family_id)`,
    `create index refresh_token_person on refresh_token (person_id)`,
    `create index refresh_token_expiry on refresh_token (expires_at)`,
    `create table policy_revision (
       ${REVISION_COLUMNS},
       body jsonb not null,
       unique (shop_id, number),
       unique (shop_id, id),
       foreign key (shop_id, made_by) references person (shop_id, id)
     )`,
    keepForEver('policy_revision'),
  ],
  down: [
    'drop table policy_revision, refresh_token, person_role, person, shop',
    'drop function refuse_change()',
  ],
};
