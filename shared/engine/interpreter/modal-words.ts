import { LETTER } from '../blocks/block';
import { GROUP, codeName } from '../blocks/code-groups';
import type { SettableState } from './events';
import { SETTING } from './machine';
import { refuseWhileCompensating } from './one-block-codes';
import { refuse, type Run } from './run';

/** Steps of a block that only set a mode: no axis moves in any of them. */

export function applyFeedMode(run: Run): void {
  const { block, machine } = run;
  const code = block.codes[GROUP.feedMode]!;
  const mode = code === 930 ? 'inverse-time' : code === 950 ? 'per-revolution' : 'per-minute';
  setModal(run, 'feedMode', GROUP.feedMode, machine.feedMode, mode);
  if (machine.feedMode !== mode) machine.feed = NaN;
  machine.feedMode = mode;
}

/**
 * F, kept in mm/min under G94, per minute of the move under G93, in mm a turn under G95. A G20 or G21 in
 * the same block counts already, because that is how it is meant wherever both are written.
 */
export function applyFeed(run: Run): void {
  const { block, machine } = run;
  const written = block.value(LETTER.F);
  if (!(written >= 0)) return refuseNegative(run, LETTER.F);
  const unit = block.hasGroup(GROUP.units) ? unitOf(block.codes[GROUP.units]!) : machine.unit;
  const feed = machine.feedMode === 'inverse-time' ? written : written * unit;
  if (feed === machine.feed) return;
  machine.feed = feed;
  machine.noteSet(SETTING.feed, block.wordOf[LETTER.F]!);
}

export function applySpeed(run: Run): void {
  const { block, machine } = run;
  const speed = block.value(LETTER.S);
  if (!(speed >= 0)) return refuseNegative(run, LETTER.S);
  // G92 S and G50 S limit the speed and do not set it (common practice, no source).
  if (block.hasGroup(GROUP.once) && block.codes[GROUP.once] === 920) return;
  if (block.hasGroup(GROUP.idle) && block.codes[GROUP.idle] === 500) return;
  machine.speed = speed;
  machine.noteSet(SETTING.speed, block.wordOf[LETTER.S]!);
  if (machine.turning === 'off' || block.hasGroup(GROUP.spindle)) return;
  const { turning } = machine;
  run.tell.spindle({ turning, speed, code: 'S', place: machine.place({ letters: 'S' }) });
}

export function refuseNegative(run: Run, letter: number): void {
  const { block } = run;
  const name = String.fromCharCode(65 + letter);
  const value = block.value(letter);
  const what = block.written(block.wordOf[letter]!);
  const needs = value < 0 ? 'not-negative' : 'whole';
  refuse(run, 'out-of-range-word', { letters: name }, { letter: name, what, value, needs });
}

/** M3, M4, M5; M19 orients a spindle and so stands it still. */
export function applySpindle(run: Run): void {
  const { block, machine } = run;
  const code = block.codes[GROUP.spindle]!;
  machine.turning = code === 30 ? 'cw' : code === 40 ? 'ccw' : 'off';
  machine.noteSet(SETTING.spindle, block.codeWords[GROUP.spindle]!);
  const name = codeName('M', code);
  run.tell.spindle({
    turning: machine.turning,
    speed: machine.speed,
    code: name,
    place: machine.place({ letters: machine.turning === 'off' ? '' : 'S', code: name }),
  });
}

export function applyCoolant(run: Run): void {
  const { block, machine } = run;
  const { coolant } = machine;
  if (block.codes[GROUP.coolant] === 90) coolant.mist = coolant.flood = false;
  if (block.mist) coolant.mist = true;
  if (block.flood) coolant.flood = true;
  machine.noteSet(SETTING.coolant, block.codeWords[GROUP.coolant]!);
  const code = codeName('M', block.codes[GROUP.coolant]!);
  run.tell.coolant({ code, place: machine.place({ code }) });
}

export function applyPlane(run: Run): void {
  const { block, machine } = run;
  const index = block.codes[GROUP.plane]! / 10 - 17;
  if (index !== 0 && isRefused(run, codeName('G', block.codes[GROUP.plane]!))) return;
  const before = machine.plane;
  machine.planeIndex = index;
  setModal(run, 'plane', GROUP.plane, before, machine.plane);
}

/** A safety line cancels compensation in the block that sets the plane and the units (common practice, no source). */
function isRefused(run: Run, what: string): boolean {
  const { block, dialect } = run;
  const cancels = block.hasGroup(GROUP.compensation) && block.codes[GROUP.compensation] === 400;
  return !(cancels && !dialect.isStrict) && refuseWhileCompensating(run, what);
}

export const unitOf = (code: number): number => (code === 200 ? 25.4 : 1);

export function applyUnits(run: Run): void {
  const { block, machine } = run;
  const code = block.codes[GROUP.units]!;
  const before = machine.units;
  const isRestated = unitOf(code) === machine.unit && !run.dialect.isStrict;
  if (!isRestated && isRefused(run, codeName('G', code))) return;
  machine.unit = unitOf(code);
  setModal(run, 'units', GROUP.units, before, machine.units);
}

export function applyPath(run: Run): void {
  const { block, machine } = run;
  const code = codeName('G', block.codes[GROUP.path]!);
  setModal(run, 'path', GROUP.path, machine.path, code);
  machine.path = code;
}

export function applyDistance(run: Run): void {
  const { block, machine } = run;
  const before = machine.distance;
  machine.isAbsolute = block.codes[GROUP.distance] === 900;
  setModal(run, 'distance', GROUP.distance, before, machine.distance);
}

export function applyReturn(run: Run): void {
  const { block, machine } = run;
  const after = block.codes[GROUP.return] === 980 ? 'G98' : 'G99';
  setModal(run, 'return', GROUP.return, machine.returnTo, after);
  machine.returnTo = after;
}

/** Tells a mode word; its place is noted when it changes the mode or states it for the first time. */
export function setModal(
  run: Run,
  what: SettableState,
  group: number,
  from: string,
  to: string,
): void {
  const { block, machine } = run;
  const word = block.codeWords[group]!;
  if (from !== to || !machine.isSet(SETTING[what])) machine.noteSet(SETTING[what], word);
  if (run.tell.wantsModals)
    run.tell.modal({
      what,
      from,
      to,
      place: machine.place({ code: codeName('G', block.codes[group]!) }),
    });
}
