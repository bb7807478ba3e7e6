import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { speedAboveSpindle } from './speed-above-spindle';

describe('speed-above-spindle', () => {
  test('flags a speed past what the spindle can turn', () => {
    checkRule(
      speedAboveSpindle,
      {},
      `
G21 G90 G54
T1 M6
S30000 M3
^^^^^^^^^ speed-above-spindle: Asks for 30000 rev/min; this spindle turns at most 24000.
M30
`,
    );
  });

  test('stays silent at the greatest speed, and on an S word while the spindle stands', () => {
    checkRule(
      speedAboveSpindle,
      {},
      `
G21 G90 G54
S30000
S24000 M3
M5
M30
`,
    );
  });
});
