import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { reportSchema } from '#contracts';
import { checkStory, storyFile, storyNames } from './stories';

/** `npm run golden:accept` rewrites the reports; the difference is reviewed like code. */
describe('every story gives its report, byte for byte', () => {
  test.each(storyNames())('%s', (name) => {
    const report = checkStory(name);
    expect(reportSchema.safeParse(report).error).toBeUndefined();
    expect(`${JSON.stringify(report, null, 2)}\n`).toBe(
      readFileSync(storyFile(name, 'report.json'), 'utf8'),
    );
  });
});
