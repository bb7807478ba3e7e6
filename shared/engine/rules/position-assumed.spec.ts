import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { positionAssumed } from './position-assumed';

test('flags G92 with axis words', () => {
  checkRule(
    positionAssumed,
    {},
    `
G21 G90 G54
G92 X0 Y0
^^^^^^^^^ position-assumed (hold, unattended stop): G92 takes the place where the head stands now as the one it states.
M30
`,
  );
});

test('allows G92 as a speed limit and its cancelling forms', () => {
  checkRule(
    positionAssumed,
    {},
    `
G21 G90 G54
G92.1
G52 X10
G52 X0
M30
`,
  );
});
