import { expect, test } from 'vitest';
import { readProgram, RefusedFile, spokenSize } from './read-program';

async function* pieces(...texts: (string | Uint8Array)[]): AsyncGenerator<Uint8Array> {
  for (const text of texts) yield typeof text === 'string' ? Buffer.from(text) : text;
}
async function readAll(source: AsyncIterable<Uint8Array>, limit = 1_000_000): Promise<Buffer> {
  const read: Uint8Array[] = [];
  for await (const chunk of readProgram(source, limit)) read.push(chunk);
  return Buffer.concat(read);
}

test('passes every byte on, however it is cut', async () => {
  const text = 'G0 X1\r'.repeat(5000);
  const cut = Array.from({ length: Math.ceil(text.length / 7) }, (_, at) =>
    text.slice(at * 7, at * 7 + 7),
  );
  expect((await readAll(pieces(...cut))).toString()).toBe(text);
});

test('passes an empty file on: the check says what is wrong with it', async () => {
  expect(await readAll(pieces())).toHaveLength(0);
  expect(await readAll(pieces(''))).toHaveLength(0);
});

test('takes a file of exactly the limit and refuses one byte more', async () => {
  expect(await readAll(pieces('G'.repeat(60), 'G'.repeat(40)), 100)).toHaveLength(100);
  await expect(readAll(pieces('G'.repeat(60), 'G'.repeat(41)), 100)).rejects.toMatchObject({
    why: {
      code: 'too-large',
      reason: 'It is larger than 100 bytes, the most this shop takes in one file.',
    },
  });
});

test('refuses a picture before anything of it is passed on', async () => {
  const png = Uint8Array.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
  const reader = readProgram(
    pieces(png.subarray(0, 3), png.subarray(3), new Uint8Array(9000)),
    1e6,
  );
  await expect(reader.next()).rejects.toBeInstanceOf(RefusedFile);
});

test('reads nothing further once it has refused', async () => {
  let taken = 0;
  async function* endless(): AsyncGenerator<Uint8Array> {
    for (;;) {
      taken += 1;
      yield Buffer.alloc(1000, 'G');
    }
  }
  await expect(readAll(endless(), 20_000)).rejects.toBeInstanceOf(RefusedFile);
  expect(taken).toBe(21);
});

test.each([
  [1023, '1023 bytes'],
  [1024, '1 kB'],
  [268_435_456, '256 MB'],
  [1_610_612_736, '1.5 GB'],
])('spells %i bytes as %s', (bytes, spelt) => {
  expect(spokenSize(bytes)).toBe(spelt);
});
