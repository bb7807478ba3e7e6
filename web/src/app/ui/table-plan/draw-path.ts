import type { PlanPath } from '#contracts';
import type { PlanBox } from './lay-out-plan';

type Run = PlanPath['runs'][number];

/** All motion of one kind with one tool, as one SVG path in machine millimetres. */
export interface ToolPath {
  readonly tool: number | null;
  readonly kind: 'rapid' | 'feed';
  readonly d: string;
}
/** A tool of the path: where it first cuts, and how far it goes. */
export interface PathTool {
  readonly tool: number | null;
  readonly start: readonly [number, number];
  readonly box: PlanBox;
  readonly points: number;
}

/** Joins the runs of each tool and kind; `tolerance` (mm) is what may be left out unseen. */
export function drawPath(runs: readonly Run[], tolerance: number): readonly ToolPath[] {
  const paths = new Map<string, { tool: number | null; kind: Run['kind']; d: string[] }>();
  for (const run of runs) {
    const key = `${run.tool} ${run.kind}`;
    const path = paths.get(key) ?? { tool: run.tool, kind: run.kind, d: [] };
    path.d.push(pathOf(simplify(run.points, tolerance)));
    paths.set(key, path);
  }
  return [...paths.values()].map(({ tool, kind, d }) => ({ tool, kind, d: d.join('') }));
}

export function pathOf(points: readonly number[]): string {
  let d = '';
  for (let at = 0; at + 1 < points.length; at += 2) {
    d += `${at === 0 ? 'M' : 'L'}${round(points[at]!)} ${round(points[at + 1]!)}`;
  }
  // A lone point (a drilled hole) is drawn as a dot by its round ends.
  return points.length === 2 ? `${d}h0` : d;
}

/**
 * Leaves out points that no screen could show at this scale: a point is dropped while all dropped
 * since the last kept one lie within `tolerance` of the straight line past them.
 */
export function simplify(points: readonly number[], tolerance: number): readonly number[] {
  const count = points.length / 2;
  if (count <= 2 || tolerance <= 0) return points;
  const kept: number[] = [points[0]!, points[1]!];
  let from = 0;
  for (let to = 2; to < count; to += 1) {
    if (!staysNear(points, from, to, tolerance)) {
      from = to - 1;
      kept.push(points[2 * from]!, points[2 * from + 1]!);
    }
  }
  kept.push(points[2 * count - 2]!, points[2 * count - 1]!);
  return kept;
}

/** Looking back over more points than this costs more than one point too many. */
const LOOK_BACK = 64;

function staysNear(
  points: readonly number[],
  from: number,
  to: number,
  tolerance: number,
): boolean {
  if (LOOK_BACK < to - from) return false;
  const ax = points[2 * from]!;
  const ay = points[2 * from + 1]!;
  const dx = points[2 * to]! - ax;
  const dy = points[2 * to + 1]! - ay;
  const squared = dx * dx + dy * dy;
  for (let at = from + 1; at < to; at += 1) {
    const px = points[2 * at]! - ax;
    const py = points[2 * at + 1]! - ay;
    // The nearest point of the piece itself, not of the endless line: a turn back must stay.
    const along = squared === 0 ? 0 : Math.min(1, Math.max(0, (px * dx + py * dy) / squared));
    const ox = px - along * dx;
    const oy = py - along * dy;
    if (!(ox * ox + oy * oy <= tolerance * tolerance)) return false;
  }
  return true;
}

/** The tools of a path in the order in which they first move. */
export function pathTools(runs: readonly Run[]): readonly PathTool[] {
  const tools = new Map<number | null, PathTool>();
  for (const run of runs) {
    if (run.kind !== 'feed' || run.points.length < 2) continue;
    const known = tools.get(run.tool);
    const box = boxOf(run.points);
    tools.set(run.tool, {
      tool: run.tool,
      start: known?.start ?? [run.points[0]!, run.points[1]!],
      box: known ? union(known.box, box) : box,
      points: (known?.points ?? 0) + run.points.length / 2,
    });
  }
  return [...tools.values()];
}

