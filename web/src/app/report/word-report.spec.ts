import type { CheckDetails, MachineDetails } from '#contracts';
import { shortHash, wordChanges, wordCounts, wordCoverage, wordLines } from './word-report';

describe('counts as a sentence', () => {
  const rows: [stop: number, hold: number, note: number, sentence: string][] = [
    [0, 0, 0, 'Nothing was found.'],
    [1, 0, 0, '1 finding forbids this run.'],
    [3, 1, 1, '3 findings forbid this run, 1 waits for an answer, 1 is worth knowing.'],
    [0, 2, 0, '2 findings wait for an answer.'],
    [0, 0, 5, '5 findings are worth knowing.'],
    [1, 0, 2, '1 finding forbids this run, 2 are worth knowing.'],
  ];
  test.each(rows)('%i stops, %i holds, %i notes', (stop, hold, note, sentence) => {
    expect(wordCounts({ stop, hold, note })).toBe(sentence);
  });
});

describe('coverage as a sentence', () => {
  const of = (lines: number, blocks: number, modelled: number) =>
    wordCoverage({
      program: { name: 'a.nc', sha256: '', bytes: 0, lines },
      coverage: { blocks, modelled },
    });
  test('all lines were understood', () => {
    expect(of(58025, 57000, 57000)).toBe('All 58\u202f025 lines were understood.');
  });
  test('some were not: it never says all', () => {
    expect(of(100, 90, 88)).toBe(
      '2 lines of 90 blocks could not be followed: the check says nothing about them.',
    );
  });
  test('a program with nothing to run is not praised', () => {
    expect(of(3, 0, 0)).toBe('No line holds anything to run.');
  });
});

describe('what has changed since', () => {
  const details = {
    check: {
      programRevision: 3,
      against: {
        machineRevision: 2,
        rackRevision: 1,
        loadingRevision: 41,
        offsetRevision: 12,
        macroRevision: null,
      },
    },
    newestRevision: 3,
  } as unknown as CheckDetails;
  const now = (change: object) =>
    ({
      revision: { number: 2 },
      rackRevision: { number: 1 },
      loadingRevision: { number: 41 },
      offsetRevision: { number: 12 },
      macroRevision: null,
      ...change,
    }) as unknown as MachineDetails;

  test('nothing', () => {
    expect(wordChanges(details, now({}))).toEqual([]);
  });
  test('the loading, by its revisions', () => {
    expect(wordChanges(details, now({ loadingRevision: { number: 42 } }))).toEqual([
      'The loading is at revision 42 now; the check was held against 41.',
    ]);
  });
  test('a macro that did not exist then', () => {
    expect(wordChanges(details, now({ macroRevision: { number: 1 } }))).toEqual([
      'The change macro is at revision 1 now; the check was held against none.',
    ]);
  });
  test('a newer program, even when the machine could not be read', () => {
    expect(wordChanges({ ...details, newestRevision: 4 }, null)).toEqual([
      'The program has a newer revision: 4; this is 3.',
    ]);
  });
});

test('a hash is shortened so that both ends can be compared', () => {
  expect(shortHash(`9f2c${'0'.repeat(56)}b41e`)).toBe('9f2c…b41e');
});

test('lines are gathered into ranges, and the rest counted', () => {
  expect(wordLines([44, 12, 41, 40, 43, 42, 12])).toBe('12, 40–44');
  expect(wordLines([1, 3, 5, 7, 8], 2)).toBe('1, 3 and 3 more');
});
