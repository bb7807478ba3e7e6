import { keepForEver, REVISION_COLUMNS, type Migration } from './migration';

/**
 * Programs and their text. A text without a hash is being written and belongs to the transaction
 * that writes it; once it has its hash it and its chunks never change again.
 */
export const createPrograms: Migration = {
  name: '20261201-0920-create-programs',
  up: [
    `create table program_text (
       id uuid primary key default gen_random_uuid(),
       shop_id uuid not null references shop,
       sha256 text check (sha256 ~ '^[0-9a-f]{64}$'),
       bytes bigint not null default 0 check (bytes >= 0),
       lines integer not null default 0 check (lines >= 0),
       created_at timestamptz not null default now(),
       unique (shop_id, id),
       unique (shop_id, sha256)
     )`,
    `create table program_chunk (
       text_id uuid not null references program_text on delete cascade,
       ordinal integer not null check (ordinal >= 0),
       first_line integer not null check (first_line >= 1),
       line_count integer not null check (line_count >= 1),
       first_byte bigint not null check (first_byte >= 0),
       byte_count integer not null check (byte_count >= 1),
       data bytea not null,
       primary key (text_id, ordinal)
     )`,
    `create index program_chunk_lines on program_chunk (text_id, first_line)`,
    `create function keep_whole_text() returns trigger language plpgsql as $$
     begin
       if old.sha256 is not null then
         raise exception 'a stored program text is never changed or deleted'
           using errcode = 'restrict_violation';
       end if;
       return case tg_op when 'DELETE' then old else new end;
     end $$`,
    `create trigger program_text_is_kept before update or delete on program_text
       for each row execute function keep_whole_text()`,
    // The cascade from a pending text deletes its chunks after the text's own row is gone.
    `create function keep_whole_chunk() returns trigger language plpgsql as $$
     begin
       if tg_op = 'UPDATE' or exists (select 1 from program_text where id = old.text_id) then
         raise exception 'chunks of a program text are never changed or deleted'
           using errcode = 'restrict_violation';
       end if;
       return old;
     end $$`,
    `create trigger program_chunk_is_kept before update or delete on program_chunk
       for each row execute function keep_whole_chunk()`,
    `create table program (
       id uuid primary key default gen_random_uuid(),
       shop_id uuid not null references shop,
       name text not null check (length(name) between 1 and 255),
       created_at timestamptz not null default now(),
       unique (shop_id, id),
       unique (shop_id, name)
     )`,
    `create table program_revision (
       id uuid primary key default gen_random_uuid(),
       shop_id uuid not null references shop,
       program_id uuid not null,
       number integer not null check (number >= 1),
       text_id uuid not null,
       original_name text not null,
       uploaded_by uuid,
       uploaded_at timestamptz not null default now(),
       unique (program_id, number),
       unique (shop_id, id),
       foreign key (shop_id, program_id) references program (shop_id, id),
       foreign key (shop_id, text_id) references program_text (shop_id, id),
       foreign key (shop_id, uploaded_by) references person (shop_id, id)
     )`,
    `create index program_revision_text on program_revision (text_id)`,
    `create table job_revision (
       ${REVISION_COLUMNS},
       program_id uuid not null,
       body jsonb not null,
       unique (program_id, number),
       unique (shop_id, id),
       foreign key (shop_id, program_id) references program (shop_id, id),
       foreign key (shop_id, made_by) references person (shop_id, id)
     )`,
    keepForEver('program_revision'),
    keepForEver('job_revision'),
  ],
  down: [
    'drop table job_revision, program_revision, program, program_chunk, program_text',
    'drop function keep_whole_chunk()',
    'drop function keep_whole_text()',
  ],
};
