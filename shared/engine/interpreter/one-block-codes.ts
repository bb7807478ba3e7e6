import { LETTER } from '../blocks/block';
import { SETTING } from './machine';
import {
  AXIS_LETTERS,
  hasAxisWord,
  moveStraight,
  namedAxes,
  readTarget,
  tellIfUnset,
} from './motions';
import { placeProgramZero } from './program-zero';
import { refuse, tellProblem, type Run } from './run';
import { wholeNumber } from './whole-number';
import { AXES, copyShift, noShift, offsetName, type Shift } from './work-offsets';

/** Codes that act in their own block only and claim its axis words: homing and the offset family. */
export function carryOutOnce(run: Run, code: number): void {
  switch (code) {
    case 280:
    case 300:
      return moveHome(run, code);
    case 281:
    case 301:
      return storeReference(run, code);
    case 100:
      return setOffsets(run);
    case 520:
      return setLocalShift(run);
    case 920:
      return setPreset(run);
    default:
      return changePreset(run, code);
  }
}

/** G28 and G30: by way of the stated point to the stored one, which is in machine coordinates. */
function moveHome(run: Run, code: number): void {
  const { block, machine, controller, references } = run;
  const name = code === 280 ? 'G28' : 'G30';
  if (refuseWhileCompensating(run, name)) return;
  const home = code === 280 ? references.g28 : references.g30;
  const named = namedAxes(block.seen);
  if (hasAxisWord(block.seen)) {
    if (machine.isAbsolute) tellIfUnset(run, named);
    run.motion.named = named;
    moveStraight(run, 'rapid', 'home', readTarget(run, run.target), NaN);
  } else run.loneMachineMove = { code: name, place: machine.place({ code: name }) };
  if (!home) {
    tellProblem(run, 'not-modelled', { code: name }, { what: name, reason: 'no-reference' });
    return;
  }
  const all = controller.switches.homeAxes === 'all' || named === 0;
  const { target } = run;
  target.x = all || block.has(LETTER.X) ? home.x : machine.x;
  target.y = all || block.has(LETTER.Y) ? home.y : machine.y;
  target.z = all || block.has(LETTER.Z) ? home.z : machine.z;
  const turns = block.has(LETTER.A) || (all && run.shop.setup.machine.travel.a !== undefined);
  target.a = turns ? (home.a ?? 0) : machine.a;
  run.motion.named = all ? 7 | (turns ? 8 : 0) : named;
  moveStraight(run, 'rapid', 'home', target, NaN);
}

function storeReference(run: Run, code: number): void {
  const { machine, references } = run;
  const point = { x: machine.x, y: machine.y, z: machine.z, a: machine.a };
  if (code === 281) references.g28 = point;
  else references.g30 = point;
}

/** Whether the block is refused because the code is illegal while cutter compensation is on. */
export function refuseWhileCompensating(run: Run, what: string): boolean {
  const { compensation } = run.machine;
  if (compensation === 'off') return false;
  const other = compensation === 'left' ? 'G41' : 'G42';
  refuse(run, 'modal-conflict', { code: what }, { reason: 'compensating', what, other });
  return true;
}

/** What an axis word says in mm (degrees for A), or undefined without one. */
function axisWord(run: Run, axis: number): number | undefined {
  const { block, machine } = run;
  const letter = AXIS_LETTERS[axis]!;
  if (!block.has(letter)) return undefined;
  return block.value(letter) * (letter === LETTER.A ? 1 : machine.unit);
}

/** G10 L2 and L20 set an origin, L1 a tool's offsets; none of them moves anything. */
function setOffsets(run: Run): void {
  const { block } = run;
  const kind = block.has(LETTER.L) ? wholeNumber(block.value(LETTER.L)) : NaN;
  const { isStrict } = run.dialect;
  if (!block.has(LETTER.L))
    return refuse(run, 'missing-word', { code: 'G10' }, { code: 'G10', letter: 'L' });
  if (kind !== 2 && (isStrict || (kind !== 20 && kind !== 1)))
    return refuse(
      run,
      'not-modelled',
      { letters: 'L', code: 'G10' },
      { what: `G10 ${block.written(block.wordOf[LETTER.L]!)}` },
    );
  if (!block.has(LETTER.P))
    return refuse(run, 'missing-word', { code: 'G10' }, { code: 'G10', letter: 'P' });
  const number = wholeNumber(block.value(LETTER.P));
  if (kind === 1) return setTable(run, number);
  const active = number === 0 && !isStrict ? run.machine.workOffset : offsetName(number);
  if (active === undefined) return refuseNumber(run);
  setOrigin(run, active, kind === 20);
}

