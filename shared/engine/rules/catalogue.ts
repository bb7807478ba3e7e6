import { blockDeleteMatters } from './block-delete-matters';
import { cutShort } from './cut-short';
import { emptyProgram } from './empty-program';
import { letterForDigit } from './letter-for-digit';
import { longBlock } from './long-block';
import { missingEnd } from './missing-end';
import { missingWord } from './missing-word';
import { modalConflict } from './modal-conflict';
import { nestedComment } from './nested-comment';
import { noDecimalPoint } from './no-decimal-point';
import { notModelled } from './not-modelled';
import { oddCharacters } from './odd-characters';
import { outOfRangeWord } from './out-of-range-word';
import { repeatedWord } from './repeated-word';
import { textAfterEnd } from './text-after-end';
import { unreadableBlock } from './unreadable-block';
import { compensationEntry } from './compensation-entry';
import { diameterOffsetOtherTool } from './diameter-offset-other-tool';
import { distanceNotStated } from './distance-not-stated';
import { localShiftLeft } from './local-shift-left';
import { machineMoveInIncremental } from './machine-move-in-incremental';
import { planeNotStated } from './plane-not-stated';
import { positionAssumed } from './position-assumed';
import { rotaryLeftTurned } from './rotary-left-turned';
import { splitMachineMove } from './split-machine-move';
import { stateLeftOver } from './state-left-over';
import { unitsChange } from './units-change';
import { unitsMismatch } from './units-mismatch';
import { unitsNotStated } from './units-not-stated';
import { workOffsetNotStated } from './work-offset-not-stated';
import { workOffsetUnset } from './work-offset-unset';
import { cutNoFeed } from './cut-no-feed';
import { feedAboveMachine } from './feed-above-machine';
import { speedAboveSpindle } from './speed-above-spindle';
import { speedAboveTool } from './speed-above-tool';
import { speedBelowSpindle } from './speed-below-spindle';
import { speedNotStated } from './speed-not-stated';
import { spindleOnAtChange } from './spindle-on-at-change';
import { spindleOnAtProbe } from './spindle-on-at-probe';
import { arcCentreMissing } from './arc-centre-missing';
import { arcImpossible } from './arc-impossible';
import { arcRadiusMismatch } from './arc-radius-mismatch';
import { cycleLeftOn } from './cycle-left-on';
import { changeNotProven } from './change-not-proven';
import { handWork } from './hand-work';
import { pauseInProgram } from './pause-in-program';
import { probeInProgram } from './probe-in-program';
import type { Rule } from './rule';

/** Every rule, alphabetical within its group; one import line and one entry line a rule. */
export const RULES: readonly Rule[] = [
  // reading
  blockDeleteMatters,
  cutShort,
  emptyProgram,
  letterForDigit,
  longBlock,
  missingEnd,
  missingWord,
  modalConflict,
  nestedComment,
  noDecimalPoint,
  notModelled,
  oddCharacters,
  outOfRangeWord,
  repeatedWord,
  textAfterEnd,
  unreadableBlock,
  // state
  compensationEntry,
  diameterOffsetOtherTool,
  distanceNotStated,
  localShiftLeft,
  machineMoveInIncremental,
  planeNotStated,
  positionAssumed,
  rotaryLeftTurned,
  splitMachineMove,
  stateLeftOver,
  unitsChange,
  unitsMismatch,
  unitsNotStated,
  workOffsetNotStated,
  workOffsetUnset,
  // spindle-and-feed
  cutNoFeed,
  feedAboveMachine,
  speedAboveSpindle,
  speedAboveTool,
  speedBelowSpindle,
  speedNotStated,
  spindleOnAtChange,
  spindleOnAtProbe,
  // arcs-and-cycles
  arcCentreMissing,
  arcImpossible,
  arcRadiusMismatch,
  cycleLeftOn,
  // unattended
  changeNotProven,
  handWork,
  pauseInProgram,
  probeInProgram,
];
