import { describe, expect, test } from 'vitest';
import { pointAt, type Path } from './path';
import { boundsOf, boxPrism, cylinderPrism, meetingRegion, movePrism, type Prism } from './prism';
import { openSpan } from './span';
import { findBoxSpan, findSpan, isApart } from './sweep';
import { arcPath, linePath, seededRandom } from './testing/paths';

const box = (min: readonly [number, number, number], max: readonly [number, number, number]) =>
  boxPrism({ min: { x: min[0], y: min[1], z: min[2] }, max: { x: max[0], y: max[1], z: max[2] } });
const meets = (path: Path, region: Prism) => findSpan(path, region, openSpan());

describe('a segment against a prism', () => {
  const region = { ...box([0, 0, 0], [10, 10, 10]), round: 2 };
  test.each([
    ['through the middle', linePath([-5, 5, 5], [15, 5, 5]), true],
    ['past the corner, outside its rounding', linePath([-3, 11, 5], [0, 13, 5]), false],
    ['past the corner, inside its rounding', linePath([-3, 10.2, 5], [0, 12.2, 5]), true],
    ['above', linePath([-5, 5, 10.5], [15, 5, 10.5]), false],
    ['on the top face', linePath([-5, 5, 10], [15, 5, 10]), true],
    ['straight down into it', linePath([5, 5, 40], [5, 5, 9]), true],
    ['straight down beside it', linePath([13, 5, 40], [13, 5, -40]), false],
    ['from a point inside to the same point', linePath([5, 5, 5], [5, 5, 5]), true],
    ['ends short of it', linePath([-9, 5, 5], [-3, 5, 5]), false],
    ['dives over its edge after leaving it', linePath([-2, 5, 30], [38, 5, -2]), false],
  ])('%s', (_name, path, expected) => {
    expect(meets(path, region)).toBe(expected);
  });

  test('says where it enters, leaves, and how low it gets in between', () => {
    const span = openSpan();
    expect(findSpan(linePath([-12, 5, 12], [28, 5, -8]), box([-2, 0, 0], [8, 10, 20]), span)).toBe(
      true,
    );
    expect(span.enter).toBeCloseTo(0.25, 9);
    expect(span.leave).toBeCloseTo(0.5, 9);
    expect(span.lowest).toBeCloseTo(2, 9);
  });
});

test('a number that is none lies inside everything', () => {
  const span = openSpan();
  const path = { ...linePath([0, 0, 0], [1, 1, 1]), toX: NaN };
  expect(isApart({ ...path, minX: NaN, maxX: NaN }, box([5, -9, -9], [6, 9, 9]))).toBe(false);
  expect(findSpan(path, box([500, 500, 500], [501, 501, 501]), span)).toBe(true);
});

test('touching is no meeting, a hair more than the slack is', () => {
  const standing = box([10, 0, 0], [20, 10, 10]);
  const moving = cylinderPrism({ x: 0, y: 0 }, 3, [0, 5]);
  const region = meetingRegion(standing, moving);
  expect(meets(linePath([7, -50, 0], [7, 50, 0]), region)).toBe(false);
  expect(meets(linePath([7.0009, -50, 0], [7.0009, 50, 0]), region)).toBe(false);
  expect(meets(linePath([7.0011, -50, 0], [7.0011, 50, 0]), region)).toBe(true);
  expect(meets(linePath([0, 5, 10], [30, 5, 10]), region)).toBe(false);
});

/** Overlap of two prisms by clamping one centre to the other's rectangle: another way than the region. */
function overlaps(standing: Prism, moving: Prism): boolean {
  const gap = (a0: number, a1: number, b0: number, b1: number) => Math.max(b0 - a1, a0 - b1, 0);
  const x = gap(standing.minX, standing.maxX, moving.minX, moving.maxX);
  const y = gap(standing.minY, standing.maxY, moving.minY, moving.maxY);
  const z = gap(standing.minZ, standing.maxZ, moving.minZ, moving.maxZ);
  return z === 0 && Math.hypot(x, y) <= standing.round + moving.round;
}

