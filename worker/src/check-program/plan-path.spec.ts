import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { startCheck, type Motion, type Observer } from '#engine';
import { pathSchema, setupSchema, type PlanPath } from '#contracts';
import { buildPlanPath, type PlanPathBuilder } from './plan-path';

const setup = setupSchema.parse(
  JSON.parse(readFileSync('fixtures/machines/north-router.json', 'utf8')),
);
const HEAD = 'G21 G90 G17 G54\nT4 M6\nS18000 M3\nG0 G43 H4 Z30\nG0 X100 Y100\nG1 Z-1 F1200\n';

type Point = readonly [number, number];
/** A motion as points no farther than about `STEP` apart, worked out here on its own. */
const STEP = 0.05;

/** Walks the program with the builder beside a plain sampler of everything that moves in plan. */
function walk(text: string, builder: PlanPathBuilder): { path: PlanPath; sampled: Point[] } {
  const sampled: Point[] = [];
  const sampler: Observer = {
    motion: (motion) => {
      if (motion.moves) sampled.push(...sample(motion));
    },
  };
  const check = startCheck(setup, { observe: () => [builder.observer, sampler] });
  check.push(Buffer.from(text));
  expect(check.endOfText()).toBe('done');
  return { path: pathSchema.parse(builder.result()), sampled };
}

function sample(motion: Motion): Point[] {
  const { fromX, fromY, toX, toY, plane, centreU, centreV, turn } = motion;
  const steps = Math.ceil(motion.length / STEP) + 1;
  return Array.from({ length: steps + 1 }, (_, at): Point => {
    const part = at / steps;
    if (motion.kind !== 'arc' || plane !== 'xy') {
      return [fromX + (toX - fromX) * part, fromY + (toY - fromY) * part];
    }
    const x = fromX - centreU;
    const y = fromY - centreV;
    const [cos, sin] = [Math.cos(turn * part), Math.sin(turn * part)];
    return [centreU + x * cos - y * sin, centreV + x * sin + y * cos];
  });
}

/** The worst distance of a sampled point from the whole drawn path. */
function farthestOff({ runs }: PlanPath, sampled: readonly Point[]): number {
  const segments = runs.flatMap(({ points }) =>
    Array.from({ length: points.length / 2 - 1 }, (_, at) => points.slice(at * 2, at * 2 + 4)),
  );
  const nearest = sampled.map((point) =>
    segments.reduce((least, segment) => Math.min(least, distance(point, segment)), Infinity),
  );
  return Math.max(...nearest);
}

function distance([px, py]: Point, segment: readonly number[]): number {
  const [ax, ay, bx, by] = segment as [number, number, number, number];
  const length = (bx - ax) ** 2 + (by - ay) ** 2;
  const along = length === 0 ? 0 : ((px - ax) * (bx - ax) + (py - ay) * (by - ay)) / length;
  const part = Math.min(1, Math.max(0, along));
  return Math.hypot(px - ax - part * (bx - ax), py - ay - part * (by - ay));
}

function countPoints({ runs }: PlanPath): number {
  return runs.reduce((sum, run) => sum + run.points.length / 2, 0);
}

/** A long row of small zigzags, 0.5 mm wide. */
function zigzag(moves: number): string {
  let text = HEAD;
  for (let move = 1; move <= moves; move += 1) {
    text += `G1 X${(100 + move * 0.5).toFixed(3)} Y${move % 2 ? '100.5' : '100'}\n`;
  }
  return `${text}M30\n`;
}

describe('the plan path', () => {
  test('lies nowhere farther from lines and arcs than it says', () => {
    const text = `${HEAD}G1 X150 Y100\nG3 X200 Y150 I0 J50\nG2 X200 Y150 I30 J0\nG1 X120.05 Y150\nG1 X120 Y90\nM30\n`;
    const { path, sampled } = walk(text, buildPlanPath());
    expect(path.tolerance).toBe(0.2);
    expect(farthestOff(path, sampled)).toBeLessThanOrEqual(path.tolerance);
    expect(countPoints(path)).toBeLessThan(100);
  });

  test('has one run for each tool and kind of motion, and none for a plunge', () => {
    const text = `${HEAD}G1 X150\nG1 Y150\nG0 Z30\nG0 X300\nT1 M6\nG0 X320\nM30\n`;
    const { path } = walk(text, buildPlanPath());
    const work = path.runs.filter((run) => run.tool !== null && run.kind === 'feed');
    expect(work).toMatchObject([{ tool: 4, kind: 'feed', fromLine: 7 }]);
    expect(work[0]?.points).toHaveLength(6);
    const tools = path.runs.map((run) => run.tool);
    expect(tools.at(-1)).toBe(1);
    path.runs.forEach((run, at) => {
      const next = path.runs[at + 1];
      expect(next && next.tool === run.tool && next.kind === run.kind).toBeFalsy();
    });
  });

  test('is drawn more coarsely before anything of it is left out', () => {
    const text = zigzag(2000);
    const whole = walk(text, buildPlanPath());
    expect(countPoints(whole.path)).toBeGreaterThan(2000);
    const { path, sampled } = walk(text, buildPlanPath({ mostPoints: 500 }));
    expect(path.truncated).toBe(false);
    expect(path.tolerance).toBeGreaterThan(0.2);
    expect(countPoints(path)).toBeLessThanOrEqual(500);
    expect(farthestOff(path, sampled)).toBeLessThanOrEqual(path.tolerance);
  });

  test('says that it is cut off when even that is not enough', () => {
    let text = HEAD;
    for (let move = 0; move < 2000; move += 1) {
      text += `G1 X${move % 2 ? 140 : 100} Y${(100 + move * 0.1).toFixed(1)}\n`;
    }
    const { path } = walk(`${text}M30\n`, buildPlanPath({ mostPoints: 500 }));
    expect(path.truncated).toBe(true);
    expect(countPoints(path)).toBeLessThanOrEqual(502);
  });
});
