import type { Motion } from '#engine';
import type { Row, RowEvent, RowMotion, RowPoint } from './row';
import type { Ran } from './run-row';

/** The sheet gives six decimals, and states 0.0005 mm as the difference that still agrees. */
const TOLERANCE = 0.0005;
const ANGLE_TOLERANCE = 0.0005;

/** Where a run and its row part, in words; empty when they agree. */
export function differences(row: Row, ran: Ran): readonly string[] {
  return row.expected.error ? refusalDifferences(row, ran) : runDifferences(row, ran);
}

/**
 * A refusal agrees when a stop or hold stands at its line and the motions before it are the same. The line
 * itself is not compared: the report's own interpreter acts on parts of a line that it then refuses.
 */
function refusalDifferences(row: Row, ran: Ran): string[] {
  const { line } = row.expected.error!;
  const isFound =
    ran.findings.some((each) => each.severity !== 'note' && each.line === line) ||
    ran.problems.some((each) => each.line === line && each.problem !== 'text-after-end');
  const expected = (row.expected.motions ?? []).filter((motion) => motion.line! < line);
  const before = ran.motions.filter((motion) => motion.line < line);
  return [
    ...(isFound ? [] : [`nothing found at line ${line}`]),
    ...motionDifferences(row, moving(expected), movingRan(before)),
  ];
}

function runDifferences(row: Row, ran: Ran): string[] {
  const { motions, final, extents } = row.expected;
  const found = motionDifferences(row, moving(motions ?? []), movingRan(ran.motions));
  for (const { problem, line } of ran.problems)
    if (READING.includes(problem)) found.push(`${problem} at line ${line}`);
  found.push(...eventDifferences(row, ran));
  if (final) {
    if (!isNear(final.end, ran.end)) found.push(`ends at ${show(ran.end)}, not ${show(final.end)}`);
    const length = final.toolLengthOffset * (row.setup.units === 'inch' ? 25.4 : 1);
    if (!(Math.abs(length - ran.lengthOffset) <= TOLERANCE))
      found.push(`length offset ${ran.lengthOffset}, not ${length}`);
  }
  if (extents) found.push(...extentDifferences(extents, ran));
  return found;
}

/** Problems that mean a line was not taken as it stands; an accepted row has none of them. */
const READING = [
  'unreadable-block',
  'not-modelled',
  'repeated-word',
  'missing-word',
  'out-of-range-word',
  'modal-conflict',
  'arc-radius-mismatch',
  'arc-impossible',
  'cycle-words-missing',
  'cycle-plane',
];

const moving = (motions: readonly RowMotion[]): readonly RowMotion[] =>
  motions.filter((motion, index) => {
    if (motion.kind === 'arc') return true;
    const before = index === 0 ? { x: 0, y: 0, z: 0 } : motions[index - 1]!.end;
    const turned = (motion.abc?.a ?? 0) !== (motions[index - 1]?.abc?.a ?? 0);
    return turned || !isNear(before, motion.end);
  });
const movingRan = (motions: Ran['motions']): Ran['motions'] =>
  motions.filter((motion) => motion.moves || motion.toA !== motion.fromA);

function motionDifferences(
  row: Row,
  expected: readonly RowMotion[],
  ran: Ran['motions'],
): string[] {
  const found: string[] = [];
  if (expected.length !== ran.length)
    found.push(`${ran.length} motions, not ${expected.length}: ${ran.map(showMotion).join(' ')}`);
  expected.forEach((motion, index) => {
    const mine = ran[index];
    if (mine)
      found.push(...oneMotion(row, motion, mine).map((text) => `motion ${index + 1}: ${text}`));
  });
  return found;
}

function oneMotion(row: Row, motion: RowMotion, mine: Motion & { line: number }): string[] {
  const found: string[] = [];
  const end = { x: mine.toX, y: mine.toY, z: mine.toZ };
  if (mine.kind !== motion.kind) found.push(`${mine.kind}, not ${motion.kind}`);
  if (!isNear(motion.end, end)) found.push(`to ${show(end)}, not ${show(motion.end)}`);
  if (motion.line !== undefined && motion.line !== mine.line)
    found.push(`line ${mine.line}, not ${motion.line}`);
  if (motion.abc && !(Math.abs(motion.abc.a - mine.toA) <= TOLERANCE)) found.push(`A ${mine.toA}`);
  const feed = (motion.feed ?? NaN) * (motion.progUnits === 'inch' ? 25.4 : 1);
  if (motion.feed !== undefined && !(Math.abs(feed - mine.feed) <= TOLERANCE))
    found.push(`feed ${mine.feed}, not ${feed}`);
  if (motion.kind === 'arc') found.push(...arcDifferences(motion, mine));
  return found;
}

const PLANES = { XY: 'xy', XZ: 'zx', YZ: 'yz' } as const;

