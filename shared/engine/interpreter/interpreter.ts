import { LETTER } from '../blocks/block';
import { GROUP, codeName } from '../blocks/code-groups';
import { moveArc } from './arcs';
import { endProgram, stopProgram } from './ends';
import { NO_MOTION, SETTING } from './machine';
import * as modal from './modal-words';
import { hasAxisWord, moveStraight, namedAxes, readTarget, tellUnsetOffset } from './motions';
import { moveHome } from './one-block-codes';
import { applyLength, applyWorkOffset } from './offset-words';
import { tellProblem, type Run } from './run';
import { changeTool, selectTool } from './tool-change';

const { F, S, T, P } = LETTER;

/** Carries out one block in the order of NISTIR 6556 table 8. */
export function carryOut(run: Run): void {
  const { block } = run;
  const { groups } = block;
  run.refused = false;
  if (groups !== 0 || block.seen !== 0) {
    if (groups & (1 << GROUP.feedMode)) modal.applyFeedMode(run);
    if (block.has(F)) modal.applyFeed(run);
    if (block.has(S)) modal.applySpeed(run);
    if (groups & ~(1 << GROUP.motion) || block.has(T)) carryOutSettings(run);
    if (!run.refused) moveAxes(run);
  }
  if (groups & (1 << GROUP.stop) && !run.refused) {
    const code = block.codes[GROUP.stop]!;
    if (code === 20 || code === 300) endProgram(run, code === 20 ? 'M2' : 'M30');
    else stopProgram(run, code === 0 ? 'M0' : code === 10 ? 'M1' : 'M60');
  }
}

function carryOutSettings(run: Run): void {
  const { block, controller } = run;
  const { groups } = block;
  const changesOnT = controller.changeOn === 'T';
  if (block.has(T)) selectTool(run);
  if (run.refused) return;
  if (groups & (1 << GROUP.change) || (changesOnT && block.has(T))) changeTool(run);
  if (groups & (1 << GROUP.spindle)) modal.applySpindle(run);
  if (groups & (1 << GROUP.coolant)) modal.applyCoolant(run);
  if (groups & 1 && block.codes[GROUP.once] === 40) dwell(run);
  if (groups & (1 << GROUP.plane)) modal.applyPlane(run);
  if (groups & (1 << GROUP.units)) modal.applyUnits(run);
  if (groups & (1 << GROUP.length)) applyLength(run);
  if (run.refused) return;
  if (groups & (1 << GROUP.workOffset)) applyWorkOffset(run);
  if (groups & (1 << GROUP.path)) modal.applyPath(run);
  if (groups & (1 << GROUP.distance)) modal.applyDistance(run);
  if (groups & (1 << GROUP.return)) modal.applyReturn(run);
}

function dwell(run: Run): void {
  const { block, controller } = run;
  if (!block.has(P))
    return tellProblem(run, 'missing-word', { code: 'G4' }, { code: 'G4', letter: 'P' });
  const written = block.value(P);
  const seconds = controller.dwell === 'seconds' ? written : written / 1000;
  run.tell.dwell({ seconds, by: 'program' });
}

function moveAxes(run: Run): void {
  const { block, machine } = run;
  const { groups } = block;
  if (groups & (1 << GROUP.motion)) setMotionMode(run, block.codes[GROUP.motion]!, GROUP.motion);
  if (groups & (1 << GROUP.cycle)) setMotionMode(run, block.codes[GROUP.cycle]!, GROUP.cycle);
  const once = groups & 1 ? block.codes[GROUP.once]! : -1;
  if (once === 280 || once === 300) return moveHome(run, once);
  if (!hasAxisWord(block.seen)) return;
  if (machine.originX === undefined && once !== 530) tellUnsetOffset(run);
  run.motion.named = namedAxes(block.seen);
  const code = machine.motionCode;
  if (once === 530) {
    const { target } = run;
    const { unit } = machine;
    target.x = block.has(LETTER.X) ? block.value(LETTER.X) * unit : machine.x;
    target.y = block.has(LETTER.Y) ? block.value(LETTER.Y) * unit : machine.y;
    target.z = block.has(LETTER.Z) ? block.value(LETTER.Z) * unit : machine.z;
    target.a = block.has(LETTER.A) ? block.value(LETTER.A) : machine.a;
    return moveStraight(
      run,
      code === 10 ? 'feed' : 'rapid',
      'machine',
      target,
      code === 10 ? machine.feed : NaN,
    );
  }
  const target = readTarget(run, run.target);
  if (code === 0) moveStraight(run, 'rapid', 'program', target, NaN);
  else if (code === 10) moveStraight(run, 'feed', 'program', target, feedOf(run));
  else if (code === 20 || code === 30) moveArc(run, code === 20 ? -1 : 1, target, feedOf(run));
  else if (code === NO_MOTION)
    tellProblem(run, 'missing-word', { letters: 'XYZA' }, { reason: 'no-motion-code' });
  else tellProblem(run, 'not-modelled', undefined, { what: codeName('G', code) });
}

function feedOf(run: Run): number {
  const { machine } = run;
  if (!(machine.feed > 0)) tellProblem(run, 'cut-no-feed', undefined, { code: machine.motionMode });
  return machine.feed;
}

function setMotionMode(run: Run, code: number, group: number): void {
  const { block, machine } = run;
  if (machine.motionCode === code) return;
  machine.motionCode = code;
  machine.noteSet(SETTING.motionMode, block.codeWords[group]!);
}
