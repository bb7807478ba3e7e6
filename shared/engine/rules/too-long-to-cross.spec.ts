import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { tooLongToCross } from './too-long-to-cross';

test('flags a tool that cannot be lifted over the parked ones where pockets open to the far side', () => {
  checkRule(
    tooLongToCross,
    {
      rack: {
        pockets: [1, 2].map((number) => ({
          number,
          grip: { x: 100 + 150 * number, y: 2500, z: -125 },
          opens: '+y',
          largestDiameter: 50,
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
^^^^^ too-long-to-cross: T1 (10 mm end mill) is 42 mm (1.654 in) too long to be carried over the parked tools: at the top of Z its tip is at Z -95 mm (-3.74 in), the highest parked stud at Z -53 mm (-2.087 in).
M30
`,
  );
});

test('allows the same tools where pockets open towards the table', () => {
  checkRule(
    tooLongToCross,
    {},
    `
T1 M6
T2 M6
M30
`,
  );
});
