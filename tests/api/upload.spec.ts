import { createHash, randomBytes } from 'node:crypto';
import { request as httpRequest } from 'node:http';
import { afterAll, beforeAll, expect, test } from 'vitest';
import {
  checkDetailsSchema,
  blockWordsSchema,
  lineRangeSchema,
  programDetailsSchema,
  programPageSchema,
  uploadResultSchema,
} from '#contracts';
import type { UploadFile } from './testing/client';
import { addMachine, SHORT_PROGRAM, uploadOne } from './testing/set-up-shop';
import { openTestHouse, type SignedInClient, type TestHouse } from './testing/test-house';

const LIMIT = 64 * 1024;
const PNG = Buffer.concat([
  Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
  randomBytes(20_000),
]);

let house: TestHouse;
let lead: SignedInClient;
let machineId: string;
beforeAll(async () => {
  house = await openTestHouse();
  lead = await house.signedIn(await house.addShop(), 'lead', 'programmer');
  machineId = (await addMachine(lead)).id;
  await lead.patch('/shop', { uploadLimitBytes: LIMIT });
});
afterAll(() => house.close());

async function upload(...files: UploadFile[]) {
  const answer = await lead.upload(`/programs?machineId=${machineId}`, files);
  return answer.as(uploadResultSchema).files;
}
async function programNames(): Promise<string[]> {
  const page = (await lead.get('/programs?limit=200')).as(programPageSchema);
  return page.programs.map((program) => program.name);
}

test('stores a program, knows its bytes and lines, and queues its check', async () => {
  const { programId, revisionId, checkId } = await uploadOne(lead, machineId, { name: 'first.nc' });
  const details = (await lead.get(`/programs/${programId}`)).as(programDetailsSchema);
  expect(details.program).toMatchObject({
    name: 'first.nc',
    revision: 1,
    revisionId,
    sha256: createHash('sha256').update(SHORT_PROGRAM).digest('hex'),
    bytes: SHORT_PROGRAM.length,
    lines: 9,
    uploadedBy: 'Some lead and programmer',
  });
  const check = (await lead.get(`/checks/${checkId}`)).as(checkDetailsSchema);
  expect(check.check).toMatchObject({ state: 'queued', programId, machineId, lines: 9 });
  expect(check.setup).toMatchObject({ machine: { name: 'North router' } });
});

test('makes a new revision of the program of that name, and none for the same bytes', async () => {
  const name = 'revised.nc';
  const one = await uploadOne(lead, machineId, { name });
  const [same] = await upload({ name, content: SHORT_PROGRAM });
  expect(same).toMatchObject({ outcome: 'stored', unchanged: true, revision: 1 });
  expect(same).not.toMatchObject({ checkId: one.checkId });
  const [other] = await upload({ name, content: 'G21\nM30\n' });
  expect(other).toMatchObject({ unchanged: false, revision: 2, programId: one.programId });
});

test('keeps two files of one name in one drop as two revisions, in their order', async () => {
  const name = 'twice.nc';
  const files = await upload({ name, content: 'G21\n' }, { name, content: 'G20\n' });
  expect(files).toMatchObject([{ revision: 1 }, { revision: 2 }]);
});

test('gives each of many files its own outcome, in the order sent', async () => {
  const files = await upload(
    { name: 'good.nc', content: SHORT_PROGRAM },
    { name: 'picture.nc', content: PNG },
    { name: 'wide.nc', content: Buffer.from('G21 M30', 'utf16le') },
    { name: 'long.nc', content: 'G1 X1\n'.repeat(20_000) },
    { name: 'also-good.nc', content: 'G20\nM30\n' },
  );
  expect(files).toMatchObject([
    { outcome: 'stored', name: 'good.nc' },
    {
      outcome: 'refused',
      name: 'picture.nc',
      code: 'not-text',
      reason: 'It is a PNG picture, not program text.',
    },
    { outcome: 'refused', name: 'wide.nc', code: 'utf-16' },
    {
      outcome: 'refused',
      name: 'long.nc',
      code: 'too-large',
      reason: 'It is larger than 64 kB, the most this shop takes in one file.',
    },
    { outcome: 'stored', name: 'also-good.nc' },
  ]);
  const names = await programNames();
  expect(names).toContain('also-good.nc');
  expect(names).not.toContain('picture.nc');
  expect(names).not.toContain('long.nc');
});

