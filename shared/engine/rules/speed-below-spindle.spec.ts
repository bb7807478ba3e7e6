import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { speedBelowSpindle } from './speed-below-spindle';

describe('speed-below-spindle', () => {
  test('holds a speed under what the spindle can turn', () => {
    checkRule(
      speedBelowSpindle,
      {},
      `
G21 G90 G54
T1 M6
S900 M3
^^^^^^^ speed-below-spindle (hold): Asks for 900 rev/min; this spindle turns at least 6000.
M30
`,
    );
  });

  test('stays silent at the least speed, on S0 and when the spindle stands', () => {
    checkRule(
      speedBelowSpindle,
      {},
      `
G21 G90 G54
T1 M6
S6000 M3
M5
S0 M3
M5 S900
M30
`,
    );
  });
});
