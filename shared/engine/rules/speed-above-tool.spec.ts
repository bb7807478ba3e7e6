import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { changedTools } from '../testing/test-shop';
import { speedAboveTool } from './speed-above-tool';

describe('speed-above-tool', () => {
  test('flags a speed past what the tool may turn, also when it is raised later', () => {
    checkRule(
      speedAboveTool,
      { tools: changedTools({ 1: { maxRpm: 12000 } }) },
      `
G21 G90 G54
T1 M6
S12000 M3
S18000
^^^^^^ speed-above-tool: Turns T1 (10 mm end mill) at 18000 rev/min; it may turn at most 12000.
M30
`,
    );
  });

  test('stays silent at the greatest speed, and while the tool is not known', () => {
    checkRule(
      speedAboveTool,
      { tools: changedTools({ 1: { maxRpm: 12000 } }), loading: { inSpindle: 'unknown' } },
      `
G21 G90 G54
S18000 M3
M5
T1 M6
S12000 M3
M30
`,
    );
  });
});
