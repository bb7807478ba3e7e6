import type { PlanPath } from '#contracts';
import { drawPath, findMark, pathBox, pathOf, pathTools, simplify } from './draw-path';

type Run = PlanPath['runs'][number];
const run = (tool: number | null, kind: Run['kind'], fromLine: number, points: number[]): Run => ({
  tool,
  kind,
  fromLine,
  points,
});

test('joins the runs of one tool and kind, each with its own beginning', () => {
  const paths = drawPath(
    [
      run(4, 'rapid', 1, [0, 0, 10, 0]),
      run(4, 'feed', 2, [10, 0, 10, 5]),
      run(4, 'feed', 9, [20, 0, 20, 5]),
      run(7, 'feed', 12, [1, 1, 2, 2]),
    ],
    0,
  );
  expect(paths).toEqual([
    { tool: 4, kind: 'rapid', d: 'M0 0L10 0' },
    { tool: 4, kind: 'feed', d: 'M10 0L10 5M20 0L20 5' },
    { tool: 7, kind: 'feed', d: 'M1 1L2 2' },
  ]);
});

test('a hole, a run of one point, is a dot', () => {
  expect(pathOf([5, 6])).toBe('M5 6h0');
});

describe('leaving out what no screen shows', () => {
  const circle = Array.from({ length: 721 }, (_, index) => {
    const angle = (index * Math.PI) / 360;
    return [100 * Math.cos(angle), 100 * Math.sin(angle)];
  }).flat();

  test('keeps ends and corners, drops points along a straight', () => {
    expect(simplify([0, 0, 1, 0, 2, 0, 3, 0, 3, 5], 0.1)).toEqual([0, 0, 3, 0, 3, 5]);
  });

  test('a move out and straight back is not flattened away', () => {
    expect(simplify([0, 0, 10, 0, 2, 0], 0.1)).toEqual([0, 0, 10, 0, 2, 0]);
  });

  test('no dropped point lies farther off than the tolerance', () => {
    const tolerance = 0.5;
    const kept = simplify(circle, tolerance);
    expect(kept.length).toBeLessThan(circle.length / 4);
    const pieces = Array.from({ length: kept.length / 2 - 1 }, (_, at) =>
      kept.slice(2 * at, 2 * at + 4),
    );
    for (let at = 0; at < circle.length; at += 2) {
      const [px, py] = [circle[at]!, circle[at + 1]!];
      const gap = Math.min(
        ...pieces.map(([ax, ay, bx, by]) => {
          const [dx, dy] = [bx! - ax!, by! - ay!];
          const along = ((px - ax!) * dx + (py - ay!) * dy) / (dx * dx + dy * dy);
          const t = Math.min(1, Math.max(0, along));
          return Math.hypot(px - ax! - t * dx, py - ay! - t * dy);
        }),
      );
      expect(gap).toBeLessThanOrEqual(tolerance + 1e-9);
    }
  });

  test('no tolerance leaves every point', () => {
    expect(simplify(circle, 0)).toBe(circle);
  });
});

test('tools stand in the order in which they first cut, rapids do not count', () => {
  const tools = pathTools([
    run(7, 'rapid', 1, [0, 0, 9, 9]),
    run(4, 'feed', 3, [10, 20, 30, 5]),
    run(7, 'feed', 5, [1, 1, 2, 2]),
    run(4, 'feed', 7, [-5, 6, 0, 0]),
  ]);
  expect(tools.map(({ tool }) => tool)).toEqual([4, 7]);
  expect(tools[0]).toMatchObject({ start: [10, 20], box: { x: -5, y: 0, width: 35, height: 20 } });
});

test('the path’s box spans every run; no run, no box', () => {
  expect(pathBox([run(1, 'rapid', 1, [0, 0, 4, 4]), run(1, 'feed', 2, [-2, 1])])).toEqual({
    x: -2,
    y: 0,
    width: 6,
    height: 4,
  });
  expect(pathBox([])).toBeNull();
});

describe('the place a finding speaks of', () => {
  const runs = [
    run(4, 'rapid', 10, [0, 0, 100, 0]),
    run(4, 'feed', 20, [100, 0, 1304.2, 0, 200, 50]),
    run(4, 'feed', 40, [200, 50, 300, 50]),
  ];

  test('is the point with the coordinate it names, in the run that holds its line', () => {
    const found = findMark(runs, { line: 25, severity: 'stop', words: '', axis: 'x', at: 1304.2 });
    expect(found).toMatchObject({ x: 1304.2, y: 0, exact: true, d: 'M100 0L1304.2 0L200 50' });
  });

  test('is about as far along its run as its line is, where nothing is named', () => {
    const found = findMark(runs, { line: 30, severity: 'note', words: '' });
    expect(found).toMatchObject({ x: 1304.2, exact: false });
  });

  test('is nowhere while another tool is in the spindle', () => {
    const mark = { line: 45, severity: 'stop' as const, words: '' };
    expect(findMark(runs, { ...mark, tool: 11 })).toBeNull();
    expect(findMark(runs, { ...mark, tool: 4 })).not.toBeNull();
  });

  test('is nowhere before the first motion', () => {
    expect(findMark(runs, { line: 3, severity: 'hold', words: '' })).toBeNull();
  });
});
