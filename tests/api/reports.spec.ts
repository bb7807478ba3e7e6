import { afterAll, beforeAll, expect, test } from 'vitest';
import {
  benchSchema,
  checkDetailsSchema,
  findingPageSchema,
  pathSchema,
  programPageSchema,
  reportSchema,
  type FindingDocument,
  type PlanPath,
  type ReportDocument,
} from '#contracts';
import { addMachine, uploadOne } from './testing/set-up-shop';
import { openTestHouse, type SignedInClient, type TestHouse } from './testing/test-house';

let house: TestHouse;
let lead: SignedInClient;
let machineId: string;
let checkId: string;
beforeAll(async () => {
  house = await openTestHouse();
  lead = await house.signedIn(await house.addShop(), 'lead', 'programmer');
  machineId = (await addMachine(lead)).id;
  checkId = (await uploadOne(lead, machineId, { name: 'stopped.nc' })).checkId;
  await finish(
    checkId,
    report([finding(3, 'stop', 1), finding(5, 'hold', 2), finding(6, 'hold', 1)]),
  );
});
afterAll(() => house.close());

function finding(
  line: number,
  severity: FindingDocument['severity'],
  tool: number,
): FindingDocument {
  return {
    rule: severity === 'stop' ? 'beyond-travel' : 'near-travel',
    severity,
    line,
    endLine: line,
    worstLine: line,
    count: 1,
    columns: [0, 4],
    tool,
    message: `Something on line ${line}.`,
    advice: 'Look at it.',
    data: { axis: 'x', by: 34.2 },
    ...(severity === 'hold' ? { hold: 'judge' as const } : {}),
  };
}

/** A report as a worker would hand it over; what is in it is not the engine's. */
function report(findings: FindingDocument[]): ReportDocument {
  const count = (severity: string) => findings.filter((each) => each.severity === severity).length;
  const counts = { stop: count('stop'), hold: count('hold'), note: count('note') };
  const verdict = 0 < counts.stop ? 'stopped' : 0 < counts.hold ? 'held' : 'clear';
  return {
    format: 'nightlatch-report',
    version: 1,
    engine: 'test',
    program: { name: 'stopped.nc', sha256: 'a'.repeat(64), bytes: 60, lines: 9 },
    setup: { sha256: 'b'.repeat(64) },
    verdict,
    counts,
    unattended: { verdict, counts },
    findings,
    tools: [],
    extents: { gauge: null, work: {} },
    workZeroWindow: {},
    seconds: { total: 12, cutting: 3, rapid: 4, changes: 5, dwell: 0 },
    material: { used: false, cell: 0, bytes: 0 },
    coverage: { blocks: 9, modelled: 9 },
    dependsOn: { tools: [1], pockets: [1], offsets: ['G54'], pairs: [] },
    blind: [],
  };
}
const PATH: PlanPath = {
  tolerance: 0.1,
  truncated: false,
  runs: [{ tool: 1, kind: 'rapid', fromLine: 6, points: [0, 0, 10, 10] }],
};

async function finish(id: string, result: ReportDocument): Promise<void> {
  const { runs } = house.deps.database.stores.checks;
  await runs.begin(id);
  await runs.save(id, { report: result, path: PATH });
}

test('shows a check with its summary and the setup it was held against', async () => {
  const details = (await lead.get(`/checks/${checkId}`)).as(checkDetailsSchema);
  expect(details.check).toMatchObject({
    state: 'done',
    verdict: 'stopped',
    unattendedVerdict: 'stopped',
    counts: { stop: 1, hold: 2, note: 0 },
    outOfDate: false,
  });
  expect(details.summary).toMatchObject({ verdict: 'stopped', seconds: { total: 12 } });
  expect(details.setup).toMatchObject({ format: 'nightlatch-setup' });
});

