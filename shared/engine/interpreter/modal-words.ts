import { LETTER } from '../blocks/block';
import { GROUP, codeName } from '../blocks/code-groups';
import type { SettableState } from './events';
import { SETTING } from './machine';
import { tellProblem, type Run } from './run';

/** Steps of a block that only set a mode: no axis moves in any of them. */

export function applyFeedMode(run: Run): void {
  const { block, machine } = run;
  const code = block.codes[GROUP.feedMode]!;
  const mode = code === 930 ? 'inverse-time' : code === 950 ? 'per-revolution' : 'per-minute';
  setModal(run, 'feedMode', GROUP.feedMode, machine.feedMode, mode);
  machine.feedMode = mode;
}

/** F, in mm/min under G94; under G93 a rate, under G95 mm a turn: then it is kept as written in mm. */
export function applyFeed(run: Run): void {
  const { block, machine } = run;
  const written = block.value(LETTER.F);
  if (written < 0) return refuseNegative(run, 'F', written);
  const unit = block.hasGroup(GROUP.units) ? unitOf(block.codes[GROUP.units]!) : machine.unit;
  const feed = machine.feedMode === 'inverse-time' ? written : written * unit;
  if (feed !== machine.feed) {
    machine.feed = feed;
    machine.noteSet(SETTING.feed, block.wordOf[LETTER.F]!);
  }
}

export function applySpeed(run: Run): void {
  const { block, machine } = run;
  const speed = block.value(LETTER.S);
  if (speed < 0) return refuseNegative(run, 'S', speed);
  machine.speed = speed;
  machine.noteSet(SETTING.speed, block.wordOf[LETTER.S]!);
  if (machine.turning !== 'off' && !block.hasGroup(GROUP.spindle))
    run.tell.spindle({
      turning: machine.turning,
      speed,
      code: 'S',
      place: machine.place({ letters: 'S' }),
    });
}

function refuseNegative(run: Run, letter: string, value: number): void {
  tellProblem(
    run,
    'out-of-range-word',
    { letters: letter },
    {
      letter,
      what: letter,
      value,
      needs: 'not-negative',
    },
  );
}

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
    place: machine.place({ letters: code === 50 ? '' : 'S', code: name }),
  });
}

export function applyCoolant(run: Run): void {
  const { block, machine } = run;
  const { coolant } = machine;
  const isOff = block.codes[GROUP.coolant] === 90;
  if (isOff) coolant.mist = coolant.flood = false;
  if (block.mist) coolant.mist = true;
  if (block.flood) coolant.flood = true;
  machine.noteSet(SETTING.coolant, block.codeWords[GROUP.coolant]!);
  const code = codeName('M', block.codes[GROUP.coolant]!);
  run.tell.coolant({ code, place: machine.place({ code }) });
}

export function applyPlane(run: Run): void {
  const { block, machine } = run;
  const index = block.codes[GROUP.plane]! / 10 - 17;
  const before = machine.plane;
  machine.planeIndex = index;
  setModal(run, 'plane', GROUP.plane, before, machine.plane);
}

export const unitOf = (code: number): number => (code === 200 ? 25.4 : 1);

export function applyUnits(run: Run): void {
  const { block, machine } = run;
  const before = machine.units;
  machine.unit = unitOf(block.codes[GROUP.units]!);
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
  const code = codeName('G', block.codes[group]!);
  if (from !== to || machine.setAt(what) === undefined)
    machine.noteSet(SETTING[what], block.codeWords[group]!);
  run.tell.modal({ what, from, to, place: machine.place({ code }) });
}
