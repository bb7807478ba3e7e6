import type { MachineState, Motion, Observer } from '#engine';
import type { PlanPath } from '#contracts';
import { flattenArc } from './flatten-arc';
import { simplifyLine, type LineSimplifier } from './simplify-line';

/** What of the error belongs to chords of arcs and to rounding; thinning takes the rest, all mm. */
const CHORD_TOLERANCE = 0.04;
const ROUNDING = 0.01;
const THINNING = 0.15;
/** Rounding to 0.01 moves a point by half that on each axis: √2 × 0.005 < 0.01. */
const FINEST = CHORD_TOLERANCE + THINNING + ROUNDING;
/** Points a client can draw without a stutter; a path that needs more is thinned further first. */
const MOST_POINTS = 60_000;
/** Thinning again beyond this would show on a table plan of a thousand pixels over three metres. */
const COARSEST = 3;

export interface PlanPathOptions {
  readonly mostPoints?: number;
}
/** Gathers the path in plan while the engine walks; memory is bounded whatever the program's length. */
export interface PlanPathBuilder {
  readonly observer: Observer;
  result(): PlanPath;
}

interface Run {
  readonly tool: number | null;
  readonly kind: 'rapid' | 'feed';
  readonly fromLine: number;
  points: number[];
}

/** The gauge point's way over the table, in runs of one tool and one kind of motion. */
export function buildPlanPath({ mostPoints = MOST_POINTS }: PlanPathOptions = {}): PlanPathBuilder {
  const runs: Run[] = [];
  let pointCount = 0;
  let tolerance = FINEST;
  let truncated = false;
  let current: Run | undefined;
  let line: LineSimplifier | undefined;
  let thinning = THINNING;

  const keepIn = (run: Run) => (x: number, y: number) => {
    run.points.push(round(x), round(y));
    pointCount += 1;
  };
  const endRun = (): void => {
    line?.end();
    current = undefined;
    line = undefined;
  };
  const coarsen = (): void => {
    const step = tolerance;
    tolerance += step + ROUNDING;
    thinning = step;
    pointCount = 0;
    for (const run of runs) {
      run.points = thin(run.points, step);
      pointCount += run.points.length / 2;
    }
  };
  const makeRoom = (): void => {
    endRun();
    while (mostPoints * 0.75 < pointCount && tolerance * 2 + ROUNDING <= COARSEST) coarsen();
    truncated = mostPoints <= pointCount;
  };
  const follow = (motion: Motion, state: MachineState): void => {
    const kind = motion.kind === 'rapid' ? 'rapid' : 'feed';
    const tool = state.held.number;
    if (current?.kind !== kind || current.tool !== tool) {
      endRun();
      current = { tool, kind, fromLine: state.line, points: [] };
      runs.push(current);
      line = simplifyLine(thinning, keepIn(current));
      line.push(motion.fromX, motion.fromY);
    }
    if (motion.kind === 'arc') {
      flattenArc(motion, CHORD_TOLERANCE, (x, y) => line?.push(x, y));
    } else {
      line?.push(motion.toX, motion.toY);
    }
    if (mostPoints <= pointCount) makeRoom();
  };
  const take = (motion: Motion, state: MachineState): void => {
    if (truncated || !showsInPlan(motion)) return;
    if (isKnown(motion)) follow(motion, state);
    else endRun();
  };
  return {
    observer: {
      motion: take,
      quiet() {
        // Every motion is drawn, quiet or not.
      },
      quietMotion: take,
    },
    result() {
      endRun();
      return { tolerance: round(tolerance), truncated, runs };
    },
  };
}

/** Whether it moves over the table at all: a plunge does not. */
function showsInPlan({ fromX, fromY, toX, toY, kind, turn }: Motion): boolean {
  return fromX !== toX || fromY !== toY || (kind === 'arc' && turn !== 0);
}

function isKnown({ fromX, fromY, toX, toY }: Motion): boolean {
  return Number.isFinite(fromX + fromY + toX + toY);
}

function thin(points: readonly number[], tolerance: number): number[] {
  const kept: number[] = [];
  const line = simplifyLine(tolerance, (x, y) => kept.push(x, y));
  for (let at = 0; at < points.length; at += 2) line.push(points[at]!, points[at + 1]!);
  line.end();
  return kept;
}

function round(millimetres: number): number {
  return Math.round(millimetres * 100) / 100;
}