function randomPrism(random: (from: number, to: number) => number, size: number): Prism {
  const x = random(-size, size);
  const y = random(-size, size);
  const z = random(-size, size);
  if (random(0, 1) < 0.5) return cylinderPrism({ x, y }, random(1, 12), [z, z + random(1, 20)]);
  return box([x, y, z], [x + random(1, 25), y + random(1, 25), z + random(1, 20)]);
}

function randomPath(random: (from: number, to: number) => number): Path {
  const from = [random(-60, 60), random(-60, 60), random(-60, 60)] as const;
  const pick = Math.floor(random(0, 5));
  if (pick < 2) return linePath(from, [random(-60, 60), random(-60, 60), random(-60, 60)]);
  const plane = (['xy', 'zx', 'yz'] as const)[pick - 2]!;
  return arcPath(
    plane,
    from,
    random(-60, 60),
    random(-60, 60),
    random(-6.28, 6.28),
    random(-30, 30),
  );
}

/**
 * The stepper moves the solid in steps far below its size; what it sees must be reported, and what is
 * reported must be seen by it or be a graze of less than a step's length.
 */
test('agrees with a slow stepper on lines and arcs in every plane', () => {
  const random = seededRandom(5);
  const point = { x: 0, y: 0, z: 0 };
  let hits = 0;
  for (let round = 0; round < 4000; round += 1) {
    const standing = randomPrism(random, 40);
    const moving = randomPrism(random, 10);
    const path = randomPath(random);
    const region = meetingRegion(standing, moving);
    const span = openSpan();
    const found = findSpan(path, region, span);
    let seen = false;
    let seenGrown = false;
    const shrunk = { ...standing, minZ: standing.minZ + 0.002, maxZ: standing.maxZ - 0.002 };
    const steps = 400;
    for (let step = 0; step <= steps; step += 1) {
      pointAt(path, step / steps, point);
      const at = movePrism(moving, point.x, point.y, point.z);
      if (overlaps(shrunk, { ...at, round: at.round - 0.003 })) seen = true;
      const grown = { ...at, minZ: at.minZ - 0.6, maxZ: at.maxZ + 0.6, round: at.round + 0.6 };
      if (overlaps(standing, grown)) seenGrown = true;
    }
    if (seen && moving.round + standing.round > 0.01) expect(found).toBe(true);
    if (found) {
      hits += 1;
      expect(seenGrown).toBe(true);
      expect(isApart(path, boundsOf(region))).toBe(false);
      expect(findBoxSpan(path, region, openSpan())).toBe(true);
    }
  }
  expect(hits).toBeGreaterThan(150);
});

test('gives the same answer mirrored, reversed, shifted and split in two', () => {
  const random = seededRandom(77);
  for (let round = 0; round < 1500; round += 1) {
    const region = randomPrism(random, 30);
    const from = [random(-60, 60), random(-60, 60), random(-60, 60)] as const;
    const to = [random(-60, 60), random(-60, 60), random(-60, 60)] as const;
    const found = meets(linePath(from, to), region);
    expect(meets(linePath(to, from), region)).toBe(found);
    const mirrored = { ...region, minX: -region.maxX, maxX: -region.minX };
    expect(meets(linePath([-from[0], from[1], from[2]], [-to[0], to[1], to[2]]), mirrored)).toBe(
      found,
    );
    const middle = [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2, (from[2] + to[2]) / 2] as const;
    const halves = meets(linePath(from, middle), region) || meets(linePath(middle, to), region);
    expect(halves).toBe(found);
    const shifted = meets(
      linePath([from[0] + 8, from[1] - 4, from[2] + 2], [to[0] + 8, to[1] - 4, to[2] + 2]),
      movePrism(region, 8, -4, 2),
    );
    expect(shifted).toBe(found);
  }
});
