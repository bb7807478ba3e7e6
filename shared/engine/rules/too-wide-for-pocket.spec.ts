import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { changedTools } from '../testing/test-shop';
import { tooWideForPocket } from './too-wide-for-pocket';

test('flags a cutter wider than its pocket takes', () => {
  checkRule(
    tooWideForPocket,
    { tools: changedTools({ 1: { diameter: 76.2 } }) },
    `
T1 M6
^^^^^ too-wide-for-pocket: T1 (10 mm end mill) is 76.2 mm (3 in) across at its widest; pocket 1 takes 50 mm (1.969 in).
M30
`,
  );
});

test('flags two tools that overlap where they stand', () => {
  checkRule(
    tooWideForPocket,
    {
      tools: changedTools({
        1: { holder: { taper: 'ISO30', diameter: 160, above: 72 } },
        2: { holder: { taper: 'ISO30', diameter: 160, above: 72 } },
      }),
      rack: {
        pockets: [1, 2].map((number) => ({
          number,
          grip: { x: 100 + 150 * number, y: 2560, z: -125 },
          opens: '-y',
          largestDiameter: 200,
          longest: 190,
          taper: 'ISO30',
        })),
      },
      loading: {
        pockets: [
          { pocket: 1, tool: 1 },
          { pocket: 2, tool: 2 },
        ],
      },
    },
    `
T1 M6
^^^^^ too-wide-for-pocket: T1 (10 mm end mill) in pocket 1 overlaps T2 in pocket 2 by 10 mm (0.394 in).
M30
`,
  );
});

test('allows a tool exactly as wide as its pocket', () => {
  checkRule(
    tooWideForPocket,
    { tools: changedTools({ 1: { diameter: 50 } }) },
    `
T1 M6
M30
`,
  );
});
