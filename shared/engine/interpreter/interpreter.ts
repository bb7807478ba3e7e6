import { LETTER, letterBits } from '../blocks/block';
import { GROUP, codeName } from '../blocks/code-groups';
import { moveArc } from './arcs';
import { moveBesidePath } from './compensation/move-beside-path';
import { switchCompensation } from './compensation/switch-compensation';
import { NO_CYCLE } from './cycle-words';
import { drill, isCycle } from './cycles';
import { doDeeds } from './declared-codes';
import { dwell } from './dwell';
import { endProgram, returnFromProgram, stopProgram } from './ends';
import { feedOf } from './feed';
import { NO_MOTION, SETTING } from './machine';
import * as modal from './modal-words';
import {
  hasAxisWord,
  moveByWords,
  moveStraight,
  namedAxes,
  readMachineTarget,
  readTarget,
  standAt,
  tellIfUnset,
} from './motions';
import { carryOutOnce, refuseWhileCompensating } from './one-block-codes';
import { applyLength, applyWorkOffset } from './offset-words';
import { probe } from './probe';
import { refuse, tellProblem, type Run } from './run';
import { changeTool, selectTool } from './tool-change';
import { moveAtBounds } from './unknown-position';
import { checkUse, RARE_LETTERS } from './unused-words';

const { F, S, T } = LETTER;
const MOTION_BIT = 1 << GROUP.motion;
const STOP_BIT = 1 << GROUP.stop;
const CENTRE_BITS = letterBits('IJKR');
const FEED_OR_SPEED = letterBits('FS');
const MACHINE_MOVE = 530;
const DWELL = 40;
/** Codes of the once group after which the block goes on to its motion. */
const MOVES_ON: readonly number[] = [DWELL, 90, MACHINE_MOVE, 921, 922, 923];

/**
 * Carries out one block in the order of NISTIR 6556 table 8. A step that refuses leaves the rest undone:
 * what acted before it has acted, as on a machine.
 */
export function carryOut(run: Run): void {
  const { block } = run;
  const { groups, seen } = block;
  run.refused = false;
  if ((seen & RARE_LETTERS) !== 0) checkUse(run);
  if ((groups & (1 << GROUP.feedMode)) !== 0) modal.applyFeedMode(run);
  if ((seen & FEED_OR_SPEED) !== 0) {
    if ((seen & (1 << F)) !== 0) modal.applyFeed(run);
    if ((seen & (1 << S)) !== 0) modal.applySpeed(run);
  }
  if ((groups & ~MOTION_BIT) !== 0 || (seen & (1 << T)) !== 0 || block.others.length > 0)
    carryOutSettings(run);
  if (!run.refused) {
    const isPlain = (groups & ~MOTION_BIT) === 0 && run.loneMachineMove === undefined;
    const { unknown } = run;
    if (unknown !== undefined) moveAtBounds(run, unknown, isPlain ? carryOutPlain : carryOutMotion);
    else if (isPlain) carryOutPlain(run);
    else carryOutMotion(run);
  }
  if ((groups & STOP_BIT) !== 0 && !run.refused) carryOutStop(run);
}

/** A block with at most a motion code, and no code of its own block to mind. */
function carryOutPlain(run: Run): void {
  const { block, machine } = run;
  if (block.groups !== 0 && machine.motionCode !== block.codes[GROUP.motion])
    setMotionMode(run, block.codes[GROUP.motion]!, GROUP.motion);
  if (hasAxisWord(block.seen)) moveInProgram(run);
  else if (block.groups !== 0 || (block.seen & CENTRE_BITS) !== 0) moveWithoutAxes(run);
}

const SETTINGS: readonly (readonly [number, (run: Run) => void])[] = [
  [GROUP.plane, modal.applyPlane],
  [GROUP.units, modal.applyUnits],
  [GROUP.compensation, switchCompensation],
  [GROUP.length, applyLength],
  [GROUP.workOffset, applyWorkOffset],
  [GROUP.path, modal.applyPath],
  [GROUP.distance, modal.applyDistance],
  [GROUP.arcCentre, applyArcCentre],
  [GROUP.return, modal.applyReturn],
];

function carryOutSettings(run: Run): void {
  const { block, controller } = run;
  const changesOnT = controller.changeOn === 'T';
  if (block.has(T) && !run.refused) selectTool(run);
  if (run.refused) return;
  if (changesOnT ? block.has(T) : block.hasGroup(GROUP.change)) changeTool(run);
  if (run.refused) return;
  if (block.hasGroup(GROUP.spindle)) modal.applySpindle(run);
  if (block.hasGroup(GROUP.coolant)) modal.applyCoolant(run);
  if (block.others.length > 0) doDeeds(run);
  if (block.hasGroup(GROUP.once) && block.codes[GROUP.once] === DWELL) dwell(run);
  for (const [group, apply] of SETTINGS) {
    if (run.refused) return;
    if (block.hasGroup(group)) apply(run);
  }
}

function applyArcCentre(run: Run): void {
  run.machine.isArcCentreAbsolute = run.block.codes[GROUP.arcCentre] === 901;
}

function carryOutMotion(run: Run): void {
  const { block } = run;
  const { groups } = block;
  if (groups & MOTION_BIT) setMotionMode(run, block.codes[GROUP.motion]!, GROUP.motion);
  if (
    groups & (1 << GROUP.cycle) &&
    !(groups & MOTION_BIT && block.codes[GROUP.cycle] === NO_CYCLE)
  )
    setMotionMode(run, block.codes[GROUP.cycle]!, GROUP.cycle);
  if (run.loneMachineMove) closeLoneMove(run);
  const once = groups & 1 ? block.codes[GROUP.once]! : DWELL;
  if (!MOVES_ON.includes(once)) return carryOutOnce(run, once);
  if (once >= 921) carryOutOnce(run, once);
  if (run.refused) return;
  if (once === MACHINE_MOVE) moveInMachine(run);
  else if (hasAxisWord(block.seen)) moveInProgram(run);
  else if (groups & MOTION_BIT || (block.seen & CENTRE_BITS) !== 0) moveWithoutAxes(run);
}

