import { afterAll, beforeAll, expect, test } from 'vitest';
import {
  auditTrailSchema,
  loadingHistorySchema,
  machineDetailsSchema,
  machineListSchema,
  programDetailsSchema,
  revisionListSchema,
  setupSchema,
  toolListSchema,
  type MachineDetails,
} from '#contracts';
import { addMachine, northSetup, uploadOne } from './testing/set-up-shop';
import { openTestHouse, type SignedInClient, type TestHouse } from './testing/test-house';

let house: TestHouse;
let lead: SignedInClient;
let operator: SignedInClient;
let machine: MachineDetails;
beforeAll(async () => {
  house = await openTestHouse();
  const shopId = await house.addShop();
  lead = await house.signedIn(shopId, 'lead');
  operator = await house.signedIn(shopId, 'operator');
  machine = await addMachine(lead);
});
afterAll(() => house.close());

const newest = async () => (await lead.get(`/machines/${machine.id}`)).as(machineDetailsSchema);

test('makes a machine of a setup file with everything in it, and lists it', async () => {
  const { machines } = (await lead.get('/machines')).as(machineListSchema);
  expect(machines).toMatchObject([
    { id: machine.id, name: 'North router', edge: 'back', pockets: 8, revision: 1 },
  ]);
  expect((await lead.get('/tools')).as(toolListSchema).tools).toHaveLength(12);
});

test('gives back the setup file it was made of', async () => {
  const answer = await lead.get(`/machines/${machine.id}/setup`);
  expect(answer.headers['content-disposition']).toContain('"North router.setup.json"');
  const exported = setupSchema.parse(JSON.parse(answer.text));
  const imported = setupSchema.parse(northSetup());
  // The moment is that of the export, and a job sheet belongs to a program.
  expect({ ...exported, asOf: '' }).toEqual({ ...imported, asOf: '', job: undefined });
});

test('says which fields of an unreadable setup are wrong, and keeps nothing of it', async () => {
  const setup = northSetup() as unknown as Record<string, Record<string, unknown>>;
  setup['machine'] = { ...setup['machine'], name: 'Unreadable', travel: { x: [5, 1], y: 'wide' } };
  setup['rack'] = { ...setup['rack'], forks: 8 };
  const answer = await lead.post('/machines', { setup });
  expect(answer.status).toBe(400);
  const byPath = Object.fromEntries(
    (answer.problem.fields ?? []).map((field) => [field.path, field.message]),
  );
  expect(byPath).toMatchObject({
    'setup.machine.travel.x': 'The first number must not exceed the second.',
    'setup.machine.travel.y': 'y is "wide": give a list.',
    'setup.machine.travel.z': 'z is missing: give a list.',
    'setup.rack.forks': '"forks" is not known here: check its spelling or leave it out.',
  });
  expect((await lead.get('/machines')).as(machineListSchema).machines).toHaveLength(1);
});

test('says where a setup stops being JSON', async () => {
  const request = lead
    .raw('post', '/machines')
    .set('X-XSRF-TOKEN', lead.cookie('XSRF-TOKEN'))
    .set('Content-Type', 'application/json')
    .send('{"setup": {"machine": {');
  const answer = await lead.settle(request, 'post', '/machines');
  expect([answer.status, answer.problem.code]).toEqual([400, 'unreadable-body']);
  expect(answer.problem.detail).toMatch(/^The request is not JSON: .*JSON/);
});

test('refuses a second machine of the same name', async () => {
  const answer = await lead.post('/machines', { setup: northSetup() });
  expect([answer.status, answer.problem.code]).toEqual([409, 'already-there']);
  expect(answer.problem.detail).toContain('North router');
});

