import type { z } from 'zod';
import type { Units, jobSheetSchema } from '#contracts';
import { fromMm, toMm } from '../ui/length';

export type JobDocument = z.output<typeof jobSheetSchema>;

/** Where work zero stands on the stock, seen from above; `measured`: its distances are typed. */
export const CORNERS = [
  { value: 'front-left', word: 'front left corner' },
  { value: 'front-right', word: 'front right corner' },
  { value: 'back-left', word: 'back left corner' },
  { value: 'back-right', word: 'back right corner' },
  { value: 'centre', word: 'centre' },
  { value: 'measured', word: 'elsewhere, typed below' },
] as const;
export type Corner = (typeof CORNERS)[number]['value'];
export const WORK_OFFSETS = [
  'G54',
  'G55',
  'G56',
  'G57',
  'G58',
  'G59',
  'G59.1',
  'G59.2',
  'G59.3',
] as const;
export const SIDES = [
  { side: 'min', axis: 'x', word: 'left' },
  { side: 'max', axis: 'x', word: 'right' },
  { side: 'min', axis: 'y', word: 'front' },
  { side: 'max', axis: 'y', word: 'back' },
  { side: 'min', axis: 'z', word: 'bottom' },
  { side: 'max', axis: 'z', word: 'top' },
] as const;

/** The job sheet as it is typed: lengths in the person's units, null where a field is empty. */
export interface TypedJob {
  readonly hasStock: boolean;
  readonly in: string;
  /** Along X, along Y, thickness along Z. */
  readonly sizeX: number | null;
  readonly sizeY: number | null;
  readonly thickness: number | null;
  readonly corner: Corner;
  /** For `measured`: where the stock's front left corner stands in the work offset. */
  readonly atX: number | null;
  readonly atY: number | null;
  readonly material: string;
  readonly zeroOn: 'top' | 'board';
  /** How far the stock stands off the height `zeroOn` gives it (mm): kept from an imported sheet. */
  readonly lift: number;
  readonly obstacles: readonly TypedObstacle[];
}
export interface TypedObstacle {
  readonly name: string;
  readonly in: string;
  /** In the order of SIDES; null leaves that side open. */
  readonly sides: readonly (number | null)[];
}

export const BLANK_JOB: TypedJob = {
  hasStock: false,
  in: 'G54',
  sizeX: null,
  sizeY: null,
  thickness: null,
  corner: 'front-left',
  atX: 0,
  atY: 0,
  material: '',
  zeroOn: 'top',
  lift: 0,
  obstacles: [],
};

/** The stored sheet as a person types it. */
export function typedJob(job: JobDocument | null, units: Units): TypedJob {
  if (!job) return BLANK_JOB;
  const shown = (mm: number | undefined): number | null =>
    mm === undefined ? null : fromMm(mm, units);
  const obstacles = job.obstacles.map(({ name, in: offset, box }) => ({
    name,
    in: offset,
    sides: SIDES.map(({ side, axis }) => shown(box[side][axis])),
  }));
  const { stock, zeroOn } = job;
  if (!stock) return { ...BLANK_JOB, zeroOn, obstacles };
  const { min, max } = stock;
  return {
    hasStock: true,
    in: stock.in,
    sizeX: shown(max.x - min.x),
    sizeY: shown(max.y - min.y),
    thickness: shown(max.z - min.z),
    corner: cornerOf(stock),
    atX: shown(min.x),
    atY: shown(min.y),
    material: stock.material ?? '',
    zeroOn,
    lift: rounded(zeroOn === 'top' ? max.z : min.z),
    obstacles,
  };
}

/** What is typed as a sheet to store, in millimetres. Call it on a filled form only. */
export function jobDocument(typed: TypedJob, units: Units): JobDocument {
  const mm = (value: number | null): number => rounded(toMm(value ?? 0, units));
  return {
    ...(typed.hasStock ? { stock: stockOf(typed, mm) } : {}),
    zeroOn: typed.zeroOn,
    obstacles: typed.obstacles.map(({ name, in: offset, sides }) => {
      const box: Record<'min' | 'max', Partial<Record<'x' | 'y' | 'z', number>>> = {
        min: {},
        max: {},
      };
      SIDES.forEach(({ side, axis }, index) => {
        const value = sides[index];
        if (value !== null && value !== undefined) box[side][axis] = mm(value);
      });
      return { name: name.trim(), in: offset, box };
    }),
  };
}

/** The pairs of sides of an obstacle that stand the wrong way round, in words; empty when none. */
export function twistedSides(sides: readonly (number | null)[]): readonly string[] {
  return ([0, 2, 4] as const)
    .filter((index) => {
      const [low, high] = [sides[index] ?? -Infinity, sides[index + 1] ?? Infinity];
      return !(low <= high);
    })
    .map((index) => `${SIDES[index].word} must not lie beyond ${SIDES[index + 1]?.word}`);
}

function stockOf(
  typed: TypedJob,
  mm: (value: number | null) => number,
): NonNullable<JobDocument['stock']> {
  const [sizeX, sizeY, thickness] = [mm(typed.sizeX), mm(typed.sizeY), mm(typed.thickness)];
  const [x, y] = frontLeft(typed, sizeX, sizeY, mm);
  const z = rounded(typed.lift - (typed.zeroOn === 'top' ? thickness : 0));
  const material = typed.material.trim();
  return {
    in: typed.in,
    min: { x, y, z },
    max: { x: rounded(x + sizeX), y: rounded(y + sizeY), z: rounded(z + thickness) },
    ...(material ? { material } : {}),
  };
}

/** Where the stock's front left corner stands, seen from work zero. */
function frontLeft(
  typed: TypedJob,
  sizeX: number,
  sizeY: number,
  mm: (value: number | null) => number,
): [number, number] {
  switch (typed.corner) {
    case 'front-left':
      return [0, 0];
    case 'front-right':
      return [rounded(-sizeX), 0];
    case 'back-left':
      return [0, rounded(-sizeY)];
    case 'back-right':
      return [rounded(-sizeX), rounded(-sizeY)];
    case 'centre':
      return [rounded(-sizeX / 2), rounded(-sizeY / 2)];
    case 'measured':
      return [mm(typed.atX), mm(typed.atY)];
  }
}

function cornerOf({ min, max }: NonNullable<JobDocument['stock']>): Corner {
  const isZero = (value: number): boolean => Math.abs(value) < SAME;
  if (isZero(min.x + max.x) && isZero(min.y + max.y)) return 'centre';
  const across = isZero(min.x) ? 'left' : isZero(max.x) ? 'right' : null;
  const along = isZero(min.y) ? 'front' : isZero(max.y) ? 'back' : null;
  return across && along ? `${along}-${across}` : 'measured';
}

/** Two lengths closer than this are the same (mm): a tenth of what a rule can be read to. */
const SAME = 0.001;

/** 0.1 µm: finer than any stock is known, coarse enough that inches come back as they were typed. */
function rounded(mm: number): number {
  return Number(mm.toFixed(4)) + 0;
}
