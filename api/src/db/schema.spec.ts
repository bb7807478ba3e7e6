import { QueryTypes, type ModelStatic, type Model } from 'sequelize';
import { afterAll, expect, test } from 'vitest';
import { migrateDown, migrateUp } from './migrate';
import { MIGRATIONS } from './migrations/migrations';
import { makeTestDatabase } from './testing/test-database';

const { database, drop } = await makeTestDatabase({ unmigrated: true });
const { sequelize, models } = database;
afterAll(drop);

interface LiveColumn {
  readonly table: string;
  readonly column: string;
  readonly type: string;
  readonly nullable: boolean;
  readonly inKey: boolean;
}

test('the schema goes up, down and up again, and the models describe it', async () => {
  expect(await database.pendingMigrations()).toEqual(MIGRATIONS.map((each) => each.name));
  await migrateUp(sequelize);
  const first = await readColumns();
  expect(await database.pendingMigrations()).toEqual([]);

  await migrateDown(sequelize);
  expect(await readColumns()).toEqual([]);
  expect(await readFunctions()).toEqual([]);

  await migrateUp(sequelize);
  expect(await readColumns()).toEqual(first);
  expect(first.map(asLine).sort()).toEqual(Object.values(models).flatMap(columnsOfModel).sort());
});

test('several processes may bring it up to date at once', async () => {
  await migrateDown(sequelize);
  await Promise.all([migrateUp(sequelize), migrateUp(sequelize)]);
  expect(await database.pendingMigrations()).toEqual([]);
});

test('every row can be followed to its shop', async () => {
  const links = await sequelize.query<{ table: string; to: string }>(
    `select distinct conrelid::regclass::text as table, confrelid::regclass::text as to
     from pg_constraint where contype = 'f'`,
    { type: QueryTypes.SELECT },
  );
  const reached = new Set(['shop']);
  for (let before = 0; before < reached.size;) {
    before = reached.size;
    for (const { table, to } of links) if (reached.has(to)) reached.add(table);
  }
  expect([...reached].sort()).toEqual(
    Object.values(models)
      .map((model) => model.getTableName() as string)
      .sort(),
  );
});

async function readColumns(): Promise<LiveColumn[]> {
  return await sequelize.query<LiveColumn>(
    `select pg_class.relname as table, attname as column,
       format_type(atttypid, atttypmod) as type, not attnotnull as nullable,
       exists (select 1 from pg_index where indrelid = pg_class.oid and indisprimary
         and attnum = any (indkey)) as "inKey"
     from pg_attribute
     join pg_class on pg_class.oid = attrelid
     join pg_namespace on pg_namespace.oid = relnamespace
     where nspname = 'public' and relkind = 'r' and 0 < attnum and not attisdropped
       and relname <> 'schema_migration'
     order by 1, 2`,
    { type: QueryTypes.SELECT },
  );
}

async function readFunctions(): Promise<{ name: string }[]> {
  return await sequelize.query<{ name: string }>(
    `select proname as name from pg_proc join pg_namespace on pg_namespace.oid = pronamespace
     where nspname = 'public'`,
    { type: QueryTypes.SELECT },
  );
}

function asLine({ table, column, type, nullable, inKey }: LiveColumn): string {
  return `${table}.${column} ${type}${nullable ? ' null' : ''}${inKey ? ' key' : ''}`;
}

function columnsOfModel(model: ModelStatic<Model>): string[] {
  return Object.values(model.getAttributes()).map(({ field, type, allowNull, primaryKey }) => {
    // The type of an attribute is a data type object; `toSql` is not in the published types.
    const sql = (type as unknown as { toSql(): string }).toSql().toLowerCase();
    return asLine({
      table: model.getTableName() as string,
      column: field!,
      type: sql,
      nullable: allowNull ?? true,
      inKey: primaryKey ?? false,
    });
  });
}