test('takes a file of exactly the limit', async () => {
  const [file] = await upload({
    name: 'exact.nc',
    content: 'G0 X1234\n'.repeat(LIMIT).slice(0, LIMIT),
  });
  expect(file).toMatchObject({ outcome: 'stored' });
});

test('stores an empty file: its check says what is wrong with it', async () => {
  const [file] = await upload({ name: 'empty.nc', content: '' });
  expect(file).toMatchObject({ outcome: 'stored', name: 'empty.nc' });
  if (file?.outcome !== 'stored') return;
  const lines = await lead.get(`/program-revisions/${file.revisionId}/lines?from=1&to=10`);
  expect(lines.as(lineRangeSchema).lines).toEqual([]);
  const text = await lead.get(`/program-revisions/${file.revisionId}/text`);
  expect(text.headers['content-length']).toBe('0');
});

test('reads a file whose lines end in carriage returns alone', async () => {
  const { revisionId } = await uploadOne(lead, machineId, {
    name: 'cr.nc',
    content: 'G21\rG90\rM30\r',
  });
  const lines = await lead.get(`/program-revisions/${revisionId}/lines?from=2&to=3`);
  expect(lines.as(lineRangeSchema)).toEqual({ from: 2, lines: ['G90', 'M30'], total: 3 });
});

test('spells out the words of one block, and says when they are not all of it', async () => {
  const { revisionId } = await uploadOne(lead, machineId, {
    name: 'words.nc',
    content: 'G21\nN20 G1 X12.5 (EDGE)\nG0 X[1+2]\nM30\n',
  });
  const words = async (line: number) =>
    (await lead.get(`/program-revisions/${revisionId}/words?line=${line}`)).as(blockWordsSchema);
  expect(await words(2)).toEqual({
    line: 2,
    words: [
      { letter: 'G', value: 1 },
      { letter: 'X', value: 12.5 },
    ],
    comments: ['EDGE'],
    isPlain: true,
  });
  expect((await words(3)).isPlain).toBe(false);
  expect((await words(9)).words).toEqual([]);
});

test('gives back the bytes exactly as they came, under the name of the program', async () => {
  const content = Buffer.from('G21\r\n(pl\xe2que)\r\nM30', 'latin1');
  const { revisionId } = await uploadOne(lead, machineId, { name: 'plâque ø.nc', content });
  const path = `/program-revisions/${revisionId}/text`;
  const request = lead
    .raw('get', path)
    .buffer(true)
    .parse((response, done) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () => done(null, Buffer.concat(chunks)));
    });
  const answer = await lead.settle(request, 'get', path);
  expect(answer.body).toEqual(content);
  expect(answer.headers['content-disposition']).toBe(
    `attachment; filename="pl_que _.nc"; filename*=UTF-8''pl%C3%A2que%20%C3%B8.nc`,
  );
  expect(answer.headers['x-content-type-options']).toBe('nosniff');
});

test('never takes the name of a file for a path', async () => {
  const [file] = await upload({ name: '../../etc/passwd', content: SHORT_PROGRAM });
  expect(file).toMatchObject({ outcome: 'stored', name: 'passwd' });
});

