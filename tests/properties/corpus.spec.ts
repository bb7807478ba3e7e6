import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { startCheck } from '#engine';
import { reportSchema } from '#contracts';
import { testSetup } from '../../shared/engine/testing/test-shop';

/**
 * Programs that people posted, kept beside the project and never in it. Where the folder is absent the list
 * is empty, and the test holds that for every program of an empty list.
 */
const FOLDER = new URL('../../../shared/corpus/programs/', import.meta.url);
const names = existsSync(FOLDER) ? readdirSync(FOLDER).sort() : [];

/** Chunks of an odd length, so that lines are cut anywhere. */
const CHUNK = 4_093;

test('every posted program comes through a check with a report that fits its contract', () => {
  const setup = testSetup();
  const reports = names.map((name) => {
    const bytes = new Uint8Array(readFileSync(new URL(name, FOLDER)));
    const check = startCheck(setup);
    const pushAll = () => {
      for (let from = 0; from < bytes.length; from += CHUNK)
        check.push(bytes.subarray(from, from + CHUNK));
    };
    do pushAll();
    while (check.endOfText() === 'read-again');
    return check.report({ name });
  });
  expect(reports.map((report) => report.program.name)).toEqual(names);
  for (const report of reports) {
    expect(() => reportSchema.parse(report)).not.toThrow();
    expect(report.coverage.blocks).toBeGreaterThan(0);
    expect(report.coverage.modelled).toBeLessThanOrEqual(report.coverage.blocks);
  }
});
