import { expect, test } from 'vitest';
import { startTrace, type Motion } from '../index';
import { testSetup } from '../testing/test-shop';

const PROGRAM = 'G21 G90 G54\nG0 X1\nG1 X2 F9\nG2 X4 I1\nG0 X5\nG1 X6\nG38.2 Z-1\nM30';

function kindsSeen(...observers: { motionKinds?: Motion['kind'][]; most?: number }[]): string[] {
  const seen = observers.map(() => '');
  const trace = startTrace(testSetup(), undefined, {
    observers: observers.map(({ motionKinds, most = Infinity }, index) => ({
      motionKinds,
      motion: (motion: Motion) => {
        seen[index] += `${motion.kind} `;
        return seen[index]!.trim().split(' ').length >= most ? 'enough' : undefined;
      },
    })),
  });
  trace.push(new TextEncoder().encode(PROGRAM));
  trace.endOfText();
  return seen.map((each) => each.trim());
}

test('an observer is called for every motion, or for the kinds it names', () => {
  expect(kindsSeen({}, { motionKinds: ['rapid'] }, { motionKinds: ['feed', 'arc'] })).toEqual([
    'rapid feed arc rapid feed probe',
    'rapid rapid',
    'feed arc feed',
  ]);
});

test('an observer that has seen enough is left alone, and the others are not', () => {
  expect(kindsSeen({ most: 2 }, {}, { most: 1, motionKinds: ['feed'] })).toEqual([
    'rapid feed',
    'rapid feed arc rapid feed probe',
    'feed',
  ]);
});