test('lets an operator load a tool, and checks the programs of the machine again', async () => {
  const { programId, checkId } = await uploadOne(operator, machine.id, { name: 'again.nc' });
  const before = await newest();
  const loading = { ...before.loading, pockets: before.loading.pockets.slice(1) };
  const basedOn = before.loadingRevision.number;
  const answer = await operator.put(`/machines/${machine.id}/loading`, {
    basedOn,
    reason: 'Took T1 out',
    loading,
  });
  const after = answer.as(machineDetailsSchema);
  expect(after.loading).toEqual(loading);
  expect(after.loadingRevision).toMatchObject({
    number: basedOn + 1,
    madeBy: 'Some operator',
    reason: 'Took T1 out',
  });
  const details = (await lead.get(`/programs/${programId}`)).as(programDetailsSchema);
  const checks = details.revisions[0]!.checks;
  expect(checks).toHaveLength(2);
  expect(checks.find((check) => check.id !== checkId)).toMatchObject({
    state: 'queued',
    against: { loadingRevision: basedOn + 1 },
  });
  expect(checks.find((check) => check.id === checkId)?.outOfDate).toBe(true);
  const history = (await lead.get(`/machines/${machine.id}/loading/revisions`)).as(
    loadingHistorySchema,
  );
  expect(history.revisions[0]?.loading).toEqual(loading);
  expect(history.revisions).toHaveLength(basedOn + 1);
});

test('refuses a change based on an older revision, naming who changed it and when', async () => {
  const before = await newest();
  const change = { basedOn: before.loadingRevision.number, loading: before.loading };
  expect((await operator.put(`/machines/${machine.id}/loading`, change)).status).toBe(200);
  const late = await lead.put(`/machines/${machine.id}/loading`, change);
  expect([late.status, late.problem.code]).toEqual([409, 'changed-meanwhile']);
  expect(late.problem.detail).toMatch(
    /^Some operator changed the loading on \d{4}-\d\d-\d\d at \d\d:\d\d UTC; it is now at revision \d+\. Your change was not saved\.$/,
  );
  expect((await newest()).loadingRevision.number).toBe(before.loadingRevision.number + 1);
});

test('lets only one of two changes made at the same moment through', async () => {
  const before = await newest();
  const change = { basedOn: before.offsetRevision.number, work: before.work };
  const answers = await Promise.all(
    [1, 2].map(() => lead.put(`/machines/${machine.id}/offsets`, change)),
  );
  expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
});

test('refuses a loading that names a pocket the rack lacks', async () => {
  const before = await newest();
  const pockets = [...before.loading.pockets.slice(1), { pocket: 99, tool: 1 }];
  const answer = await lead.put(`/machines/${machine.id}/loading`, {
    basedOn: before.loadingRevision.number,
    loading: { ...before.loading, pockets },
  });
  expect(answer.status).toBe(400);
  expect(answer.problem.detail).toContain('pocket 99 is not in the rack');
  expect(answer.problem.fields?.[0]?.path).toMatch(/^loading\.pockets\[\d+\]\.pocket$/);
});

test.each([
  ['description', (of: MachineDetails) => ({ machine: of.machine, controller: of.controller })],
  ['rack', (of: MachineDetails) => ({ rack: of.rack })],
  ['offsets', (of: MachineDetails) => ({ work: { ...of.work, G56: { x: 1, y: 2, z: -3 } } })],
  ['macro', () => ({ macro: { name: 'change', text: 'O9000\nM30\n' } })],
] as const)('keeps every revision of the %s', async (part, parts) => {
  const path = `/machines/${machine.id}/${part}`;
  const before = (await lead.get(`${path}/revisions`)).as(revisionListSchema).revisions;
  const answer = await lead.put(path, {
    basedOn: before[0]?.number ?? 0,
    reason: `New ${part}`,
    ...parts(await newest()),
  });
  expect(answer.status).toBe(200);
  const after = (await lead.get(`${path}/revisions`)).as(revisionListSchema).revisions;
  expect(after).toHaveLength(before.length + 1);
  expect(after[0]).toMatchObject({ madeBy: 'Some lead', reason: `New ${part}` });
});

test('takes from a setup file only what differs', async () => {
  const before = await newest();
  const answer = await lead.get(`/machines/${machine.id}/setup`);
  const setup = setupSchema.parse(JSON.parse(answer.text));
  const same = await lead.put(`/machines/${machine.id}/setup`, { setup, reason: 'Same' });
  expect(same.as(machineDetailsSchema)).toEqual(before);
  setup.rack.name = 'Longer rack';
  const changed = await lead.put(`/machines/${machine.id}/setup`, { setup, reason: 'Rack' });
  expect(changed.as(machineDetailsSchema)).toMatchObject({
    rackRevision: { number: before.rackRevision.number + 1, reason: 'Rack' },
    revision: before.revision,
    loadingRevision: before.loadingRevision,
  });
});