test('keeps nothing of a file whose sender went away, and all of the file before it', async () => {
  const boundary = 'seam';
  const part = (name: string, text: string) =>
    `--${boundary}\r\nContent-Disposition: form-data; name="files"; filename="${name}"\r\n` +
    `Content-Type: text/plain\r\n\r\n${text}`;
  const socket = httpRequest(`${house.address}/api/v1/programs?machineId=${machineId}`, {
    method: 'POST',
    headers: {
      Cookie: lead.cookies(),
      'X-XSRF-TOKEN': lead.cookie('XSRF-TOKEN'),
      'Content-Type': `multipart/form-data; boundary=${boundary}`,
      'Content-Length': 60_000,
    },
  });
  const gone = new Promise((resolve) => socket.on('error', resolve));
  socket.write(`${part('whole.nc', 'G21\nM30\n')}\r\n${part('broken.nc', 'G0 X1\n'.repeat(2000))}`);
  await until(async () => (await programNames()).includes('whole.nc'));
  socket.destroy();
  await gone;
  await until(async () => (await openTransactions()) === 0);
  expect(await programNames()).not.toContain('broken.nc');
  expect(await pendingTexts()).toBe(0);
  // The turn of the broken upload was given back: the next one goes through.
  expect(await upload({ name: 'after.nc', content: 'M30\n' })).toMatchObject([
    { outcome: 'stored' },
  ]);
});

test('says so when a form ends in the middle of a file', async () => {
  const body =
    '--seam\r\nContent-Disposition: form-data; name="files"; filename="cut.nc"\r\n\r\nG0 X1\nG0 X';
  const path = `/programs?machineId=${machineId}`;
  const request = lead
    .raw('post', path)
    .set('X-XSRF-TOKEN', lead.cookie('XSRF-TOKEN'))
    .set('Content-Type', 'multipart/form-data; boundary=seam')
    .send(body);
  const answer = await lead.settle(request, 'post', path);
  expect([answer.status, answer.problem.code]).toEqual([400, 'upload-broken-off']);
  expect(await programNames()).not.toContain('cut.nc');
});

test.each([
  ['JSON', { type: 'application/json', body: '{}' }],
  ['a form without a file', { type: 'multipart/form-data; boundary=seam', body: '--seam--\r\n' }],
  [
    'a form with its file in another field',
    {
      type: 'multipart/form-data; boundary=seam',
      body: '--seam\r\nContent-Disposition: form-data; name="x"; filename="a.nc"\r\n\r\nM30\r\n--seam--\r\n',
    },
  ],
])('says what it wants instead of %s', async (_what, { type, body }) => {
  const path = `/programs?machineId=${machineId}`;
  const request = lead
    .raw('post', path)
    .set('X-XSRF-TOKEN', lead.cookie('XSRF-TOKEN'))
    .set('Content-Type', type)
    .send(body);
  const answer = await lead.settle(request, 'post', path);
  expect([answer.status, answer.problem.code]).toEqual([415, 'not-multipart']);
  expect(answer.problem.detail).toContain('"files"');
});

test('asks for the machine to check on', async () => {
  const answer = await lead.upload('/programs', [{ name: 'a.nc', content: 'M30\n' }]);
  expect(answer.problem.fields?.[0]?.path).toBe('machineId');
});

test('refuses the wrong ranges of lines with the reason', async () => {
  const { revisionId } = await uploadOne(lead, machineId, { name: 'ranges.nc' });
  const ask = (query: string) => lead.get(`/program-revisions/${revisionId}/lines?${query}`);
  expect((await ask('from=5&to=2')).problem.detail).toBe('to is 2: give 5 or more, as from is 5.');
  expect((await ask('from=1&to=2001')).problem.detail).toContain('2000 sent at once');
  expect((await ask('from=0&to=2')).problem.fields?.[0]?.path).toBe('from');
  expect((await ask('from=8&to=2000')).as(lineRangeSchema)).toMatchObject({
    lines: ['M30', '%'],
    total: 9,
  });
});

async function openTransactions(): Promise<number> {
  return await count(
    `select count(*)::int as count from pg_stat_activity
     where datname = current_database() and state = 'idle in transaction'`,
  );
}
async function pendingTexts(): Promise<number> {
  return await count('select count(*)::int as count from program_text where sha256 is null');
}
async function count(sql: string): Promise<number> {
  const [rows] = await house.deps.database.sequelize.query(sql);
  return (rows as { count: number }[])[0]?.count ?? -1;
}
/** Asks again until it is so; the test's own time limit ends it. */
async function until(isSo: () => Promise<boolean>): Promise<void> {
  while (!(await isSo())) await new Promise((resolve) => setTimeout(resolve, 20));
}
