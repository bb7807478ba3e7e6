import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { simplifyLine } from './simplify-line';

type Point = readonly [number, number];

/** The kept points, and which of the given ones each of them is. */
function simplify(points: readonly Point[], tolerance: number): { kept: Point[]; at: number[] } {
  const kept: Point[] = [];
  const at: number[] = [];
  let pushed = 0;
  const line = simplifyLine(tolerance, (x, y) => {
    kept.push([x, y]);
    // What is kept is the point before the one that would not fit, or the very first.
    at.push(pushed === points.length ? pushed - 1 : Math.max(0, pushed - 1));
  });
  for (const [x, y] of points) {
    line.push(x, y);
    pushed += 1;
  }
  line.end();
  return { kept, at };
}

/** Distance of a point to a segment, by the plain definition. */
function distance([px, py]: Point, [ax, ay]: Point, [bx, by]: Point): number {
  const length = (bx - ax) ** 2 + (by - ay) ** 2;
  const along = length === 0 ? 0 : ((px - ax) * (bx - ax) + (py - ay) * (by - ay)) / length;
  const part = Math.min(1, Math.max(0, along));
  return Math.hypot(px - ax - part * (bx - ax), py - ay - part * (by - ay));
}

/** How far the worst point lies from the segment that stands for it. */
function farthestOff(points: readonly Point[], tolerance: number): number {
  const { at } = simplify(points, tolerance);
  let worst = 0;
  for (let segment = 1; segment < at.length; segment += 1) {
    const from = at[segment - 1]!;
    const to = at[segment]!;
    for (const point of points.slice(from, to + 1)) {
      worst = Math.max(worst, distance(point, points[from]!, points[to]!));
    }
  }
  const last = points.at(-1)!;
  return Math.max(worst, distance(last, points[at.at(-1)!]!, last));
}

describe('simplifyLine', () => {
  test.each<[string, Point[], Point[]]>([
    ['keeps nothing of nothing', [], []],
    ['keeps a single point', [[3, 4]], [[3, 4]]],
    [
      'drops points on a straight line',
      [
        [0, 0],
        [1, 0],
        [2, 0],
        [9, 0],
      ],
      [
        [0, 0],
        [9, 0],
      ],
    ],
    [
      'keeps a corner',
      [
        [0, 0],
        [5, 0],
        [5, 5],
      ],
      [
        [0, 0],
        [5, 0],
        [5, 5],
      ],
    ],
    [
      'drops a wobble below the tolerance',
      [
        [0, 0],
        [5, 0.1],
        [10, 0],
      ],
      [
        [0, 0],
        [10, 0],
      ],
    ],
    [
      'keeps one above it',
      [
        [0, 0],
        [5, 0.4],
        [10, 0],
      ],
      [
        [0, 0],
        [5, 0.4],
        [10, 0],
      ],
    ],
    [
      'keeps the far end of a move there and back',
      [
        [0, 0],
        [9, 0],
        [0, 0],
      ],
      [
        [0, 0],
        [9, 0],
        [0, 0],
      ],
    ],
  ])('%s', (_name, points, expected) => {
    expect(simplify(points, 0.2).kept).toEqual(expected);
  });

  test('leaves no point farther than the tolerance from what stands for it', () => {
    const step = fc.tuple(
      fc.double({ min: -1, max: 1, noNaN: true }),
      fc.double({ min: -1, max: 1, noNaN: true }),
    );
    fc.assert(
      fc.property(fc.array(step, { minLength: 2, maxLength: 80 }), (steps) => {
        let x = 0;
        let y = 0;
        const points = steps.map(([dx, dy]): Point => [(x += dx), (y += dy)]);
        expect(farthestOff(points, 0.2)).toBeLessThanOrEqual(0.2 + 1e-9);
      }),
      { seed: 7, numRuns: 300 },
    );
  });

  test('thins a finely stepped circle to few points', () => {
    const circle = Array.from({ length: 3601 }, (_, at): Point => {
      const angle = (at / 3600) * 2 * Math.PI;
      return [100 * Math.cos(angle), 100 * Math.sin(angle)];
    });
    expect(farthestOff(circle, 0.2)).toBeLessThanOrEqual(0.2 + 1e-9);
    expect(simplify(circle, 0.2).kept.length).toBeLessThan(80);
  });
});
