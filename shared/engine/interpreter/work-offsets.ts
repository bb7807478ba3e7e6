import type { Offsets } from '../shop/setup';

/** One number an axis; undefined where an origin has never been given. */
export interface Origin {
  x: number | undefined;
  y: number | undefined;
  z: number | undefined;
  a: number | undefined;
}
export interface Shift {
  x: number;
  y: number;
  z: number;
  a: number;
}
export type AxisName = keyof Shift;
export const AXES: readonly AxisName[] = ['x', 'y', 'z', 'a'];

/** Origins in machine mm, and the two shifts that lie on top of the active one. */
export class WorkOffsets {
  /** G92: one shift over all offsets. */
  readonly preset = noShift();
  /** What G92.2 leaves for G92.3. */
  readonly presetKept = noShift();
  /**
   * Bits (1 X, 2 Y, 4 Z) of axes whose zero G92 has set: from then on program coordinates are known
   * even if the origin below has no value, because the preset makes up for it.
   */
  presetAxes = 0;
  presetAxesKept = 0;
  /** G52. */
  readonly local = noShift();
  private readonly origins = new Map<string, Origin>();
  /** What parameters of the active offset were set to: it counts from the next selection on. */
  private readonly waiting = new Map<string, Partial<Shift>>();

  constructor(offsets: Offsets) {
    for (const [name, { x, y, z, a }] of Object.entries(offsets.work))
      this.origins.set(name, { x, y, z, a });
  }

  origin(name: string): Origin {
    let origin = this.origins.get(name);
    if (!origin) {
      origin = { x: undefined, y: undefined, z: undefined, a: undefined };
      this.origins.set(name, origin);
    }
    return origin;
  }

  /** What the parameter of an origin reads, mm. */
  assigned(name: string, axis: AxisName): number | undefined {
    return this.waiting.get(name)?.[axis] ?? this.origin(name)[axis];
  }

  /** Sets an origin by its parameter: the active one does not move until it is selected anew (facts sheet 4.4). */
  assign(name: string, axis: AxisName, mm: number, isActive: boolean): void {
    if (isActive) this.waiting.set(name, { ...this.waiting.get(name), [axis]: mm });
    else this.origin(name)[axis] = mm;
  }

  /** Brings in force what was assigned to an offset while it was active. */
  settle(name: string): void {
    const waiting = this.waiting.get(name);
    if (!waiting) return;
    Object.assign(this.origin(name), waiting);
    this.waiting.delete(name);
  }

  /** G10 overrides what a parameter was set to. */
  forget(name: string, axis: AxisName): void {
    delete this.waiting.get(name)?.[axis];
  }
}

export const noShift = (): Shift => ({ x: 0, y: 0, z: 0, a: 0 });

export function copyShift(from: Shift, to: Shift): void {
  to.x = from.x;
  to.y = from.y;
  to.z = from.z;
  to.a = from.a;
}

export const isShifted = ({ x, y, z, a }: Shift): boolean =>
  x !== 0 || y !== 0 || z !== 0 || a !== 0;

/** 'G54' … 'G59.3' for 1 … 9, as G10 counts them; undefined outside. */
export function offsetName(number: number): string | undefined {
  if (!Number.isInteger(number) || number < 1 || 9 < number) return undefined;
  return number <= 6 ? `G${53 + number}` : `G59.${number - 6}`;
}
