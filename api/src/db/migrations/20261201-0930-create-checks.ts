import { keepForEver, type Migration } from './migration';

/**
 * Checks: a program revision held against a setup snapshot, with its findings and plan path.
 * Documents are `json`, not `jsonb`: they are hashed or handed out as they were written, and jsonb
 * would put their keys into an order of its own.
 */
export const createChecks: Migration = {
  name: '20261201-0930-create-checks',
  up: [
    `create table setup_snapshot (
       id uuid primary key default gen_random_uuid(),
       shop_id uuid not null references shop,
       sha256 text not null check (sha256 ~ '^[0-9a-f]{64}$'),
       body json not null,
       created_at timestamptz not null default now(),
       unique (shop_id, id),
       unique (shop_id, sha256),
       check (encode(sha256(convert_to(body::text, 'UTF8')), 'hex') = sha256)
     )`,
    `create table check_run (
       id uuid primary key default gen_random_uuid(),
       shop_id uuid not null references shop,
       program_revision_id uuid not null,
       machine_id uuid not null,
       setup_snapshot_id uuid not null,
       machine_revision_id uuid not null,
       rack_revision_id uuid not null,
       loading_revision_id uuid not null,
       offset_revision_id uuid not null,
       macro_revision_id uuid,
       job_revision_id uuid,
       policy_revision_id uuid,
       asked_by uuid,
       asked_at timestamptz not null default now(),
       cause text not null check (cause in ('upload', 'asked', 'loading-changed')),
       state text not null default 'queued'
         check (state in ('queued', 'running', 'done', 'failed')),
       job_id uuid,
       attempts integer not null default 0 check (attempts >= 0),
       started_at timestamptz,
       finished_at timestamptz,
       lines_read integer not null default 0 check (lines_read >= 0),
       failure text,
       verdict text check (verdict in ('stopped', 'held', 'clear')),
       unattended_verdict text check (unattended_verdict in ('stopped', 'held', 'clear')),
       stop_count integer check (stop_count >= 0),
       hold_count integer check (hold_count >= 0),
       note_count integer check (note_count >= 0),
       summary json,
       depends_on_tools integer[],
       unique (shop_id, id),
       check ((state = 'done') = (summary is not null)),
       check ((state = 'done') = (verdict is not null and unattended_verdict is not null)),
       check ((state = 'done') = (num_nonnulls(stop_count, hold_count, note_count) = 3)),
       check ((state = 'failed') = (failure is not null)),
       check ((state in ('done', 'failed')) = (finished_at is not null)),
       foreign key (shop_id, program_revision_id) references program_revision (shop_id, id),
       foreign key (shop_id, machine_id) references machine (shop_id, id),
       foreign key (shop_id, setup_snapshot_id) references setup_snapshot (shop_id, id),
       foreign key (shop_id, machine_revision_id) references machine_revision (shop_id, id),
       foreign key (shop_id, rack_revision_id) references rack_revision (shop_id, id),
       foreign key (shop_id, loading_revision_id) references loading_revision (shop_id, id),
       foreign key (shop_id, offset_revision_id) references offset_revision (shop_id, id),
       foreign key (shop_id, macro_revision_id) references macro_revision (shop_id, id),
       foreign key (shop_id, job_revision_id) references job_revision (shop_id, id),
       foreign key (shop_id, policy_revision_id) references policy_revision (shop_id, id),
       foreign key (shop_id, asked_by) references person (shop_id, id)
     )`,
    `create index check_run_newest
       on check_run (program_revision_id, machine_id, asked_at desc, id desc)`,
    `create index check_run_shop on check_run (shop_id, asked_at desc, id desc)`,
    `create index check_run_unfinished on check_run (asked_at)
       where state in ('queued', 'running')`,
    `create table check_tool (
       check_id uuid not null references check_run,
       tool_revision_id uuid not null references tool_revision,
       primary key (check_id, tool_revision_id)
     )`,
    // A finished check is history: what it found may not be edited into something milder.
    `create function keep_finished_check() returns trigger language plpgsql as $$
     begin
       if tg_op = 'DELETE' or old.state in ('done', 'failed') then
         raise exception 'a finished check is never changed or deleted'
           using errcode = 'restrict_violation';
       end if;
       return new;
     end $$`,
    `create trigger check_run_is_kept before update or delete on check_run
       for each row execute function keep_finished_check()`,
    `create table finding (
       id bigserial primary key,
       check_id uuid not null references check_run,
       ordinal integer not null check (ordinal >= 0),
       rule text not null,
       severity text not null check (severity in ('stop', 'hold', 'note')),
       unattended text check (unattended in ('stop', 'hold', 'note')),
       line integer not null check (line >= 1),
       end_line integer not null check (end_line >= 1),
       worst_line integer not null check (worst_line >= 1),
       count integer not null check (count >= 1),
       column_from integer,
       column_to integer,
       within json,
       block_delete text check (block_delete = 'on'),
       tool integer,
       folded integer,
       hold text check (hold in ('look', 'judge')),
       message text not null,
       advice text not null,
       data json not null,
       unique (check_id, ordinal),
       check ((column_from is null) = (column_to is null))
     )`,
    `create index finding_severity on finding (check_id, severity, ordinal)`,
    `create table check_path (
       check_id uuid primary key references check_run,
       tolerance double precision not null check (tolerance >= 0),
       truncated boolean not null,
       points integer not null check (points >= 0),
       runs bytea not null
     )`,
    ...['setup_snapshot', 'check_tool', 'finding', 'check_path'].map(keepForEver),
  ],
  down: [
    'drop table check_path, finding, check_tool, check_run, setup_snapshot',
    'drop function keep_finished_check()',
  ],
};
