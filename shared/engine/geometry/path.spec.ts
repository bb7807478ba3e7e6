import { describe, expect, test } from 'vitest';
import { arcPath, linePath, seededRandom } from './testing/paths';
import { findExtremes, passesAngle, pointAt } from './path';

describe('arc extremes', () => {
  // Source: trade computations D10, worked with the circle equation; any mechanics handbook.
  test.each([
    [
      'quarter clockwise, centre (10,0)',
      arcPath('xy', [0, 0, 0], 10, 0, -Math.PI / 2),
      [0, 10, 0, 10],
    ],
    [
      'three quarters counter-clockwise about (0,10)',
      arcPath('xy', [0, 0, 0], 0, 10, -1.5 * Math.PI),
      [-10, 10, 0, 20],
    ],
    ['full circle', arcPath('xy', [10, 0, 0], 0, 0, 2 * Math.PI), [-10, 10, -10, 10]],
  ] as const)('%s', (_name, path, [minX, maxX, minY, maxY]) => {
    expect(path.minX).toBeCloseTo(minX, 9);
    expect(path.maxX).toBeCloseTo(maxX, 9);
    expect(path.minY).toBeCloseTo(minY, 9);
    expect(path.maxY).toBeCloseTo(maxY, 9);
  });

  test('an arc of radius 25 between (0,0) and (30,0) dips 5 below its chord', () => {
    const start = Math.atan2(-20, -15);
    const end = Math.atan2(-20, 15);
    const path = arcPath('xy', [0, 0, 0], 15, 20, end - start);
    expect(path.toX).toBeCloseTo(30, 9);
    expect(path.minY).toBeCloseTo(-5, 9);
  });

  test('bound every point of arcs in all three planes and are reached', () => {
    const random = seededRandom(11);
    for (let round = 0; round < 600; round += 1) {
      const plane = (['xy', 'zx', 'yz'] as const)[round % 3]!;
      const path = arcPath(
        plane,
        [random(-50, 50), random(-50, 50), random(-50, 50)],
        random(-60, 60),
        random(-60, 60),
        random(-2 * Math.PI, 2 * Math.PI),
        random(-20, 20),
      );
      const seen = {
        minX: Infinity,
        minY: Infinity,
        minZ: Infinity,
        maxX: -Infinity,
        maxY: -Infinity,
        maxZ: -Infinity,
      };
      const point = { x: 0, y: 0, z: 0 };
      for (let step = 0; step <= 2000; step += 1) {
        pointAt(path, step / 2000, point);
        seen.minX = Math.min(seen.minX, point.x);
        seen.maxX = Math.max(seen.maxX, point.x);
        seen.minY = Math.min(seen.minY, point.y);
        seen.maxY = Math.max(seen.maxY, point.y);
        seen.minZ = Math.min(seen.minZ, point.z);
        seen.maxZ = Math.max(seen.maxZ, point.z);
      }
      // The sampler's own sagitta: r (1 - cos(turn / 4000)) is below 1e-4 at these radii.
      for (const key of ['minX', 'minY', 'minZ'] as const) {
        expect(path[key]).toBeLessThanOrEqual(seen[key] + 1e-9);
        expect(path[key]).toBeGreaterThan(seen[key] - 5e-4);
      }
      for (const key of ['maxX', 'maxY', 'maxZ'] as const) {
        expect(path[key]).toBeGreaterThanOrEqual(seen[key] - 1e-9);
        expect(path[key]).toBeLessThan(seen[key] + 5e-4);
      }
    }
  });

  test('a turn passes the angles between its ends, in its own sense', () => {
    expect(passesAngle(0, Math.PI, Math.PI / 2)).toBe(true);
    expect(passesAngle(0, -Math.PI, Math.PI / 2)).toBe(false);
    expect(passesAngle(3, 1, -Math.PI)).toBe(true);
  });

  test('a line is bounded by its ends', () => {
    const out = findExtremes(linePath([1, 2, 3], [-1, 5, 3]), {
      minX: 0,
      minY: 0,
      minZ: 0,
      maxX: 0,
      maxY: 0,
      maxZ: 0,
    });
    expect(out).toEqual({ minX: -1, minY: 2, minZ: 3, maxX: 1, maxY: 5, maxZ: 3 });
  });
});