test('takes a rack and a loading that only fit each other', async () => {
  const lonely = await addMachine(lead, 'Changing rack');
  const text = (await lead.get(`/machines/${lonely.id}/setup`)).text;
  const setup = setupSchema.parse(JSON.parse(text));
  const last = setup.rack.pockets.pop()!;
  setup.rack.pockets.push({ ...last, number: 77 });
  setup.loading.pockets = [
    ...setup.loading.pockets.filter(({ pocket }) => pocket !== last.number),
    { pocket: 77, tool: 12 },
  ];
  const answer = await lead.put(`/machines/${lonely.id}/setup`, { setup });
  const after = answer.as(machineDetailsSchema);
  expect(after.rack).toEqual(setup.rack);
  expect(after.loading).toEqual(setup.loading);
});

test('does not let a setup file replace tools unasked', async () => {
  const setup = setupSchema.parse(northSetup());
  setup.machine.name = 'Third router';
  setup.tools[0]!.maxRpm = 9000;
  const refused = await lead.post('/machines', { setup });
  expect([refused.status, refused.problem.code]).toEqual([409, 'tools-differ']);
  expect(refused.problem.detail).toContain(`T${setup.tools[0]!.number}`);
  expect((await lead.get('/machines')).text).not.toContain('Third router');
  const taken = await lead.post('/machines', { setup, replaceTools: true });
  expect(taken.status).toBe(201);
  const { tools } = (await lead.get('/tools')).as(toolListSchema);
  expect(tools.find(({ tool }) => tool.number === setup.tools[0]!.number)?.tool.maxRpm).toBe(9000);
});

test('does not let an admin take tools or offsets in by way of a setup file', async () => {
  const admin = await house.signedIn(lead.shopId, 'admin');
  const text = (await lead.get(`/machines/${machine.id}/setup`)).text;
  const newTool = setupSchema.parse(JSON.parse(text));
  newTool.tools.push({ ...newTool.tools[0]!, number: 55 });
  const tools = await admin.put(`/machines/${machine.id}/setup`, { setup: newTool });
  expect(tools.problem.detail).toBe(
    'You are signed in as admin; taking T55 from the file needs programmer or lead.',
  );
  const offsets = setupSchema.parse(JSON.parse(text));
  offsets.offsets.work['G57'] = { x: 1 };
  const refused = await admin.put(`/machines/${machine.id}/setup`, { setup: offsets });
  expect([refused.status, refused.problem.code]).toEqual([403, 'not-allowed']);
});

test('keeps the job sheet of a program by revision', async () => {
  const { programId } = await uploadOne(lead, machine.id, { name: 'job.nc' });
  const job = {
    stock: { in: 'G54', min: { x: 0, y: 0, z: -18 }, max: { x: 400, y: 300, z: 0 } },
    zeroOn: 'top',
  };
  const path = `/programs/${programId}/job`;
  const details = (await lead.put(path, { basedOn: 0, job })).as(programDetailsSchema);
  expect(details).toMatchObject({ jobRevision: 1, job: { ...job, obstacles: [] } });
  const late = await lead.put(path, { basedOn: 0, job });
  expect([late.status, late.problem.code]).toEqual([409, 'changed-meanwhile']);
  expect(late.problem.detail).toMatch(/^Some lead changed the job sheet on /);
});

test('puts every change on record, with who made it', async () => {
  const { events, total } = (await lead.get('/audit?limit=500')).as(auditTrailSchema);
  expect(events).toHaveLength(total);
  const actions = new Set(events.map(({ action }) => action));
  for (const action of [
    'machine.add',
    'machine.import',
    'machine.change-description',
    'machine.change-rack',
    'machine.change-loading',
    'machine.change-offsets',
    'machine.change-macro',
    'program.upload',
    'program.change-job',
    'check.ask',
    'session.begin',
  ]) {
    expect(actions).toContain(action);
  }
  expect(events.every(({ person }) => person !== null)).toBe(true);
  const page = (await lead.get('/audit?offset=2&limit=3')).as(auditTrailSchema);
  expect(page.events).toEqual(events.slice(2, 5));
});