function arcDifferences(motion: RowMotion, mine: Motion): string[] {
  const found: string[] = [];
  const check = (what: string, expected: number | undefined, ran: number, slack = TOLERANCE) => {
    if (expected !== undefined && !(Math.abs(expected - ran) <= slack))
      found.push(`${what} ${ran}, not ${expected}`);
  };
  if (motion.plane && PLANES[motion.plane] !== mine.plane) found.push(`plane ${mine.plane}`);
  check('radius', motion.radius, mine.radius);
  check('sweep', motion.sweepDeg, (mine.turn * 180) / Math.PI, ANGLE_TOLERANCE);
  const [u, v] = [mine.plane[0] as 'x' | 'y' | 'z', mine.plane[1] as 'x' | 'y' | 'z'];
  check(`centre ${u}`, motion.center?.[u], mine.centreU);
  check(`centre ${v}`, motion.center?.[v], mine.centreV);
  for (const [axis, low, high] of [
    ['x', mine.minX, mine.maxX],
    ['y', mine.minY, mine.maxY],
    ['z', mine.minZ, mine.maxZ],
  ] as const) {
    check(`least ${axis}`, motion.extent?.[axis]?.[0], low);
    check(`greatest ${axis}`, motion.extent?.[axis]?.[1], high);
  }
  return found;
}

/** Events this engine tells; the sheet's further ones (path mode, synchronising, overrides) have none here. */
const TOLD: readonly string[] = ['change_tool', 'dwell', 'stop', 'optional_stop', 'tlo', 'message'];
/** Rows whose spindle figures are states inside a cycle or at the end, not words of a block. */
const SPINDLE_BY_STATE = /^CYC|^ORD|^TOOL-04/;

function eventDifferences(row: Row, ran: Ran): string[] {
  const last = row.program.trimEnd().split('\n').length;
  // A controller that ignores M6 still takes the T; the flat program of that row left it out.
  const isT = ({ ev }: { ev: string }) =>
    ev === 'select_tool' && row.setup.dialectFlags?.['m6'] !== 'ignore';
  const isSpindle = ({ ev, line }: { ev: string; line?: number }) =>
    ev === 'spindle' && line !== undefined && line !== last && !SPINDLE_BY_STATE.test(row.id);
  const isCompared = (event: { ev: string; line?: number }) =>
    TOLD.includes(event.ev) || isT(event) || (row.dialect === 'ngc' && isSpindle(event));
  const expected = (row.expected.events ?? [])
    .filter(isCompared)
    .map((event) => showEvent(event.ev, valueOf(row, event)))
    .join(' ');
  const mine = ran.events
    .filter(isCompared)
    .map((event) => showEvent(event.ev, event.value))
    .join(' ');
  return expected === mine ? [] : [`events ${mine}, not ${expected}`];
}

function valueOf(row: Row, event: RowEvent): string | number {
  if (event.ev === 'tlo') return (event.len ?? 0) * (row.setup.units === 'inch' ? 25.4 : 1);
  return event.dir ?? event.s ?? event.slot ?? event.text ?? '';
}
const showEvent = (ev: string, value: string | number) =>
  ev === 'stop' || ev === 'optional_stop' ? ev : `${ev}:${value}`;

function extentDifferences(extents: NonNullable<Row['expected']['extents']>, ran: Ran): string[] {
  const found: string[] = [];
  const ends = ran.motions;
  if (ends.length === 0) return found;
  const boxes = {
    x: [Math.min(...ends.map(lowX)), Math.max(...ends.map(highX))],
    y: [Math.min(...ends.map(lowY)), Math.max(...ends.map(highY))],
    z: [Math.min(...ends.map(lowZ)), Math.max(...ends.map(highZ))],
  } as const;
  for (const axis of ['x', 'y', 'z'] as const)
    for (const side of [0, 1] as const)
      if (!(Math.abs(extents[axis][side] - boxes[axis][side]) <= TOLERANCE))
        found.push(`extent ${axis} ${boxes[axis].join('…')}, not ${extents[axis].join('…')}`);
  return found;
}
/** The sheet's extents hold end points and arc bulges, not start points. */
const lowX = (motion: Motion) => (motion.kind === 'arc' ? motion.minX : motion.toX);
const highX = (motion: Motion) => (motion.kind === 'arc' ? motion.maxX : motion.toX);
const lowY = (motion: Motion) => (motion.kind === 'arc' ? motion.minY : motion.toY);
const highY = (motion: Motion) => (motion.kind === 'arc' ? motion.maxY : motion.toY);
const lowZ = (motion: Motion) => (motion.kind === 'arc' ? motion.minZ : motion.toZ);
const highZ = (motion: Motion) => (motion.kind === 'arc' ? motion.maxZ : motion.toZ);

function isNear(one: RowPoint, other: RowPoint): boolean {
  return (['x', 'y', 'z'] as const).every((axis) => Math.abs(one[axis] - other[axis]) <= TOLERANCE);
}
const show = ({ x, y, z }: RowPoint) => `(${[x, y, z].map((each) => +each.toFixed(4)).join(',')})`;
const showMotion = (motion: Motion) =>
  `${motion.kind}${show({ x: motion.toX, y: motion.toY, z: motion.toZ })}`;
