import { resolve } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { programDetailsSchema, programPageSchema } from '#contracts';
import { seedDemo, type DemoParts } from '../../api/src/demo/seed-demo';
import { demo } from '../../fixtures/demo';
import { openTestHouse, type TestHouse } from './testing/test-house';

let house: TestHouse;
let parts: DemoParts;
beforeAll(async () => {
  house = await openTestHouse();
  parts = { ...house.deps, config: { storiesFolder: resolve('fixtures/programs') } };
});
afterAll(() => house.close());

const scenario = demo(new Date('2026-12-01T18:00:00Z'));

async function tableSizes(): Promise<Record<string, number>> {
  const tables = ['shop', 'person', 'machine', 'tool', 'program', 'check_run', 'audit_event'];
  const counts = tables.map((table) => `(select count(*)::int from ${table}) as ${table}`);
  const [rows] = await house.deps.database.sequelize.query(`select ${counts.join(', ')}`);
  return (rows as Record<string, number>[])[0]!;
}

test('fills an empty database with the shop, its programs and a check for each', async () => {
  const signIns = await seedDemo(parts);
  expect(signIns).toEqual(
    scenario.people.map(({ email, password, roles }) => ({ email, password, roles })),
  );
  expect(await tableSizes()).toMatchObject({
    shop: 1,
    person: scenario.people.length,
    machine: 2,
    tool: 12,
    program: scenario.programs.length,
    check_run: scenario.programs.length,
  });
});

test('lets its people sign in and see their programs with job sheets', async () => {
  const visitor = house.visitor();
  const { email, password } = scenario.people[1]!;
  expect((await visitor.post('/session', { email, password })).status).toBe(201);
  const page = (await visitor.get('/programs?limit=50')).as(programPageSchema);
  expect(page.programs.map(({ name }) => name).sort()).toEqual(
    scenario.programs.map(({ name }) => name).sort(),
  );
  const carving = page.programs.find(({ name }) => name === 'relief-carving.nc')!;
  expect(carving.lines).toBe(200_000);
  const details = (await visitor.get(`/programs/${carving.id}`)).as(programDetailsSchema);
  expect(details.job?.stock?.material).toBe('lime');
  expect(details.revisions[0]?.checks[0]?.outOfDate).toBe(false);
});

test('changes nothing when it is started again, and shows no password that was changed', async () => {
  const before = await tableSizes();
  const { people } = house.deps.database.stores;
  const lead = await people.findByEmail(scenario.people[2]!.email);
  await people.change(lead!.shopId, lead!.person.id, {
    passwordHash: await house.deps.passwords.hash('another-password-now'),
  });
  const signIns = await seedDemo(parts);
  expect(await tableSizes()).toEqual(before);
  expect(signIns.map(({ email }) => email)).not.toContain(lead!.person.email);
  expect(signIns).toHaveLength(scenario.people.length - 1);
});

test('leaves a database with another shop alone', async () => {
  const other = await openTestHouse();
  try {
    await other.signedIn(await other.addShop(), 'lead');
    expect(await seedDemo({ ...parts, database: other.deps.database })).toEqual([]);
    expect(await other.deps.database.stores.people.findByEmail(scenario.people[0]!.email)).toBe(
      undefined,
    );
  } finally {
    await other.close();
  }
});
