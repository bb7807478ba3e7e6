import fc from 'fast-check';

/**
 * Programs as what they mean, not as they are written: positions are whole thousandths of an inch, which
 * both inches and millimetres (0.0254 mm each) spell out exactly.
 */
export type Step =
  | { readonly is: 'line'; readonly rapid: boolean; readonly to: Position }
  | {
      readonly is: 'arc';
      readonly plane: 0 | 1 | 2;
      /** From the start to the centre, in plane order. */
      readonly centre: readonly [number, number];
      /** Quarter turns, counterclockwise if positive. */
      readonly quarters: number;
      readonly depth: number;
    }
  | { readonly is: 'hole'; readonly x: number; readonly y: number; readonly depth: number };
/** Undefined: the axis is not named. */
export type Position = readonly [number | undefined, number | undefined, number | undefined];

const coordinate = fc.integer({ min: -20_000, max: 20_000 });
const named = fc.option(coordinate, { nil: undefined });
const offset = fc.integer({ min: -4_000, max: 4_000 });

const line: fc.Arbitrary<Step> = fc.record({
  is: fc.constant('line' as const),
  rapid: fc.boolean(),
  to: fc.tuple(named, named, named),
});
const arc: fc.Arbitrary<Step> = fc.record({
  is: fc.constant('arc' as const),
  plane: fc.constantFrom<(0 | 1 | 2)[]>(0, 1, 2),
  centre: fc.tuple(offset, offset).filter(([u, v]) => u !== 0 || v !== 0),
  quarters: fc.constantFrom(-4, -3, -2, -1, 1, 2, 3, 4),
  depth: fc.integer({ min: -500, max: 500 }),
});
const hole: fc.Arbitrary<Step> = fc.record({
  is: fc.constant('hole' as const),
  x: coordinate,
  y: coordinate,
  depth: fc.integer({ min: 1, max: 900 }),
});

export const programs = fc.array(fc.oneof({ weight: 5, arbitrary: line }, arc, hole), {
  minLength: 1,
  maxLength: 25,
});

export interface Spelling {
  readonly units: 'mm' | 'inch';
  readonly distance: 'absolute' | 'incremental';
}

const AXES = ['X', 'Y', 'Z'] as const;
/** Plane word, its two axes and their centre letters, and the depth axis. */
const PLANES = [
  { word: 'G17', axes: [0, 1], depth: 2, letters: ['I', 'J'] },
  { word: 'G18', axes: [2, 0], depth: 1, letters: ['K', 'I'] },
  { word: 'G19', axes: [1, 2], depth: 0, letters: ['J', 'K'] },
] as const;

/** One block a step, behind a head that brings every axis to a stated place. */
export function spell(steps: readonly Step[], { units, distance }: Spelling): string[] {
  const at: number[] = [0, 0, 0];
  const number = (value: number) =>
    units === 'inch' ? (value / 1000).toFixed(3) : ((value * 254) / 10_000).toFixed(4);
  const word = (axis: number, to: number) => {
    const written = distance === 'absolute' ? to : to - at[axis]!;
    at[axis] = to;
    return ` ${AXES[axis]}${number(written)}`;
  };
  const feed = units === 'inch' ? 'F40.' : 'F1016.';
  const head = [
    `G90 G17 G40 G49 G80 G94 ${units === 'inch' ? 'G20' : 'G21'}`,
    'G54 G0 X0. Y0. Z0.',
  ];
  const body = steps.map((step) => {
    if (step.is === 'line') return spellLine(step, word, feed);
    if (step.is === 'arc') return spellArc(step, { at, word, number, feed });
    const top = at[2]! + 100;
    const levels =
      distance === 'absolute'
        ? ` Z${number(at[2]! - step.depth)} R${number(top)}`
        : ` Z${number(-step.depth - 100)} R${number(100)}`;
    const text = `G17 G98 G81${word(0, step.x)}${word(1, step.y)}${levels} ${feed}`;
    // Drilled from below its retract level, the hole ends there.
    at[2] = top;
    return text;
  });
  const mode = distance === 'absolute' ? [] : ['G91'];
  return [...head, ...mode, ...body.map((text) => text.trim()), 'M30'];
}

function spellLine(
  { rapid, to }: Extract<Step, { is: 'line' }>,
  word: (axis: number, to: number) => string,
  feed: string,
): string {
  const words = to.map((value, axis) => (value === undefined ? '' : word(axis, value))).join('');
  return `${rapid ? 'G0' : 'G1'}${words}${rapid ? '' : ` ${feed}`}`;
}

function spellArc(
  { plane, centre, quarters, depth }: Extract<Step, { is: 'arc' }>,
  {
    at,
    word,
    number,
    feed,
  }: {
    at: readonly number[];
    word: (axis: number, to: number) => string;
    number: (value: number) => string;
    feed: string;
  },
): string {
  const { word: code, axes, letters, depth: depthAxis } = PLANES[plane];
  // From the centre to the start, turned by quarters: whole numbers stay whole.
  let [u, v] = [-centre[0], -centre[1]];
  for (let turn = 0; turn < Math.abs(quarters); turn++) [u, v] = quarters > 0 ? [-v, u] : [v, -u];
  const [endU, endV] = [at[axes[0]]! + centre[0] + u, at[axes[1]]! + centre[1] + v];
  const end = word(axes[0], endU) + word(axes[1], endV) + word(depthAxis, at[depthAxis]! + depth);
  const middle = ` ${letters[0]}${number(centre[0])} ${letters[1]}${number(centre[1])}`;
  return `${code} G${quarters > 0 ? 3 : 2}${end}${middle} ${feed}`;
}
