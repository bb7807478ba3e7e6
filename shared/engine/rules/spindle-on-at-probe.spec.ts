import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { spindleOnAtProbe } from './spindle-on-at-probe';

describe('spindle-on-at-probe', () => {
  test('flags a probing move with the spindle turning', () => {
    checkRule(
      spindleOnAtProbe,
      {},
      `
G21 G90 G54
S9000 M3
G38.2 Z-5 F100
^^^^^ spindle-on-at-probe: The head probes here with the spindle turning.
M30
`,
    );
  });

  test('stays silent after M5', () => {
    checkRule(
      spindleOnAtProbe,
      {},
      `
G21 G90 G54
S9000 M3
M5
G38.2 Z-5 F100
M30
`,
    );
  });
});
