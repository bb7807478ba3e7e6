import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { speedNotStated } from './speed-not-stated';

describe('speed-not-stated', () => {
  test('flags a start when no S word comes before the first feed move', () => {
    checkRule(
      speedNotStated,
      {},
      `
G21 G90 G54
T1 M6
M3
^^ speed-not-stated: M3 starts the spindle, and the program has not said how fast.
G0 X5
G1 X10 F500
M30
`,
    );
  });

  test('stays silent when S stands before, beside or just after the start, and for a second tool', () => {
    checkRule(
      speedNotStated,
      {},
      `
G21 G90 G54
T1 M6
M3
S18000
G1 X10 F500
M5
T2 M6
M3
G1 X20
M30
`,
    );
  });

  test('stays silent on a spindle with one speed', () => {
    checkRule(
      speedNotStated,
      { machine: { spindle: { minRpm: 18000, maxRpm: 18000 } } },
      `
G21 G90 G54
M3
G1 X10 F500
M30
`,
    );
  });
});
