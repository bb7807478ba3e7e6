import fc from 'fast-check';
import { expect, test } from 'vitest';
import { startTrace, type Motion, type Setup } from '#engine';
import { COUNTS, SEED } from '../counts';
import { expectSameTrace, openMachine, traceOf } from './trace-of';

/**
 * The offset path against a slow stepper that shares nothing with the engine: it walks the told motions in small
 * steps and measures each from the programmed polygon.
 */
type Point = readonly [number, number];
const runs = { numRuns: COUNTS.properties, seed: SEED };
const STEP = 1;

const machine = (diameter: number, language: string): Setup =>
  openMachine({
    loading: { inSpindle: 2 },
    controller: { language },
    offsets: { work: { G54: { x: 0, y: 0, z: 0 } }, diameter: { 2: diameter } },
  });

/** Corners on a circle of 50, counterclockwise: at the widest radius, every edge leaves room for both its corners. */
const polygons: fc.Arbitrary<readonly Point[]> = fc
  .array(fc.integer({ min: 40, max: 100 }), { minLength: 5, maxLength: 8 })
  .map((weights) => {
    const sum = weights.reduce((all, each) => all + each, 0);
    let angle = 0.3;
    return weights.map((weight): Point => {
      angle += (2 * Math.PI * weight) / sum;
      return [Number((50 * Math.cos(angle)).toFixed(4)), Number((50 * Math.sin(angle)).toFixed(4))];
    });
  });
const radii = fc.integer({ min: 5, max: 40 }).map((tenths) => tenths / 10);

function toSegment([x, y]: Point, [ax, ay]: Point, [bx, by]: Point): number {
  const [dx, dy] = [bx - ax, by - ay];
  const part = Math.min(1, Math.max(0, ((x - ax) * dx + (y - ay) * dy) / (dx * dx + dy * dy)));
  return Math.hypot(x - ax - part * dx, y - ay - part * dy);
}
const toPolygon = (point: Point, corners: readonly Point[]): number =>
  Math.min(
    ...corners.map((corner, at) => toSegment(point, corner, corners[(at + 1) % corners.length]!)),
  );

const isInside = ([x, y]: Point, corners: readonly Point[]): boolean =>
  corners.every(([ax, ay], at) => {
    const [bx, by] = corners[(at + 1) % corners.length]!;
    return (bx - ax) * (y - ay) - (by - ay) * (x - ax) > 0;
  });

/** Points along a motion, a millimetre apart, its ends among them. */
function stepsOf(motion: Motion): Point[] {
  const count = Math.max(1, Math.ceil(motion.length / STEP));
  return Array.from({ length: count + 1 }, (_, at): Point => {
    const part = at / count;
    if (motion.kind !== 'arc')
      return [
        motion.fromX + (motion.toX - motion.fromX) * part,
        motion.fromY + (motion.toY - motion.fromY) * part,
      ];
    const start = Math.atan2(motion.fromY - motion.centreV, motion.fromX - motion.centreU);
    const angle = start + motion.turn * part;
    return [
      motion.centreU + motion.radius * Math.cos(angle),
      motion.centreV + motion.radius * Math.sin(angle),
    ];
  });
}

const word = ([x, y]: Point) => `X${x.toFixed(4)} Y${y.toFixed(4)}`;

/** Once round and over the first edge again, entered from a place on that edge's line behind its start. */
function contour(corners: readonly Point[], code: string): string[] {
  const [first, second] = [corners[0]!, corners[1]!];
  const length = Math.hypot(second[0] - first[0], second[1] - first[1]);
  const back: Point = [
    first[0] - ((second[0] - first[0]) / length) * 20,
    first[1] - ((second[1] - first[1]) / length) * 20,
  ];
  return [
    'G21 G90 G17 G54 F1000',
    `G0 ${word(back)}`,
    `${code} D2 G1 ${word(first)}`,
    ...[...corners.slice(1), first, second].map(word),
    'G40 G0 X200 Y200',
    'M30',
  ];
}

