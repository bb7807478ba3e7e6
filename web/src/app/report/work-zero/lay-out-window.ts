import type { Offsets, Report } from '#engine';

export type WindowAxis = 'x' | 'y' | 'z';
export type WindowState =
  /** Stands where the program fits. */
  | 'inside'
  /** Stands where it does not. */
  | 'outside'
  /** No place fits: the program is longer than the travel. */
  | 'nowhere'
  /** The offset has no value on this axis yet. */
  | 'unset';

/** Where a work offset may stand on one axis, with where it stands now; machine mm. */
export interface WindowRow {
  readonly offset: string;
  readonly axis: WindowAxis;
  readonly state: WindowState;
  readonly from: number;
  readonly to: number;
  readonly value: number | null;
  /** How far it is outside, or by how much the program is longer than the travel. */
  readonly by: number;
  /** Direction in which it must move to come inside, as one says it at the machine. */
  readonly toward: string;
  /** Places along the bar in per cent; null where there is nothing to draw. */
  readonly bar: {
    readonly from: number;
    readonly width: number;
    readonly value: number | null;
  } | null;
}

/** A limit is passed when exceeded by more than this (mm, engine.md); at it is inside. */
const LIMIT_SLACK = 0.001;
/** Room beside the outermost figure, per cent of the bar. */
const EDGE = 6;

const TOWARD: Readonly<Record<WindowAxis, readonly [less: string, more: string]>> = {
  x: ['to the left', 'to the right'],
  y: ['toward the front', 'toward the back'],
  z: ['down', 'up'],
};

/** One row an offset and axis that the program uses. */
export function layOutWindows(
  windows: Report['workZeroWindow'],
  work: Offsets['work'],
): readonly WindowRow[] {
  return Object.entries(windows).flatMap(([offset, window]) =>
    (['x', 'y', 'z'] as const).flatMap((axis) => {
      const range = window[axis];
      return range === null ? [] : [rowOf(offset, axis, range, work[offset]?.[axis] ?? null)];
    }),
  );
}

function rowOf(
  offset: string,
  axis: WindowAxis,
  [from, to]: readonly [number, number],
  value: number | null,
): WindowRow {
  const base = { offset, axis, from, to, value };
  const [less, more] = TOWARD[axis];
  if (to < from) {
    return { ...base, state: 'nowhere', by: from - to, toward: '', bar: null };
  }
  const bar = barOf(from, to, value);
  if (value === null) return { ...base, state: 'unset', by: 0, toward: '', bar };
  if (value < from - LIMIT_SLACK) {
    return { ...base, state: 'outside', by: from - value, toward: more, bar };
  }
  if (to + LIMIT_SLACK < value) {
    return { ...base, state: 'outside', by: value - to, toward: less, bar };
  }
  return { ...base, state: 'inside', by: 0, toward: '', bar };
}

function barOf(from: number, to: number, value: number | null): WindowRow['bar'] {
  const least = Math.min(from, value ?? from);
  const span = Math.max(to, value ?? to) - least;
  const place = (at: number): number =>
    span === 0 ? 50 : EDGE + ((at - least) / span) * (100 - 2 * EDGE);
  // A window of no width is still a place: drawn as wide as a line.
  return {
    from: place(from),
    width: Math.max(0.6, place(to) - place(from)),
    value: value === null ? null : place(value),
  };
}
