import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { feedAboveMachine } from './feed-above-machine';

describe('feed-above-machine', () => {
  test('notes a feed that an axis cannot follow', () => {
    checkRule(
      feedAboveMachine,
      {},
      `
G21 G90 G54
T1 M6
G1 X100 F20000
        ^^^^^^ feed-above-machine (note): Feeds at 20000 mm/min (787 in/min); along this path the machine can do 15000 mm/min (591 in/min).
M30
`,
    );
  });

  test('stays silent where two axes share the feed, and on rapids', () => {
    checkRule(
      feedAboveMachine,
      {},
      `
G21 G90 G54
T1 M6
G0 X0 Y0
G1 X100 Y100 F21000
G0 X0 Y0 F90000
M30
`,
    );
  });
});
