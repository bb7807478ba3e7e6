import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { changedTools } from '../testing/test-shop';
import { notMeasured } from './not-measured';

test('flags a length that was never measured, once', () => {
  checkRule(
    notMeasured,
    { tools: changedTools({ 1: { measured: null } }) },
    `
T1 M6
^^^^^ not-measured (hold, unattended stop): The length of T1 (10 mm end mill) has never been measured.
T2 M6
T1 M6
M30
`,
  );
});

test('flags a tool touched since, and one measured too long ago', () => {
  checkRule(
    notMeasured,
    {
      tools: changedTools({
        1: { touched: '2026-11-30T18:30:00Z' },
        2: { measured: { at: '2026-10-20T18:00:00Z', method: 'setter' } },
      }),
    },
    `
T1 M6
^^^^^ not-measured: The length of T1 (10 mm end mill) was measured before the tool was last touched.
T2 M6
^^^^^ not-measured: The length of T2 (6 mm end mill) was measured 42 days ago; the shop allows 30.
M30
`,
  );
});

test('judges no age without a moment to judge it by', () => {
  checkRule(
    notMeasured,
    {
      asOf: undefined,
      tools: changedTools({ 2: { measured: { at: '2020-10-20T18:00:00Z', method: 'setter' } } }),
    },
    `
T2 M6
M30
`,
  );
});

test('allows unmeasured tools where the macro measures them', () => {
  checkRule(
    notMeasured,
    {
      controller: { lengthScheme: 'measured-in-macro' },
      tools: changedTools({ 1: { measured: null } }),
    },
    `
T1 M6
M30
`,
  );
});
