import { CHUNK, LINES_AT_ONCE, LineCache } from './line-cache';

const numbered = (from: number, count: number): string[] =>
  Array.from({ length: count }, (_, index) => `line ${from + index}`);

test('asks for whole chunks, once', () => {
  const cache = new LineCache();
  expect(cache.ask([{ from: 5, to: 7 }], 1000)).toEqual([{ from: 1, to: CHUNK }]);
  expect(cache.ask([{ from: 5, to: 7 }], 1000)).toEqual([]);
});

test('gives a line once its chunk has come', () => {
  const cache = new LineCache();
  cache.ask([{ from: 201, to: 201 }], 1000);
  expect(cache.text(201)).toBeUndefined();
  cache.keep(201, numbered(201, CHUNK));
  expect(cache.text(201)).toBe('line 201');
  expect(cache.text(400)).toBe('line 400');
  expect(cache.text(401)).toBeUndefined();
});

test('neighbouring chunks go in one request, up to what the server hands out', () => {
  const cache = new LineCache();
  const requests = cache.ask([{ from: 1, to: 5000 }], 1_000_000);
  expect(requests).toEqual([
    { from: 1, to: 2000 },
    { from: 2001, to: 4000 },
    { from: 4001, to: 5000 },
  ]);
  for (const { from, to } of requests) expect(to - from + 1).toBeLessThanOrEqual(LINES_AT_ONCE);
});

test('never asks past the last line', () => {
  expect(new LineCache().ask([{ from: 430, to: 450 }], 433)).toEqual([{ from: 401, to: 433 }]);
});

test('an answer of several chunks serves all of them', () => {
  const cache = new LineCache();
  cache.ask([{ from: 1, to: 600 }], 1000);
  cache.keep(1, numbered(1, 600));
  expect([1, 200, 201, 600].map((line) => cache.text(line))).toEqual([
    'line 1',
    'line 200',
    'line 201',
    'line 600',
  ]);
});

test('after a failure the same lines may be asked for again', () => {
  const cache = new LineCache();
  const [request] = cache.ask([{ from: 1, to: 1 }], 1000);
  cache.giveUp(request!);
  expect(cache.ask([{ from: 1, to: 1 }], 1000)).toEqual([request]);
});

test('lets go of what was seen least lately, and can ask for it again', () => {
  const cache = new LineCache();
  const last = 1_000_000;
  for (let chunk = 0; chunk < 501; chunk += 1) {
    const from = chunk * CHUNK + 1;
    cache.ask([{ from, to: from }], last);
    cache.keep(from, numbered(from, CHUNK));
    // The first chunk stays in view all the while.
    if (chunk > 0) cache.ask([{ from: 1, to: 1 }], last);
  }
  expect(cache.text(1)).toBe('line 1');
  expect(cache.text(201)).toBeUndefined();
  expect(cache.ask([{ from: 201, to: 201 }], last)).toHaveLength(1);
});
