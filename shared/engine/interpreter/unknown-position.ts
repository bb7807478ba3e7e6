import { LETTER, letterBits } from '../blocks/block';
import { GROUP } from '../blocks/code-groups';
import type { Interval } from '../expressions/interval';
import type { Target } from './kept';
import { standAt } from './motions';
import { tellProblem, type Run } from './run';

/** Where the gauge point may be, and words whose values are only known within bounds. */
export interface Unknown {
  readonly least: Target;
  readonly greatest: Target;
  readonly words: readonly WordBounds[];
  /** What it depends on, for a sentence: '#5399', 'where the probe stops'. */
  readonly of: string;
}
/** An axis word of the block now carried out. */
export interface WordBounds {
  /** Index in the block's words. */
  readonly word: number;
  readonly bounds: Interval;
}

const AXES = ['x', 'y', 'z', 'a'] as const;
const AXIS_LETTERS = [LETTER.X, LETTER.Y, LETTER.Z, LETTER.A] as const;
const AXIS_WORDS = letterBits('XYZA');
/** Codes that would set an offset or a stored point by where the head stands. */
const SET_BY_POSITION: readonly number[] = [281, 301, 920];
const SET_OFFSETS = 100;
/** Codes that claim the axis words and move nothing. */
const NO_MOTION: readonly number[] = [SET_OFFSETS, 520, ...SET_BY_POSITION];
const DYNAMIC_LENGTH = 431;

const pointOf = ({ x, y, z, a }: Target): Target => ({ x, y, z, a });

/** Notes the words of the block that are only known within bounds; they hold for this block alone. */
export function noteUnknownWords(run: Run, words: readonly WordBounds[], of: string): void {
  const { unknown, machine } = run;
  run.unknown = {
    least: unknown?.least ?? pointOf(machine),
    greatest: unknown?.greatest ?? pointOf(machine),
    words,
    of: unknown?.of ?? of,
  };
}

/** Forgets the words of a block that was not carried out. */
export function forgetUnknownWords(run: Run): void {
  if (run.unknown && run.unknown.words.length > 0) settle(run, run.unknown);
}

/** A probing move stopped somewhere between where it began and its target, ends included. */
export function stopBetween(run: Run, from: Target, to: Target): void {
  const least = pointOf(from);
  const greatest = pointOf(from);
  widen(least, greatest, to);
  settle(run, { least, greatest, words: [], of: 'where the probe stops' });
  noteProbed(run);
}

/**
 * Carries out the motion of a block that begins somewhere within bounds or goes somewhere within them: once from
 * and to each corner of the bounds. Each axis depends on its own start and its own word alone, so no motion
 * reaches beyond those; what is smaller than the bounds may stand between them, and the report says so. The
 * first one is told as the motion of the block, the others as alternatives to it, and the head is left standing
 * where the first one ends.
 */
export function moveAtBounds(run: Run, unknown: Unknown, move: (run: Run) => void): void {
  if (!movesAlong(run, unknown)) {
    move(run);
    settle(run, { ...unknown, words: [] });
    return;
  }
  const { machine, motion } = run;
  run.movesAtBounds = true;
  const choices = choicesOf(run, unknown);
  const first = pointOf(machine);
  const least = endless(Infinity);
  const greatest = endless(-Infinity);
  let standing = first;
  let { of } = unknown;
  let isProbed = false;
  motion.endUnknown = true;
  for (let corner = 0; corner < 1 << choices.length; corner++) {
    run.unknown = undefined;
    standAt(run, first);
    choices.forEach((choose, bit) => choose((corner & (1 << bit)) !== 0));
    motion.isAlternative = corner > 0;
    move(run);
    if (corner === 0) standing = pointOf(machine);
    // Probing leaves bounds of its own.
    const reached = run.unknown as Unknown | undefined;
    if (reached) ({ of } = reached);
    isProbed ||= reached !== undefined;
    widen(least, greatest, reached?.least ?? machine);
    widen(least, greatest, reached?.greatest ?? machine);
  }
  motion.endUnknown = false;
  motion.isAlternative = false;
  choices.forEach((choose) => choose(false));
  standAt(run, standing);
  settle(run, { least, greatest, words: [], of });
  if (isProbed) noteProbed(run);
}

type Choice = (isOther: boolean) => void;

