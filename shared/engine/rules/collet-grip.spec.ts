import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { changedTools } from '../testing/test-shop';
import { colletGrip } from './collet-grip';

test('flags a shank outside the range of its collet', () => {
  checkRule(
    colletGrip,
    {
      tools: changedTools({
        1: {
          shank: 6.35,
          holder: {
            taper: 'ISO30',
            diameter: 50,
            above: 72,
            collet: { min: 5, max: 6, grips: 30 },
            gripped: 24,
          },
        },
      }),
    },
    `
T1 M6
^^^^^ collet-grip: The shank of T1 (10 mm end mill) is 6.35 mm (0.25 in), outside its collet’s range of 5 mm (0.197 in) to 6 mm (0.236 in).
M30
`,
  );
});

test('flags a shank held by less than two thirds', () => {
  checkRule(
    colletGrip,
    {
      tools: changedTools({
        1: {
          shank: 6,
          holder: {
            taper: 'ISO30',
            diameter: 50,
            above: 72,
            collet: { min: 5, max: 6, grips: 30 },
            gripped: 19.5,
          },
        },
      }),
    },
    `
T1 M6
^^^^^ collet-grip: The collet of T1 (10 mm end mill) grips 19.5 mm (0.768 in) of shank; it needs 20 mm (0.787 in).
M30
`,
  );
});

test('allows a good grip, and says nothing where it is not entered', () => {
  checkRule(
    colletGrip,
    {
      tools: changedTools({
        1: {
          shank: 6,
          holder: {
            taper: 'ISO30',
            diameter: 50,
            above: 72,
            collet: { min: 5, max: 6, grips: 30 },
            gripped: 20,
          },
        },
      }),
    },
    `
T1 M6
T2 M6
M30
`,
  );
});
