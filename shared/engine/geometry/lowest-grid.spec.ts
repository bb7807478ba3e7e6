import { expect, test } from 'vitest';
import { LowestGrid } from './lowest-grid';
import { arcPath, linePath } from './testing/paths';

const whole = { enter: 0, leave: 1 };
const everywhere = () => true;

test('knows a slot it has been pressed along, to its depth and no deeper', () => {
  const grid = new LowestGrid(0, 0, 400, 400);
  grid.press(linePath([50, 50, -5], [200, 120, -5]), 3, 0);
  const back = (z: number) =>
    grid.isSwept(
      linePath([180, 110.6667, z], [70, 59.3333, z]),
      whole,
      { radius: 3, drop: 0 },
      everywhere,
    );
  expect(back(-5)).toBe(true);
  expect(back(-4)).toBe(true);
  expect(back(-5.5)).toBe(false);
});

test('does not take the material beside a slot for swept', () => {
  const grid = new LowestGrid(0, 0, 400, 400);
  grid.press(linePath([50, 50, -5], [200, 50, -5]), 3, 0);
  const along = (y: number) =>
    grid.isSwept(linePath([60, y, -5], [190, y, -5]), whole, { radius: 3, drop: 0 }, everywhere);
  expect(along(50)).toBe(true);
  expect(along(54)).toBe(false);
  expect(along(58)).toBe(false);
});

test('takes a pocket of overlapping passes for swept all over', () => {
  const grid = new LowestGrid(0, 0, 400, 400);
  for (let y = 50; y <= 90; y += 5) grid.press(linePath([50, y, -8], [150, y, -8]), 3, 0);
  expect(
    grid.isSwept(linePath([52, 52, -8], [148, 88, -8]), whole, { radius: 3, drop: 0 }, everywhere),
  ).toBe(true);
  expect(
    grid.isSwept(linePath([52, 52, -8], [148, 99, -8]), whole, { radius: 3, drop: 0 }, everywhere),
  ).toBe(false);
});

test('remembers arcs and many short steps, and leaves out what does not count', () => {
  const grid = new LowestGrid(0, 0, 400, 400);
  grid.press(arcPath('xy', [150, 100, -2], 100, 100, 2 * Math.PI), 4, 0);
  for (let step = 0; step < 400; step += 1)
    grid.press(linePath([10 + step / 4, 20, -3], [10 + (step + 1) / 4, 20, -3]), 1, 0);
  expect(
    grid.isSwept(
      arcPath('xy', [100, 150, -2], 100, 100, 3),
      whole,
      { radius: 4, drop: 0 },
      everywhere,
    ),
  ).toBe(true);
  expect(
    grid.isSwept(linePath([12, 20, -3], [108, 20, -3]), whole, { radius: 1, drop: 0 }, everywhere),
  ).toBe(true);
  const far = linePath([300, 300, -9], [310, 300, -9]);
  expect(grid.isSwept(far, whole, { radius: 2, drop: 0 }, everywhere)).toBe(false);
  expect(grid.isSwept(far, whole, { radius: 2, drop: 0 }, (x) => x < 250)).toBe(true);
});

test('measures from the drop below the path', () => {
  const grid = new LowestGrid(0, 0, 100, 100);
  grid.press(linePath([50, 50, -80], [60, 50, -80]), 3, 95);
  expect(
    grid.isSwept(
      linePath([55, 50, -90], [55, 50, -85]),
      whole,
      { radius: 3, drop: 90 },
      everywhere,
    ),
  ).toBe(false);
  expect(
    grid.isSwept(
      linePath([55, 50, -60], [55, 50, -80]),
      whole,
      { radius: 3, drop: 95 },
      everywhere,
    ),
  ).toBe(true);
});

test('a large table gets larger cells, never more of them', () => {
  const grid = new LowestGrid(0, 0, 6000, 3000);
  expect(grid.cell).toBeGreaterThan(4);
  expect((6000 / grid.cell) * (3000 / grid.cell)).toBeLessThanOrEqual(1_000_001);
});

test('is not held up by paths of absurd length, and takes what it cannot follow for not swept', () => {
  const grid = new LowestGrid(0, 0, 100, 100);
  grid.press(linePath([-1e12, 50, -5], [1e12, 50, -5]), 3, 0);
  expect(
    grid.isSwept(linePath([10, 50, -5], [90, 50, -5]), whole, { radius: 3, drop: 0 }, everywhere),
  ).toBe(true);
  grid.press(arcPath('xy', [50, 20, -5], 50, 1e9, 6), 3, 0);
  expect(
    grid.isSwept(linePath([10, 80, NaN], [NaN, 80, -5]), whole, { radius: 3, drop: 0 }, everywhere),
  ).toBe(false);
});
