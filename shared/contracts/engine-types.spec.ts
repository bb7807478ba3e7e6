import { expectTypeOf, test } from 'vitest';
import type { Report, Setup } from '#engine';
import type { ReportDocument, ValidSetup } from './index';

/** Contracts mirror engine types: `npm run typecheck` fails when they part. */
test('a validated setup is what the engine takes', () => {
  expectTypeOf<ValidSetup>().toExtend<Setup>();
});
test('what the engine reports is what the report contract describes', () => {
  expectTypeOf<ReportDocument>().toExtend<Report>();
});
