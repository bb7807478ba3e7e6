import { QueryTypes, type Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import { MIGRATIONS } from './migrations/migrations';
import type { Migration } from './migrations/migration';

/** Any fixed number will do, as long as every process of this product uses the same. */
const MIGRATION_LOCK = 7_203_311_905;

/**
 * Brings the schema up to date. API and worker may start at the same moment: the first takes the
 * lock, the other waits and then finds nothing left to do. Needs a pool of at least two connections.
 */
export async function migrateUp(sequelize: Sequelize): Promise<void> {
  await locked(sequelize, async (umzug) => {
    await umzug.up();
  });
}

/** Takes every migration back; the tables and all their rows are gone afterwards. */
export async function migrateDown(sequelize: Sequelize): Promise<void> {
  await locked(sequelize, async (umzug) => {
    await umzug.down({ to: 0 });
  });
}

/** Names of migrations not yet run; the readiness route asks. */
export async function pendingMigrations(sequelize: Sequelize): Promise<string[]> {
  const [table] = await sequelize.query<{ there: boolean }>(
    `select to_regclass('schema_migration') is not null as there`,
    { type: QueryTypes.SELECT },
  );
  if (!table?.there) return MIGRATIONS.map((each) => each.name);
  return (await openUmzug(sequelize).pending()).map((each) => each.name);
}

async function locked(
  sequelize: Sequelize,
  work: (umzug: Umzug<Sequelize>) => Promise<void>,
): Promise<void> {
  await sequelize.transaction(async (transaction) => {
    await sequelize.query('select pg_advisory_xact_lock(:lock)', {
      replacements: { lock: MIGRATION_LOCK },
      transaction,
    });
    await work(openUmzug(sequelize));
  });
}

function openUmzug(sequelize: Sequelize): Umzug<Sequelize> {
  return new Umzug({
    migrations: MIGRATIONS.map((migration) => asUmzugStep(sequelize, migration)),
    context: sequelize,
    storage: new SequelizeStorage({ sequelize, tableName: 'schema_migration' }),
    logger: undefined,
  });
}

function asUmzugStep(sequelize: Sequelize, { name, up, down }: Migration) {
  const run = (statements: readonly string[]) => async (): Promise<void> => {
    await sequelize.transaction(async (transaction) => {
      for (const statement of statements) await sequelize.query(statement, { transaction });
    });
  };
  return { name, up: run(up), down: run(down) };
}
