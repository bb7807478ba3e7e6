import { keepForEver, REVISION_COLUMNS, type Migration } from './migration';

const MACHINE_REVISION_KEYS = `
  unique (machine_id, number),
  unique (shop_id, id),
  foreign key (shop_id, machine_id) references machine (shop_id, id),
  foreign key (shop_id, made_by) references person (shop_id, id)`;

/** Machines with everything that stands on them, each at revisions, and the shop's tools. */
export const createMachinesAndTools: Migration = {
  name: '20261201-0910-create-machines-and-tools',
  up: [
    `create table machine (
       id uuid primary key default gen_random_uuid(),
       shop_id uuid not null references shop,
       name text not null check (length(name) between 1 and 200),
       created_at timestamptz not null default now(),
       unique (shop_id, id),
       unique (shop_id, name)
     )`,
    `create table machine_revision (
       ${REVISION_COLUMNS},
       machine_id uuid not null,
       machine jsonb not null,
       controller jsonb not null,
       ${MACHINE_REVISION_KEYS}
     )`,
    `create table rack_revision (
       ${REVISION_COLUMNS},
       machine_id uuid not null,
       name text not null,
       edge text not null check (edge in ('front', 'back', 'left', 'right')),
       body jsonb not null,
       ${MACHINE_REVISION_KEYS}
     )`,
    `create table pocket (
       rack_revision_id uuid not null references rack_revision,
       position integer not null check (position >= 0),
       number integer not null check (number >= 1),
       grip_x double precision not null,
       grip_y double precision not null,
       grip_z double precision not null,
       opens text not null check (opens in ('+x', '-x', '+y', '-y')),
       largest_diameter double precision not null check (largest_diameter > 0),
       longest double precision not null check (longest > 0),
       taper text not null,
       kind text not null check (kind in ('fork', 'cup')),
       heaviest double precision check (heaviest > 0),
       taught jsonb,
       primary key (rack_revision_id, number),
       unique (rack_revision_id, position)
     )`,
    `create table loading_revision (
       ${REVISION_COLUMNS},
       machine_id uuid not null,
       spindle text not null check (spindle in ('tool', 'empty', 'unknown')),
       spindle_tool integer check (spindle_tool >= 0),
       by_hand integer[] not null default '{}',
       check ((spindle = 'tool') = (spindle_tool is not null)),
       ${MACHINE_REVISION_KEYS}
     )`,
    `create table loading_pocket (
       loading_revision_id uuid not null references loading_revision,
       position integer not null check (position >= 0),
       pocket integer not null check (pocket >= 1),
       tool integer not null check (tool >= 0),
       primary key (loading_revision_id, pocket),
       unique (loading_revision_id, position)
     )`,
    `create table offset_revision (
       ${REVISION_COLUMNS},
       machine_id uuid not null,
       work jsonb not null,
       length jsonb not null default '{}',
       diameter jsonb not null default '{}',
       ${MACHINE_REVISION_KEYS}
     )`,
    `create table macro_revision (
       ${REVISION_COLUMNS},
       machine_id uuid not null,
       name text,
       text text,
       subprograms jsonb not null default '[]',
       check ((name is null) = (text is null)),
       ${MACHINE_REVISION_KEYS}
     )`,
    `create table tool (
       id uuid primary key default gen_random_uuid(),
       shop_id uuid not null references shop,
       number integer not null check (number >= 1),
       created_at timestamptz not null default now(),
       unique (shop_id, id),
       unique (shop_id, number)
     )`,
    `create table tool_revision (
       ${REVISION_COLUMNS},
       tool_id uuid not null,
       body jsonb not null,
       length_offset double precision,
       diameter_offset double precision,
       unique (tool_id, number),
       unique (shop_id, id),
       foreign key (shop_id, tool_id) references tool (shop_id, id),
       foreign key (shop_id, made_by) references person (shop_id, id)
     )`,
    ...[
      'machine_revision',
      'rack_revision',
      'pocket',
      'loading_revision',
      'loading_pocket',
      'offset_revision',
      'macro_revision',
      'tool_revision',
    ].map(keepForEver),
  ],
  down: [
    `drop table tool_revision, tool, macro_revision, offset_revision, loading_pocket,
       loading_revision, pocket, rack_revision, machine_revision, machine`,
  ],
};
