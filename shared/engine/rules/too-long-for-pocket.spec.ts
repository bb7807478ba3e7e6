import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { changedTools } from '../testing/test-shop';
import { tooLongForPocket } from './too-long-for-pocket';

test('flags a tool longer than its pocket takes', () => {
  checkRule(
    tooLongForPocket,
    { tools: changedTools({ 1: { gaugeLength: 190.5, stickOut: 135.5 } }) },
    `
T1 M6
^^^^^ too-long-for-pocket: T1 (10 mm end mill) is 190.5 mm (7.5 in) long from the gauge line; pocket 1 takes 190 mm (7.48 in).
M30
`,
  );
});

test('allows one exactly as long, and a long one fitted by hand', () => {
  checkRule(
    tooLongForPocket,
    {
      tools: changedTools({ 1: { gaugeLength: 190 }, 2: { gaugeLength: 250 } }),
      loading: { pockets: [{ pocket: 1, tool: 1 }], byHand: [2] },
    },
    `
T1 M6
T2 M6
M30
`,
  );
});
