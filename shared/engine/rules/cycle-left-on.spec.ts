import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { cycleLeftOn } from './cycle-left-on';

describe('cycle-left-on', () => {
  test('flags a cycle in force at a change and at a change of work offset', () => {
    checkRule(
      cycleLeftOn,
      { offsets: { work: { G55: { x: 30, y: 40, z: -182 } } } },
      `
G21 G90 G54
T1 M6
G0 Z10
G81 X10 Y10 Z-5 R2 F500
G55
^^^ cycle-left-on: G81 is still in force as the work offset changes, set at line 4.
T2 M6
^^^^^ cycle-left-on: G81 is still in force at the tool change, set at line 4.
M30
`,
    );
  });

  test('stays silent on bare holes, on G80 and on an end code that cancels the cycle', () => {
    checkRule(
      cycleLeftOn,
      {},
      `
G21 G90 G54
T1 M6
G0 Z10
G81 X10 Y10 Z-5 R2 F500
X20
Y20
G80
T2 M6
G0 Z10
G98 G83 X10 Y10 Z-5 R2 Q2 F500
X30
M30
`,
    );
  });
});
