import { randomBytes } from 'node:crypto';
import { Client } from 'pg';
import { openCheckQueue, type CheckQueue } from '../check-queue';
import { openDatabase, type Database } from '../database';

export interface TestDatabase {
  readonly url: string;
  readonly database: Database;
  readonly queue: CheckQueue;
  /** Closes everything and drops the database; call it only when the tests passed, to keep it for a look. */
  drop(): Promise<void>;
}
export interface TestDatabaseOptions {
  /** Leave the schema to the test. */
  readonly unmigrated?: boolean;
  readonly poolSize?: number;
}

/** A fresh database of its own, migrated, on the server that DATABASE_URL names. */
export async function makeTestDatabase(options: TestDatabaseOptions = {}): Promise<TestDatabase> {
  const server = process.env['DATABASE_URL'];
  if (!server) {
    throw new Error(
      'DATABASE_URL is not set: run the spec as `node api/launch/pg.mjs test -- npx vitest run …`.',
    );
  }
  const name = `t_${randomBytes(8).toString('hex')}`;
  await runOn(server, `create database ${name}`);
  const url = new URL(server);
  url.pathname = `/${name}`;
  const queue = await openCheckQueue({ url: url.href, onError: ignore });
  const database = openDatabase({ url: url.href, queue, poolSize: options.poolSize ?? 5 });
  if (!options.unmigrated) await database.migrate();
  return {
    url: url.href,
    database,
    queue,
    async drop() {
      await queue.stop({ timeout: 1000 });
      await database.close();
      await runOn(server, `drop database ${name} with (force)`);
    },
  };
}

async function runOn(url: string, statement: string): Promise<void> {
  const client = new Client({ connectionString: url });
  await client.connect();
  await client.query(statement);
  await client.end();
}

/** The database goes away under the queue when a test ends; its complaint is no failure of the test. */
function ignore(): void {
  return;
}
