import { describe, test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { cutNoFeed } from './cut-no-feed';

describe('cut-no-feed', () => {
  test('flags a feed move before any F word', () => {
    checkRule(
      cutNoFeed,
      {},
      `
G21 G90 G54
G1 X10
^^^^^^ cut-no-feed: G1 moves here, and no feed is in force.
M30
`,
    );
  });

  test('stays silent once a feed is stated, on or before the block', () => {
    checkRule(
      cutNoFeed,
      {},
      `
G21 G90 G54
F500
G1 X10
G0 X0
G1 X20
G2 X30 R5
M30
`,
    );
  });
});