/** For each start and each word that is not known: puts it to the first of its bounds, or to the other. */
function choicesOf(run: Run, unknown: Unknown): Choice[] {
  const { machine, block } = run;
  const { wordOf } = block;
  const { letters, values } = block.words;
  const starts = AXES.flatMap((axis): Choice[] => {
    const least = unknown.least[axis];
    const greatest = unknown.greatest[axis];
    if (least === greatest) return [];
    const start = machine[axis];
    const other = start === least ? greatest : least;
    return [(isOther) => (machine[axis] = isOther ? other : start)];
  });
  // Of a letter that stands twice, the block goes by one word alone.
  const counting = unknown.words.filter(({ word }) => wordOf[letters[word]!] === word);
  const words = counting.map(({ word, bounds }): Choice => {
    return (isOther) => (values[word] = isOther ? bounds.greatest : bounds.least);
  });
  return [...starts, ...words];
}

/** Whether the block moves at all; what would come out otherwise between the bounds than at them is told. */
function movesAlong(run: Run, unknown: Unknown): boolean {
  const { block, machine } = run;
  const once = block.hasGroup(GROUP.once) ? block.codes[GROUP.once]! : -1;
  const hasWords = (block.seen & AXIS_WORDS) !== 0;
  const isLength = block.hasGroup(GROUP.length) && block.codes[GROUP.length] === DYNAMIC_LENGTH;
  if (NO_MOTION.includes(once) || isLength) {
    const isSetHere = SET_BY_POSITION.includes(once) && (hasWords || once !== 920);
    const isSetFrom = once === SET_OFFSETS && block.has(LETTER.L) && block.value(LETTER.L) === 20;
    if (isSetHere || isSetFrom || unknown.words.length > 0) tellDepends(run, unknown);
    return isLength;
  }
  if (!hasWords) return once === 280 || once === 300;
  const code = block.hasGroup(GROUP.motion) ? block.codes[GROUP.motion]! : machine.motionCode;
  if ((code === 20 || code === 30) && isPlaneUnknown(run, unknown)) tellDepends(run, unknown);
  return true;
}

/**
 * Whether an arc begins or ends at an unknown place of its plane. Its circle hangs on both ends, so that the
 * arcs at the bounds do not hold those between; an unknown height alone only moves the whole arc.
 */
function isPlaneUnknown({ machine, block }: Run, { least, greatest, words }: Unknown): boolean {
  const depth = DEPTH_AXES[machine.planeIndex];
  return AXES.some((axis, index) => {
    if (axis === depth || axis === 'a') return false;
    const letter = AXIS_LETTERS[index];
    const isNamed = words.some(({ word }) => block.words.letters[word] === letter);
    return isNamed || least[axis] !== greatest[axis];
  });
}
/** The axis across each plane, in the order of PLANES. */
const DEPTH_AXES = ['z', 'y', 'x'] as const;

function tellDepends(run: Run, { of }: Unknown): void {
  tellProblem(run, 'not-modelled', undefined, { what: '', reason: 'depends', of });
}

const endless = (value: number): Target => ({ x: value, y: value, z: value, a: value });

function widen(least: Target, greatest: Target, to: Target): void {
  for (const axis of AXES) {
    least[axis] = Math.min(least[axis], to[axis]);
    greatest[axis] = Math.max(greatest[axis], to[axis]);
  }
}

/** Bounds that leave one place are no longer needed. */
function settle(run: Run, { least, greatest, of }: Unknown): void {
  const isKnown = AXES.every((axis) => greatest[axis] - least[axis] <= ROUNDING);
  run.unknown = isKnown ? undefined : { least, greatest, words: [], of };
}
/** Sums that should meet differ by less, mm. */
const ROUNDING = 1e-9;

/** Where probing stopped in program coordinates, for the parameters that hold it. */
function noteProbed(run: Run): void {
  const { machine, probed, unknown } = run;
  const base = { x: machine.baseX, y: machine.baseY, z: machine.baseZ, a: machine.baseA };
  AXES.forEach((axis, index) => {
    const unit = axis === 'a' ? 1 : machine.unit;
    const least = ((unknown?.least[axis] ?? machine[axis]) - base[axis]) / unit;
    const greatest = ((unknown?.greatest[axis] ?? machine[axis]) - base[axis]) / unit;
    const of = `#${FIRST_PROBED + index}`;
    probed[axis] = least === greatest ? least : { least, greatest, of };
  });
}
/** Facts sheet 4.3: the parameter of X; Y, Z and A follow. */
const FIRST_PROBED = 5_061;
