import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { changedTools } from '../testing/test-shop';
import { tooHeavy } from './too-heavy';

test('flags a tool heavier than its pocket bears', () => {
  checkRule(
    tooHeavy,
    {
      tools: changedTools({ 1: { mass: 1.5 } }),
      rack: {
        pockets: [
          {
            number: 1,
            grip: { x: 100, y: 2560, z: -125 },
            opens: '-y',
            largestDiameter: 50,
            longest: 190,
            taper: 'ISO30',
            heaviest: 1.2,
          },
        ],
      },
      loading: { pockets: [{ pocket: 1, tool: 1 }] },
    },
    `
T1 M6
^^^^^ too-heavy: T1 (10 mm end mill) weighs 1.5 kg with its holder; pocket 1 takes 1.2 kg.
M30
`,
  );
});

test('says nothing where the mass or the load is not entered', () => {
  checkRule(
    tooHeavy,
    { tools: changedTools({ 1: { mass: 15 } }) },
    `
T1 M6
T2 M6
M30
`,
  );
});
