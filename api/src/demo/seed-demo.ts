import { jobSheetSchema, setupSchema, type Welcome } from '#contracts';
import { demo, type Demo, type DemoPerson } from '../../../fixtures/demo';
import { askForCheck } from '../checks/ask-for-check';
import type { Config } from '../config';
import type { Database, Stores } from '../db/database';
import type { Dependencies } from '../dependencies';
import type { Author } from '../http/route';
import { importNewMachine } from '../machines/import-setup';
import { addPerson } from '../people/add-person';
import { changeJob } from '../programs/change-job';
import { storeProgram } from '../programs/upload-program';
import { programText } from './program-text';

export type DemoParts = Pick<Dependencies, 'database' | 'passwords' | 'now'> & {
  readonly config: Pick<Config, 'storiesFolder'>;
};

/**
 * Fills an empty database with the demo shop, once and whole, by the use cases the routes have: so it is
 * on record and its checks are queued like anyone's. Gives the sign-ins of the demo that still hold; in
 * a database with another shop there are none.
 */
export async function seedDemo(parts: DemoParts): Promise<Welcome['demo']> {
  const scenario = demo(parts.now());
  await parts.database.transaction(async (stores) => {
    if (await stores.people.anyone()) return;
    const inside = { ...parts, database: within(parts.database, stores) };
    const authors = await addPeople(inside, scenario);
    const machineIds = await addMachines(inside, authors('lead'), scenario);
    await addPrograms(inside, authors('programmer'), scenario, machineIds);
  });
  return await holdingSignIns(parts, scenario.people);
}

/** The same database, except that its every transaction is the one already open. */
function within(database: Database, stores: Stores): Database {
  return { ...database, stores, transaction: (work) => work(stores) };
}

async function addPeople(
  parts: DemoParts,
  { shopName, people }: Demo,
): Promise<(role: DemoPerson['roles'][number]) => Author> {
  const { stores } = parts.database;
  const shop = await stores.shops.create({ name: shopName });
  const authors: Author[] = [];
  for (const person of people) {
    // The first one has nobody to be added by: the shop's own record begins with them.
    const by = authors[0];
    const added = by
      ? await addPerson(parts, by, { ...person, roles: [...person.roles] })
      : await stores.people.add(shop.id, {
          ...person,
          passwordHash: await parts.passwords.hash(person.password),
        });
    authors.push({ id: added.id, shopId: shop.id, roles: added.roles });
  }
  await stores.audit.add(shop.id, {
    personId: authors[0]?.id ?? null,
    action: 'shop.create',
    subject: shopName,
    detail: { demo: true },
  });
  return (role) => {
    const author = authors.find(({ roles }) => roles.includes(role));
    if (!author) throw new Error(`The demo has no ${role}.`);
    return author;
  };
}

async function addMachines(
  parts: DemoParts,
  author: Author,
  { machines }: Demo,
): Promise<ReadonlyMap<string, string>> {
  const ids = new Map<string, string>();
  for (const document of machines) {
    const asked = { setup: setupSchema.parse(document), reason: 'Demo', replaceTools: false };
    const { name, id } = await importNewMachine(parts, author, asked);
    ids.set(name, id);
  }
  return ids;
}

async function addPrograms(
  parts: DemoParts,
  author: Author,
  { programs }: Demo,
  machineIds: ReadonlyMap<string, string>,
): Promise<void> {
  const { stores } = parts.database;
  for (const program of programs) {
    const machineId = machineIds.get(program.machine);
    if (!machineId) throw new Error(`The demo has no machine called ${program.machine}.`);
    const text = programText(program, parts.config.storiesFolder);
    const { programId, revisionId } = await storeProgram(stores, author, program.name, text);
    // The job sheet comes before the check: without it nothing is known of stock and zero.
    await changeJob(parts, author, programId, { basedOn: 0, job: jobOf(program.job) });
    await askForCheck(stores, author, {
      programRevisionId: revisionId,
      machineId,
      cause: 'upload',
    });
  }
}

function jobOf(job: Demo['programs'][number]['job']) {
  return jobSheetSchema.parse(job);
}

/** A demo whose passwords were changed must not show the old ones. */
async function holdingSignIns(
  { database, passwords }: DemoParts,
  people: readonly DemoPerson[],
): Promise<Welcome['demo']> {
  const holding: Welcome['demo'] = [];
  for (const { email, password } of people) {
    const record = await database.stores.people.findByEmail(email);
    if (!record?.person.active) continue;
    if (!(await passwords.matches(record.passwordHash, password))) continue;
    holding.push({ email, password, roles: record.person.roles });
  }
  return holding;
}