export function pathBox(runs: readonly Run[]): PlanBox | null {
  let box: PlanBox | null = null;
  for (const run of runs) {
    if (run.points.length < 2) continue;
    const own = boxOf(run.points);
    box = box ? union(box, own) : own;
  }
  return box;
}

/** A place of the path that something is said about. */
export interface PathMark {
  readonly line: number;
  readonly severity: 'stop' | 'hold' | 'note';
  /** The tool it is about; a stretch run with another is not its place. */
  readonly tool?: number;
  /** Words beside the place. */
  readonly words: string;
  /** A coordinate it must have, when the finding names one. */
  readonly axis?: 'x' | 'y';
  readonly at?: number;
}
export interface MarkedPath {
  /** The stretch of path that holds the line. */
  readonly d: string;
  readonly x: number;
  readonly y: number;
  /** Whether the point is the one meant, or only about where the line is along its stretch. */
  readonly exact: boolean;
}

/**
 * The run that holds a line (the last one that begins at or before it), and the point of it to mark:
 * the one nearest to the coordinate named, else as far along as the line is among the run's lines.
 */
export function findMark(runs: readonly Run[], mark: PathMark): MarkedPath | null {
  const index = runs.findLastIndex((run) => run.fromLine <= mark.line && run.points.length >= 2);
  const held = runs[index];
  if (!held || (mark.tool !== undefined && mark.tool !== held.tool)) return null;
  const { points } = held;
  const named = mark.axis !== undefined && mark.at !== undefined;
  const at = named
    ? nearestTo(points, mark.axis === 'x' ? 0 : 1, mark.at!)
    : alongBy(points, (mark.line - held.fromLine) / linesOf(runs, index, mark.line));
  const exact = named || (mark.line === held.fromLine && points.length === 2);
  return { d: pathOf(points), x: points[at]!, y: points[at + 1]!, exact };
}

function nearestTo(points: readonly number[], offset: 0 | 1, wanted: number): number {
  let best = 0;
  for (let at = 0; at + 1 < points.length; at += 2) {
    const gap = Math.abs(points[at + offset]! - wanted);
    if (gap < Math.abs(points[best + offset]! - wanted)) best = at;
  }
  return best;
}
function alongBy(points: readonly number[], share: number): number {
  const count = points.length / 2;
  return 2 * Math.min(count - 1, Math.max(0, Math.round(share * (count - 1))));
}
/** Lines from the beginning of a run to that of the next; the last run reaches at least to `line`. */
function linesOf(runs: readonly Run[], index: number, line: number): number {
  const from = runs[index]!.fromLine;
  const next = runs.slice(index + 1).find((run) => from < run.fromLine)?.fromLine ?? line;
  return Math.max(1, next - from);
}

function boxOf(points: readonly number[]): PlanBox {
  let x0 = Infinity;
  let y0 = Infinity;
  let x1 = -Infinity;
  let y1 = -Infinity;
  for (let at = 0; at + 1 < points.length; at += 2) {
    x0 = Math.min(x0, points[at]!);
    x1 = Math.max(x1, points[at]!);
    y0 = Math.min(y0, points[at + 1]!);
    y1 = Math.max(y1, points[at + 1]!);
  }
  return { x: x0, y: y0, width: x1 - x0, height: y1 - y0 };
}
function union(a: PlanBox, b: PlanBox): PlanBox {
  const x = Math.min(a.x, b.x);
  const y = Math.min(a.y, b.y);
  return {
    x,
    y,
    width: Math.max(a.x + a.width, b.x + b.width) - x,
    height: Math.max(a.y + a.height, b.y + b.height) - y,
  };
}
function round(value: number): number {
  return Math.round(value * 100) / 100;
}
