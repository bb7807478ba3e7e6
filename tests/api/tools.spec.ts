import { afterAll, beforeAll, expect, test } from 'vitest';
import {
  auditTrailSchema,
  revisionListSchema,
  toolListSchema,
  toolRecordSchema,
  type ToolRecord,
} from '#contracts';
import { addMachine } from './testing/set-up-shop';
import { openTestHouse, type SignedInClient, type TestHouse } from './testing/test-house';

let house: TestHouse;
let lead: SignedInClient;
let operator: SignedInClient;
beforeAll(async () => {
  house = await openTestHouse();
  const shopId = await house.addShop();
  lead = await house.signedIn(shopId, 'lead');
  operator = await house.signedIn(shopId, 'operator');
  await addMachine(lead);
});
afterAll(() => house.close());

const tool = async (number: number): Promise<ToolRecord> => {
  const { tools } = (await lead.get('/tools')).as(toolListSchema);
  return tools.find((each) => each.tool.number === number)!;
};

test('adds a tool, changes it by revision, and refuses its number twice', async () => {
  const { tool: like } = await tool(2);
  const added = await lead.post('/tools', { tool: { ...like, number: 40 }, lengthOffset: 80 });
  const record = added.as(toolRecordSchema);
  expect(record).toMatchObject({ lengthOffset: 80, diameterOffset: null, places: [] });
  const twice = await lead.post('/tools', { tool: { ...like, number: 40 } });
  expect([twice.status, twice.problem.code]).toEqual([409, 'already-there']);
  const change = { basedOn: 1, reason: 'Reground', tool: { ...record.tool, name: 'Reground' } };
  const changed = (await lead.put(`/tools/${record.id}`, change)).as(toolRecordSchema);
  expect(changed).toMatchObject({ tool: { name: 'Reground' }, revision: { number: 2 } });
  const late = await lead.put(`/tools/${record.id}`, change);
  expect(late.problem.detail).toMatch(/^Some lead changed the tool on /);
  const revisions = (await lead.get(`/tools/${record.id}/revisions`)).as(revisionListSchema);
  expect(revisions.revisions.map(({ number }) => number)).toEqual([2, 1]);
});

test('refuses a tool whose lengths contradict each other', async () => {
  const { tool: like } = await tool(2);
  const answer = await lead.post('/tools', {
    tool: { ...like, number: 41, gaugeLength: like.stickOut - 10 },
  });
  expect(answer.problem.fields?.[0]).toMatchObject({ path: 'tool.gaugeLength' });
});

test('keeps the number of a tool that sits in a pocket', async () => {
  const record = (await lead.get('/tools'))
    .as(toolListSchema)
    .tools.find(({ places }) => 0 < places.length)!;
  const answer = await lead.put(`/tools/${record.id}`, {
    basedOn: record.revision.number,
    tool: { ...record.tool, number: 90 },
  });
  expect([answer.status, answer.problem.code]).toEqual([409, 'not-possible-now']);
  expect(answer.problem.detail).toContain('sits in pocket');
});

test('records a measured length, with or without the table', async () => {
  const record = await tool(2);
  const longer = record.tool.gaugeLength + 1.25;
  const answer = await operator.post(`/tools/${record.id}/measurements`, {
    gaugeLength: longer,
    method: 'setter',
  });
  const measured = answer.as(toolRecordSchema);
  expect(measured.tool).toMatchObject({ gaugeLength: longer, measured: { method: 'setter' } });
  expect(measured.tool.stickOut).toBeCloseTo(record.tool.stickOut + 1.25, 6);
  expect(measured.lengthOffset).toBe(longer);
  const untouched = await operator.post(`/tools/${record.id}/measurements`, {
    gaugeLength: longer + 1,
    method: 'block',
    inTable: false,
  });
  expect(untouched.as(toolRecordSchema).lengthOffset).toBe(longer);
});

test('refuses a measured length that the holder alone is longer than', async () => {
  const record = await tool(2);
  const answer = await operator.post(`/tools/${record.id}/measurements`, {
    gaugeLength: 1,
    method: 'setter',
  });
  expect(answer.status).toBe(400);
  expect(answer.problem.detail).toContain('its holder alone is longer');
  expect((await tool(2)).revision).toEqual(record.revision);
});

test('puts every change of a tool on record', async () => {
  const { events } = (await lead.get('/audit?limit=500')).as(auditTrailSchema);
  const actions = events.map(({ action, person }) => `${person} ${action}`);
  expect(actions).toContain('Some lead tool.add');
  expect(actions).toContain('Some lead tool.change');
  expect(actions.filter((each) => each === 'Some operator tool.measure')).toHaveLength(2);
});
