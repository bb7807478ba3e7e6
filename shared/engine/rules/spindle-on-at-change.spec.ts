import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { spindleOnAtChange } from './spindle-on-at-change';

describe('spindle-on-at-change', () => {
  test('flags a change called while the spindle turns', () => {
    checkRule(
      spindleOnAtChange,
      { controller: { changeStopsSpindle: false } },
      `
G21 G90 G54
T1 M6
S18000 M3
T2 M6
^^^^^ spindle-on-at-change (stop): The spindle still turns clockwise as the tool change is called, started at line 3.
M30
`,
    );
  });

  test('flags an M5 that stands on the change block itself', () => {
    checkRule(
      spindleOnAtChange,
      { controller: { changeStopsSpindle: false } },
      `
G21 G90 G54
T1 M6
S18000 M3
M5 T2 M6
   ^^^^^ spindle-on-at-change
M30
`,
    );
  });

  test('stays silent after M5, and where the controller stops the spindle by itself', () => {
    checkRule(
      spindleOnAtChange,
      {},
      `
G21 G90 G54
T1 M6
S18000 M3
T2 M6
S18000 M3
M5
T3 M6
M30
`,
    );
  });

  test('only holds it where a macro that was not walked may stop the spindle', () => {
    checkRule(
      spindleOnAtChange,
      { controller: { changeStopsSpindle: false, toolChange: 'macro' } },
      `
G21 G90 G54
T1 M6
S18000 M3
T2 M6
^^^^^ spindle-on-at-change (hold, unattended stop)
M30
`,
    );
  });
});
