import type { JobSheet, Machine, Offsets, OpenBox, Opening, Rack } from '#engine';

/** A rectangle in machine millimetres of the gauge point, seen from above. */
export interface PlanBox {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}
export interface NamedPlanBox extends PlanBox {
  readonly name: string;
}
export interface PlanPocket {
  readonly number: number;
  readonly x: number;
  readonly y: number;
  /** The fork as an outline whose mouth is open, in machine mm. */
  readonly fork: string;
}
export interface PlanPoint {
  readonly name: string;
  readonly x: number;
  readonly y: number;
}

export interface TablePlanDrawing {
  /** What must be seen: travel, rack, table, stock, and the path as far as it stays near. */
  readonly bounds: PlanBox;
  readonly travel: PlanBox;
  readonly spoilboard: PlanBox | null;
  readonly rackBodies: readonly NamedPlanBox[];
  readonly pockets: readonly PlanPocket[];
  readonly zones: readonly NamedPlanBox[];
  readonly stock: PlanBox | null;
  readonly obstacles: readonly NamedPlanBox[];
  readonly zeros: readonly PlanPoint[];
  /** Whether the path runs so far out that the plan does not follow it. */
  readonly pathLeaves: boolean;
}

export interface PlanToDraw {
  readonly machine: Machine;
  readonly rack: Rack;
  readonly work: Offsets['work'];
  readonly job: JobSheet | undefined;
  /** Least and greatest x and y of the path; null: none. */
  readonly path: PlanBox | null;
}

/** A path in the wrong unit runs 25 times too far: following it would shrink the table to a dot. */
const FOLLOWED_BEYOND_TRAVEL = 0.25;

export function layOutPlan(input: PlanToDraw): TablePlanDrawing {
  const { machine, rack, job } = input;
  const [x0, x1] = machine.travel.x;
  const [y0, y1] = machine.travel.y;
  const travel = { x: x0, y: y0, width: x1 - x0, height: y1 - y0 };
  const near = grow(travel, FOLLOWED_BEYOND_TRAVEL * Math.max(travel.width, travel.height));
  const area = machine.spoilboard?.area;
  const spoilboard = area ? closed(area, near) : null;
  const rackBodies = rack.bodies.map(({ name, box }) => ({ name, ...closed(box, near) }));
  const pockets = rack.pockets.map((pocket) => ({
    number: pocket.number,
    x: pocket.grip.x,
    y: pocket.grip.y,
    fork: forkOutline(pocket.grip, pocket.opens, rack.fork),
  }));
  const stock = job?.stock ? inWork(job.stock, job.stock.in, input.work) : null;
  const path = input.path;
  const parts = [
    travel,
    spoilboard,
    stock,
    path ? overlap(path, near) : null,
    ...rackBodies,
    ...pockets.map((pocket) => grow({ x: pocket.x, y: pocket.y, width: 0, height: 0 }, 30)),
  ];
  return {
    bounds: around(parts.filter((part) => part !== null)),
    travel,
    spoilboard,
    rackBodies,
    pockets,
    zones: machine.zones.map(({ name, box }) => ({ name, ...closed(box, near) })),
    stock,
    obstacles: (job?.obstacles ?? []).map((each) => ({
      name: each.name,
      ...(inWork(each.box, each.in, input.work) ?? closed({ min: {}, max: {} }, near)),
    })),
    zeros: zerosOf(input.work),
    pathLeaves: path !== null && !holds(near, path),
  };
}

/** A box with its open sides closed at `limits`. */
export function closed(box: OpenBox, limits: PlanBox): PlanBox {
  const x = box.min.x ?? limits.x;
  const y = box.min.y ?? limits.y;
  const right = box.max.x ?? limits.x + limits.width;
  const top = box.max.y ?? limits.y + limits.height;
  return { x, y, width: Math.max(0, right - x), height: Math.max(0, top - y) };
}

/** A box given from a work zero, in machine coordinates; null while that zero has no value. */
function inWork(box: OpenBox, offset: string, work: Offsets['work']): PlanBox | null {
  const zero = work[offset];
  if (zero?.x === undefined || zero.y === undefined) return null;
  const { min, max } = box;
  if (min.x === undefined || min.y === undefined) return null;
  if (max.x === undefined || max.y === undefined) return null;
  return { x: zero.x + min.x, y: zero.y + min.y, width: max.x - min.x, height: max.y - min.y };
}

function zerosOf(work: Offsets['work']): readonly PlanPoint[] {
  return Object.entries(work).flatMap(([name, { x, y }]) =>
    x === undefined || y === undefined ? [] : [{ name, x, y }],
  );
}

/** Tines and the piece that joins them; the side toward `opens` stays open. */
function forkOutline(
  grip: { readonly x: number; readonly y: number },
  opens: Opening,
  fork: Rack['fork'],
): string {
  const half = fork.width / 2;
  const reach = Math.max(fork.reach, fork.width * 0.25);
  const back = -fork.width * 0.35;
  // Drawn as opening toward +x, then turned.
  const corners: readonly (readonly [number, number])[] = [
    [reach, half],
    [back, half],
    [back, -half],
    [reach, -half],
  ];
  const turn: Readonly<Record<Opening, (x: number, y: number) => readonly [number, number]>> = {
    '+x': (x, y) => [x, y],
    '-x': (x, y) => [-x, -y],
    '+y': (x, y) => [-y, x],
    '-y': (x, y) => [y, -x],
  };
  return corners
    .map(([x, y], index) => {
      const [dx, dy] = turn[opens](x, y);
      return `${index === 0 ? 'M' : 'L'}${grip.x + dx} ${grip.y + dy}`;
    })
    .join('');
}

function grow(box: PlanBox, by: number): PlanBox {
  return { x: box.x - by, y: box.y - by, width: box.width + 2 * by, height: box.height + 2 * by };
}
function overlap(a: PlanBox, b: PlanBox): PlanBox | null {
  const x = Math.max(a.x, b.x);
  const y = Math.max(a.y, b.y);
  const right = Math.min(a.x + a.width, b.x + b.width);
  const top = Math.min(a.y + a.height, b.y + b.height);
  return right < x || top < y ? null : { x, y, width: right - x, height: top - y };
}
function holds(outer: PlanBox, inner: PlanBox): boolean {
  return (
    outer.x <= inner.x &&
    outer.y <= inner.y &&
    inner.x + inner.width <= outer.x + outer.width &&
    inner.y + inner.height <= outer.y + outer.height
  );
}
function around(boxes: readonly PlanBox[]): PlanBox {
  const x = Math.min(...boxes.map((box) => box.x));
  const y = Math.min(...boxes.map((box) => box.y));
  const right = Math.max(...boxes.map((box) => box.x + box.width));
  const top = Math.max(...boxes.map((box) => box.y + box.height));
  return { x, y, width: right - x, height: top - y };
}

/** A label at a place of the picture, px. */
export interface PlacedLabel {
  readonly x: number;
  readonly y: number;
  readonly width: number;
}
const LABEL_HEIGHT = 14;

/** Of labels that would lie over each other the first is kept; zooming in parts them. */
export function keepApart<Label extends PlacedLabel>(labels: readonly Label[]): readonly Label[] {
  const kept: Label[] = [];
  for (const label of labels) {
    const hits = kept.some(
      (each) =>
        Math.abs(each.y - label.y) < LABEL_HEIGHT &&
        each.x < label.x + label.width &&
        label.x < each.x + each.width,
    );
    if (!hits) kept.push(label);
  }
  return kept;
}
