import { expect, test } from 'vitest';
import { changedTools, testSetup } from '../testing/test-shop';
import { parkedBands, parkedOverlap, widestDiameter } from './parked-bands';

/** Tool 1 of the plain test shop: 10 mm cutter, gauge length 95, stick-out 40, holder 50 across, 72 above. */
const tools = (changes: Record<number, object> = {}) =>
  testSetup({ tools: changedTools(changes) }).tools;

test('hangs as holder, shank and flutes below the gauge line, with the taper above it', () => {
  expect(parkedBands(tools({ 1: { shank: 12 } })[0]!)).toEqual([
    { low: 0, high: 72, radius: 25 },
    { low: -55, high: 0, radius: 25 },
    { low: -70, high: -55, radius: 6 },
    { low: -95, high: -70, radius: 5 },
  ]);
});

test('follows the steps of the holder from the gauge line down', () => {
  const holder = {
    steps: [
      { diameter: 50, length: 12 },
      { diameter: 42, length: 43 },
    ],
  };
  expect(
    parkedBands(
      tools({ 1: { holder: { taper: 'ISO30', diameter: 50, above: 72, ...holder } } })[0]!,
    ),
  ).toEqual(
    expect.arrayContaining([
      { low: -12, high: 0, radius: 25 },
      { low: -55, high: -12, radius: 21 },
    ]),
  );
});

test('the widest part may be the cutter', () => {
  expect(widestDiameter(tools()[0]!)).toBe(50);
  expect(widestDiameter(tools({ 1: { diameter: 76.2 } })[0]!)).toBe(76.2);
});

test('two 76.2 mm cutters side by side need their own width between them', () => {
  // trade table D1, example 4: r + r = 76.2; 76.2 beside a 50 mm holder meets nothing of it below.
  const [wide, other] = tools({ 1: { diameter: 76.2 }, 2: { diameter: 76.2 } });
  expect(parkedOverlap(wide!, other!, 0, 70)).toBeCloseTo(6.2, 9);
  expect(parkedOverlap(wide!, other!, 0, 80)).toBeCloseTo(-3.8, 9);
});

test('a wide cutter clears a slim one where their wide parts hang at different heights', () => {
  const [wide, slim] = tools({ 1: { diameter: 80, fluteLength: 10 }, 2: {} });
  // 80 mm cutter against the 6 mm cutter beside it: 40 + 3; the holders, 25 + 25, decide.
  expect(parkedOverlap(wide!, slim!, 0, 52)).toBeCloseTo(-2, 9);
  // Hung 40 mm lower, the neighbour’s holder comes beside the wide cutter: 40 + 25.
  expect(parkedOverlap(wide!, slim!, -40, 52)).toBeCloseTo(13, 9);
});