function refuseNumber(run: Run): void {
  const value = run.block.value(LETTER.P);
  const what = run.block.written(run.block.wordOf[LETTER.P]!);
  refuse(
    run,
    'out-of-range-word',
    { letters: 'P' },
    { letter: 'P', what, value, needs: 'offset-number' },
  );
}

function setOrigin(run: Run, name: string, isHere: boolean): void {
  const { machine, offsets } = run;
  const origin = offsets.origin(name);
  const here = [machine.x, machine.y, machine.z - machine.lengthOffset, machine.a];
  AXES.forEach((axis, index) => {
    const word = axisWord(run, index);
    if (word === undefined) return;
    offsets.forget(name, axis);
    origin[axis] = isHere ? here[index]! - offsets.preset[axis] - offsets.local[axis] - word : word;
  });
  run.toldUnset.delete(name);
  placeProgramZero(run);
}

/** G10 L1: Z is a length, R the radius of the cutter (common practice, no source). */
function setTable(run: Run, number: number): void {
  const { block, machine } = run;
  if (!(number >= 1)) return refuseNumber(run);
  const length = axisWord(run, 2);
  if (length !== undefined) run.lengths.set(number, length);
  if (block.has(LETTER.R)) run.diameters.set(number, 2 * block.value(LETTER.R) * machine.unit);
}

/** G52: a shift inside whichever offset is active; unnamed axes keep theirs. */
function setLocalShift(run: Run): void {
  const { local } = run.offsets;
  AXES.forEach((axis, index) => {
    const word = axisWord(run, index);
    if (word !== undefined) local[axis] = word;
  });
  tellShift(run, 'G52');
}

/** G92: the current point gets the stated coordinates; nothing moves. */
function setPreset(run: Run): void {
  const { block, machine, offsets } = run;
  const named = namedAxes(block.seen);
  // G92 S is a speed limit on many controllers and sets no zero.
  if (named === 0 && block.has(LETTER.S)) return;
  if (named === 0)
    return refuse(run, 'missing-word', { code: 'G92' }, { code: 'G92', letter: 'X, Y or Z' });
  if (refuseWhileCompensating(run, 'G92')) return;
  const { preset } = offsets;
  const here = [
    machine.x - machine.baseX,
    machine.y - machine.baseY,
    machine.z - machine.baseZ,
    machine.a - machine.baseA,
  ];
  AXES.forEach((axis, index) => {
    const word = axisWord(run, index);
    if (word !== undefined) preset[axis] += here[index]! - word;
  });
  offsets.presetAxes |= named & 7;
  copyShift(preset, offsets.presetKept);
  offsets.presetAxesKept = offsets.presetAxes;
  tellShift(run, 'G92');
}

/** G92.1 clears the shift for good, G92.2 keeps it aside, G92.3 brings it back. */
function changePreset(run: Run, code: number): void {
  const { offsets } = run;
  const name = `G92.${code - 920}`;
  if (refuseWhileCompensating(run, name)) return;
  if (code === 923) {
    copyShift(offsets.presetKept, offsets.preset);
    offsets.presetAxes = offsets.presetAxesKept;
  } else {
    clear(offsets.preset);
    offsets.presetAxes = 0;
    if (code === 921) {
      clear(offsets.presetKept);
      offsets.presetAxesKept = 0;
    }
  }
  tellShift(run, name);
}

const clear = (shift: Shift): void => copyShift(noShift(), shift);

function tellShift(run: Run, code: string): void {
  const { block, machine } = run;
  placeProgramZero(run);
  machine.noteSet(SETTING.localShift, block.codeWords[0]!);
  const withAxes = namedAxes(block.seen) !== 0;
  run.tell.localShift({ code, withAxes, place: machine.place({ letters: 'XYZA', code }) });
}
