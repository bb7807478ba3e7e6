import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { machineMoveInIncremental } from './machine-move-in-incremental';

test('flags G53 under G91 where it is refused, and where it is ignored', () => {
  checkRule(
    machineMoveInIncremental,
    { controller: { switches: { incrementalMachineMove: 'ignored' } } },
    `
G21 G91
G53 G0 Z0
^^^ machine-move-in-incremental: G53 stands under G91, which this controller ignores, so the move is relative.
M30
`,
  );
});

test('allows it where the controller obeys it, and under G90 everywhere', () => {
  checkRule(
    machineMoveInIncremental,
    {},
    `
G21 G91
G53 G0 Z0
G90 G53 G0 Z0
M30
`,
  );
});