function setMotionMode(run: Run, code: number, group: number): void {
  const { block, machine, cycle } = run;
  const wasCycle = isCycle(machine.motionCode);
  // A macro dialect keeps cycles in a group of their own: G80 gives back the motion code from before them
  // (common practice, no source). In the published language G80 leaves none in force.
  const isOwnGroup = run.controller.language === 'custom-macro' && !run.dialect.isStrict;
  if (code === NO_CYCLE && isOwnGroup) {
    if (!wasCycle) return;
    code = cycle.motionBefore;
  }
  if (machine.motionCode === code) return;
  if (isCycle(code)) {
    if (!wasCycle) cycle.motionBefore = machine.motionCode;
  } else cycle.code = NO_CYCLE;
  machine.motionCode = code;
  machine.noteSet(SETTING.motionMode, block.codeWords[group]!);
}

/** A block of axis words alone behind a lone G53 or G28: the move was meant in machine coordinates. */
function closeLoneMove(run: Run): void {
  const { block, loneMachineMove } = run;
  run.loneMachineMove = undefined;
  if (!loneMachineMove || !hasAxisWord(block.seen)) return;
  const { code, place } = loneMachineMove;
  const isBare = (block.groups & ~1) === 0 && block.others.length === 0;
  const isBehindMachineMove =
    code === 'G53' && (block.groups & ~(1 | MOTION_BIT)) === 0 && block.others.length === 0;
  if (block.hasGroup(GROUP.once) || !(isBare || isBehindMachineMove)) return;
  const { line } = run.machine;
  run.tell.problem({
    problem: 'split-machine-move',
    place,
    facts: { code, what: code, next: line },
  });
}

/** Axis words in program coordinates under the motion code in force. */
function moveInProgram(run: Run): void {
  const { block, machine } = run;
  const code = machine.motionCode;
  const named = namedAxes(block.seen);
  if ((machine.unsetAxes & named) !== 0 && machine.isAbsolute) tellIfUnset(run, named);
  run.motion.named = named;
  if (machine.isOffset && moveBesidePath(run, code)) return;
  if (code === 10) return moveByWords(run, false, feedOf(run));
  if (code === 0) return moveByWords(run, true, NaN);
  if (isCycle(code)) return drill(run, code, feedOf(run));
  const target = readTarget(run, run.target);
  switch (code) {
    case 20:
      return moveArc(run, -1, target, feedOf(run));
    case 30:
      return moveArc(run, 1, target, feedOf(run));
    case NO_MOTION:
      refuse(run, 'missing-word', { letters: 'XYZA' }, { reason: 'no-motion-code' });
      return standAt(run, target);
    case 382:
    case 383:
    case 384:
    case 385:
      return probe(run, code, target, feedOf(run));
    default:
      tellProblem(run, 'not-modelled', undefined, { what: codeName('G', code) });
      return standAt(run, target);
  }
}

/** A motion code, or centre words, with no axis word: a full circle, or nothing but a change of mode. */
function moveWithoutAxes(run: Run): void {
  const { block, machine } = run;
  const code = machine.motionCode;
  const isArc = code === 20 || code === 30;
  if (run.dialect.isStrict)
    return refuse(run, 'missing-word', undefined, {
      code: machine.motionMode,
      letter: 'X, Y or Z',
    });
  if (!isArc || (block.seen & CENTRE_BITS) === 0) return;
  run.motion.named = 0;
  if (machine.isOffset && moveBesidePath(run, code)) return;
  moveArc(run, code === 20 ? -1 : 1, readTarget(run, run.target), feedOf(run));
}

/** G53: machine coordinates for this block only, with G0 or G1 written or in force. */
function moveInMachine(run: Run): void {
  const { block, machine, controller } = run;
  const place = { code: 'G53' };
  if (!hasAxisWord(block.seen)) {
    run.loneMachineMove = { code: 'G53', place: machine.place(place) };
    return;
  }
  const code = machine.motionCode;
  if (code !== 0 && code !== 10)
    return refuse(run, 'modal-conflict', place, {
      reason: 'machine-move-motion',
      what: 'G53',
      other: machine.motionMode,
    });
  if (refuseWhileCompensating(run, 'G53')) return;
  run.motion.named = namedAxes(block.seen);
  const does = controller.switches.strict ? 'refused' : controller.switches.incrementalMachineMove;
  if (!machine.isAbsolute && does !== 'obeyed') {
    tellProblem(run, 'machine-move-in-incremental', place, { does });
    if (does === 'refused') return;
    const target = readTarget(run, run.target);
    return moveStraight(
      run,
      code === 0 ? 'rapid' : 'feed',
      'program',
      target,
      code === 0 ? NaN : feedOf(run),
    );
  }
  const target = readMachineTarget(run, run.target);
  if (code === 0) moveStraight(run, 'rapid', 'machine', target, NaN);
  else moveStraight(run, 'feed', 'machine', target, feedOf(run));
}

function carryOutStop(run: Run): void {
  const code = run.block.codes[GROUP.stop]!;
  if (code === 20) endProgram(run, 'M2');
  else if (code === 300) endProgram(run, 'M30');
  else if (code === 990) returnFromProgram(run);
  else stopProgram(run, code === 0 ? 'M0' : code === 10 ? 'M1' : 'M60');
}
