import { placeProgramZero } from './program-zero';
import type { Run } from './run';

const MOST_SAVED = 32;

export function saveState(run: Run): void {
  const { machine, saved } = run;
  if (saved.length >= MOST_SAVED) saved.shift();
  saved.push({
    unit: machine.unit,
    planeIndex: machine.planeIndex,
    isAbsolute: machine.isAbsolute,
    isArcCentreAbsolute: machine.isArcCentreAbsolute,
    feedMode: machine.feedMode,
    path: machine.path,
    returnTo: machine.returnTo,
    workOffset: machine.workOffset,
    speed: machine.speed,
    feed: machine.feed,
  });
}

export function restoreState(run: Run): void {
  const state = run.saved.pop();
  if (!state) return;
  Object.assign(run.machine, state);
  placeProgramZero(run);
}
