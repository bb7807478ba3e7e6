import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { splitMachineMove } from './split-machine-move';

test('flags axis words that slipped into the block after G53', () => {
  checkRule(
    splitMachineMove,
    {},
    `
G21 G90 G54
G0 G53
   ^^^ split-machine-move: G53 stands without axis words, and those of the next block run in work coordinates.
Z0
M30
`,
  );
});

test('allows G53 with its axis words in one block', () => {
  checkRule(
    splitMachineMove,
    {},
    `
G21 G90 G54
G53 G0 Z0
G0 X0 Y0
G28
M30
`,
  );
});