test.each([
  ['', [3, 5, 6], 3],
  ['?severity=hold', [5, 6], 2],
  ['?tool=1', [3, 6], 2],
  ['?severity=hold&tool=1', [6], 1],
  ['?rule=beyond-travel', [3], 1],
  ['?offset=1&limit=1', [5], 3],
  ['?severity=note', [], 0],
])('gives the findings asked for by %j', async (query, lines, total) => {
  const page = (await lead.get(`/checks/${checkId}/findings${query}`)).as(findingPageSchema);
  expect(page.findings.map(({ line }) => line)).toEqual(lines);
  expect(page.total).toBe(total);
});

test('says what a finding can be filtered by', async () => {
  const answer = await lead.get(`/checks/${checkId}/findings?severity=awful`);
  expect(answer.problem.fields?.[0]).toMatchObject({
    path: 'severity',
    expected: 'one of "stop", "hold", "note"',
  });
});

test('gives the whole report as the file it was', async () => {
  const answer = await lead.get(`/checks/${checkId}/report`);
  expect(answer.headers['content-disposition']).toContain('"stopped.nc.report.json"');
  expect(reportSchema.parse(JSON.parse(answer.text))).toEqual(
    report([finding(3, 'stop', 1), finding(5, 'hold', 2), finding(6, 'hold', 1)]),
  );
});

test('gives the path in plan', async () => {
  expect((await lead.get(`/checks/${checkId}/path`)).as(pathSchema)).toEqual(PATH);
});

test('finds programs by verdict, name and machine, sorted and paged', async () => {
  const clear = await uploadOne(lead, machineId, { name: 'clear.nc' });
  await finish(clear.checkId, report([]));
  await uploadOne(lead, machineId, { name: 'waiting.nc' });
  const names = async (query: string) => {
    const page = (await lead.get(`/programs?${query}`)).as(programPageSchema);
    return [page.total, ...page.programs.map(({ name }) => name)];
  };
  expect(await names('verdict=stopped')).toEqual([1, 'stopped.nc']);
  expect(await names('verdict=clear')).toEqual([1, 'clear.nc']);
  expect(await names('verdict=waiting')).toEqual([1, 'waiting.nc']);
  expect(await names('search=CLEAR')).toEqual([1, 'clear.nc']);
  expect(await names('search=%25')).toEqual([0]);
  expect(await names('sort=name&direction=desc')).toEqual([
    3,
    'waiting.nc',
    'stopped.nc',
    'clear.nc',
  ]);
  expect(await names('sort=name&direction=asc&offset=1&limit=1')).toEqual([3, 'stopped.nc']);
  expect(await names(`machineId=${machineId}&verdict=held`)).toEqual([0]);
});

test('counts on the bench what waits for whom', async () => {
  const bench = (await lead.get('/bench')).as(benchSchema);
  expect(bench.counts).toMatchObject({ waiting: 1, stopped: 1, clear: 1 });
  expect(bench.machines).toMatchObject([{ name: 'North router', pockets: 8 }]);
});

test('says why a check failed, and that there is no report of it', async () => {
  const { checkId: failed } = await uploadOne(lead, machineId, { name: 'failed.nc' });
  await house.deps.database.stores.checks.runs.begin(failed);
  await house.deps.database.stores.checks.runs.fail(failed, 'The engine gave up on line 4.');
  const details = (await lead.get(`/checks/${failed}`)).as(checkDetailsSchema);
  expect(details.check).toMatchObject({
    state: 'failed',
    verdict: null,
    failure: 'The engine gave up on line 4.',
  });
  const answer = await lead.get(`/checks/${failed}/report`);
  expect(answer.problem.detail).toBe('The check failed, so there is nothing to show of it.');
  expect((await lead.get(`/checks/${failed}/findings`)).as(findingPageSchema).total).toBe(0);
});

test('checks a revision again on request, as things stand now', async () => {
  const { revisionId, checkId: first } = await uploadOne(lead, machineId, { name: 'twice.nc' });
  const answer = await lead.post(`/program-revisions/${revisionId}/checks`, { machineId });
  expect(answer.status).toBe(202);
  expect(answer.body).toMatchObject({ state: 'queued', programRevisionId: revisionId });
  expect(answer.body).not.toMatchObject({ id: first });
});