function motionsOf(program: readonly string[], setup: Setup): (Motion & { line: number })[] {
  const motions: (Motion & { line: number })[] = [];
  const observer = {
    motion: (motion: Motion, { line }: { line: number }) => void motions.push({ ...motion, line }),
    problem: ({ problem, place }: { problem: string; place: { line: number } }) => {
      throw new Error(`${problem} at line ${place.line}`);
    },
  };
  const trace = startTrace(setup, undefined, { observers: [observer] });
  trace.push(new TextEncoder().encode(program.join('\n')));
  trace.endOfText();
  return motions;
}

test('round the outside of a convex polygon the cutter is exactly its radius away, at every step', () => {
  fc.assert(
    fc.property(polygons, radii, fc.boolean(), (corners, radius, isClockwise) => {
      const walked = isClockwise ? [...corners].reverse() : corners;
      const setup = machine(2 * radius, 'rs274ngc');
      const motions = motionsOf(contour(walked, isClockwise ? 'G41' : 'G42'), setup);
      // From the second corner on, behind the entry.
      const around = motions.filter(({ line }) => line >= 5 && line < 5 + walked.length);
      expect(around.length).toBe(2 * walked.length);
      for (const point of around.flatMap(stepsOf)) {
        expect(Math.abs(toPolygon(point, walked) - radius)).toBeLessThan(1e-6);
        expect(isInside(point, corners)).toBe(false);
      }
    }),
    runs,
  );
});

/** Where the lines a radius inside of two edges meet: two equations, by Cramer's rule. */
function innerCorner(before: Point, corner: Point, after: Point, radius: number): Point {
  const line = ([ax, ay]: Point, [bx, by]: Point) => {
    const length = Math.hypot(bx - ax, by - ay);
    const [nx, ny] = [-(by - ay) / length, (bx - ax) / length];
    return [nx, ny, nx * ax + ny * ay + radius] as const;
  };
  const [a, b, c] = line(before, corner);
  const [d, e, f] = line(corner, after);
  const by = a * e - b * d;
  return [(c * e - b * f) / by, (a * f - c * d) / by];
}

test('inside one, the told path turns at the corners of the smaller polygon and strays no farther than its radius', () => {
  fc.assert(
    fc.property(
      polygons,
      radii,
      fc.constantFrom('rs274ngc', 'custom-macro'),
      (corners, radius, language) => {
        const motions = motionsOf(contour(corners, 'G41'), machine(2 * radius, language));
        const inside = motions.filter(({ line }) => line > 4 && line < 5 + corners.length);
        for (const point of inside.flatMap(stepsOf))
          expect(toPolygon(point, corners)).toBeLessThan(radius + 1e-6);
        corners.slice(1).forEach((corner, at) => {
          const after = corners[(at + 2) % corners.length]!;
          const [x, y] = innerCorner(corners[at]!, corner, after, radius);
          const nearest = Math.min(...inside.map((each) => Math.hypot(each.toX - x, each.toY - y)));
          expect(nearest).toBeLessThan(1e-6);
        });
      },
    ),
    runs,
  );
});

test('moving work zero moves the offset path by as much', () => {
  fc.assert(
    fc.property(polygons, radii, fc.boolean(), (corners, radius, isClockwise) => {
      const walked = isClockwise ? [...corners].reverse() : corners;
      const program = contour(walked, 'G41');
      const here = machine(2 * radius, 'rs274ngc');
      const there = openMachine({
        loading: { inSpindle: 2 },
        offsets: { work: { G54: { x: 12, y: -7, z: 3 } }, diameter: { 2: 2 * radius } },
      });
      // The first move starts at machine zero in both; the offset path begins after it.
      const shift = { x: 12, y: -7, z: 0 };
      expectSameTrace(traceOf(program, here), traceOf(program, there), shift);
    }),
    runs,
  );
});
