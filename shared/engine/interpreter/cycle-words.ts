import { LETTER } from '../blocks/block';
import { codeName } from '../blocks/code-groups';
import type { CycleMemory } from './kept';
import { refuse, type Run } from './run';
import { wholeNumber } from './whole-number';

const { I, J, K, L, P, Q, R } = LETTER;

export const NO_CYCLE = 800;

export function emptyCycle(): CycleMemory {
  return {
    code: NO_CYCLE,
    depth: NaN,
    retract: NaN,
    dwell: NaN,
    peck: NaN,
    shiftU: NaN,
    shiftV: NaN,
    back: NaN,
    motionBefore: NO_CYCLE,
    seriesLevel: NaN,
  };
}

/** Depth letter of each plane, in the order of the plane index. */
const DEPTH_LETTERS = [LETTER.Z, LETTER.Y, LETTER.X] as const;
export const depthLetter = (planeIndex: number): number => DEPTH_LETTERS[planeIndex]!;

const DWELLS: readonly number[] = [820, 860, 880, 890];
const PECKS: readonly number[] = [730, 830];
/** Of back boring, the words in plane order and along the depth axis. */
const BACK_LETTERS = [
  [I, J, K],
  [K, I, J],
  [J, K, I],
] as const;

/**
 * Takes the words of one cycle block over what is kept (NISTIR 6556 3.5.16). Says how often to repeat,
 * or 0 where words are missing or out of range, which has then been told.
 */
export function readCycleWords(run: Run, code: number, level: number): number {
  const { cycle } = run;
  if (cycle.code !== code) {
    if (cycle.code === NO_CYCLE) cycle.seriesLevel = level;
    const { seriesLevel, motionBefore } = cycle;
    Object.assign(cycle, emptyCycle(), { seriesLevel, motionBefore });
  }
  const missing = takeWords(run, code);
  if (missing !== '') {
    const name = codeName('G', code);
    refuse(run, 'cycle-words-missing', { code: name }, { code: name, letters: missing });
    return 0;
  }
  cycle.code = code;
  if (PECKS.includes(code) && !(cycle.peck > 0)) {
    refuseWord(run, Q, 'positive');
    return 0;
  }
  if (cycle.dwell < 0) {
    refuseWord(run, P, 'not-negative');
    return 0;
  }
  return readRepeats(run);
}

/** Letters that this cycle needs and has never been given, one string. */
function takeWords(run: Run, code: number): string {
  const { block, machine, cycle } = run;
  const { unit, planeIndex } = machine;
  const depth = depthLetter(planeIndex);
  let missing = '';
  if (block.has(R)) cycle.retract = block.value(R) * unit;
  else if (Number.isNaN(cycle.retract)) missing += 'R';
  if (block.has(depth)) cycle.depth = block.value(depth) * unit;
  else if (Number.isNaN(cycle.depth)) missing += String.fromCharCode(65 + depth);
  if (block.has(P)) cycle.dwell = block.value(P);
  else if (Number.isNaN(cycle.dwell) && DWELLS.includes(code) && needsDwell(run, code))
    missing += 'P';
  if (block.has(Q)) cycle.peck = block.value(Q) * unit;
  else if (Number.isNaN(cycle.peck) && PECKS.includes(code)) missing += 'Q';
  if (code !== 870) return missing;
  const [u, v, back] = BACK_LETTERS[planeIndex]!;
  if (block.has(u)) cycle.shiftU = block.value(u) * unit;
  if (block.has(v)) cycle.shiftV = block.value(v) * unit;
  if (block.has(back)) cycle.back = block.value(back) * unit;
  const isGiven = !Number.isNaN(cycle.shiftU + cycle.shiftV + cycle.back);
  return isGiven ? missing : missing + 'IJK';
}

/** Boring cycles without P dwell not at all on trade controllers (common practice, no source). */
function needsDwell(run: Run, code: number): boolean {
  return run.dialect.isStrict || code === 820;
}

function readRepeats(run: Run): number {
  const { block, controller } = run;
  // Macro dialects count repeats with K (common practice, no source).
  const letter = controller.language === 'custom-macro' && block.has(K) && !block.has(L) ? K : L;
  if (!block.has(letter)) return 1;
  const repeats = wholeNumber(block.value(letter));
  if (repeats >= 1) return repeats;
  refuseWord(run, letter, 'positive');
  return 0;
}

function refuseWord(run: Run, letter: number, needs: string): void {
  const { block } = run;
  const name = String.fromCharCode(65 + letter);
  const isHere = block.has(letter);
  refuse(
    run,
    'out-of-range-word',
    { letters: name },
    {
      letter: name,
      what: isHere ? block.written(block.wordOf[letter]!) : name,
      value: isHere ? block.value(letter) : 0,
      needs,
    },
  );
}
