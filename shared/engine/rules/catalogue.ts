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
import { changeWithoutTool } from './change-without-tool';
import { colletGrip } from './collet-grip';
import { cutBeforeChange } from './cut-before-change';
import { holderFamily } from './holder-family';
import { lifeShort } from './life-short';
import { mustNotTurn } from './must-not-turn';
import { notMeasured } from './not-measured';
import { numberOrder } from './number-order';
import { oneNumberTwoTools } from './one-number-two-tools';
import { preselectLeftOver } from './preselect-left-over';
import { selectedNotChanged } from './selected-not-changed';
import { tooHeavy } from './too-heavy';
import { tooLongForPocket } from './too-long-for-pocket';
import { tooLongToCross } from './too-long-to-cross';
import { tooWideForPocket } from './too-wide-for-pocket';
import { toolByHand } from './tool-by-hand';
import { toolCommentDisagrees } from './tool-comment-disagrees';
import { toolInTwoPockets } from './tool-in-two-pockets';
import { toolNotLoaded } from './tool-not-loaded';
import { toolUnknown } from './tool-unknown';
import { turnsWrongWay } from './turns-wrong-way';
import { flutesShort } from './flutes-short';
import { lengthOffsetCancelledLow } from './length-offset-cancelled-low';
import { lengthOffsetDisagrees } from './length-offset-disagrees';
import { lengthOffsetMissing } from './length-offset-missing';
import { lengthOffsetOtherTool } from './length-offset-other-tool';
import { lengthOffsetStale } from './length-offset-stale';
import { reachShort } from './reach-short';
import { beamMeetsRack } from './beam-meets-rack';
import { beyondTravel } from './beyond-travel';
import { bootBelowTip } from './boot-below-tip';
import { entersRack } from './enters-rack';
import { entersZone } from './enters-zone';
import { intoSpoilboard } from './into-spoilboard';
import { nearTravel } from './near-travel';
import { obstacle } from './obstacle';
import { outsideSpoilboard } from './outside-spoilboard';
import { plungeAtRapid } from './plunge-at-rapid';
import { rapidInStock } from './rapid-in-stock';
import { stockNotStated } from './stock-not-stated';
import { chipLoad } from './chip-load';
import { cutNoFeed } from './cut-no-feed';
import { cutSpindleOff } from './cut-spindle-off';
import { dustOrVacuumOff } from './dust-or-vacuum-off';
import { dwellInCut } from './dwell-in-cut';
import { feedAboveMachine } from './feed-above-machine';
import { noSpinUp } from './no-spin-up';
import { speedAboveSpindle } from './speed-above-spindle';
import { speedAboveTool } from './speed-above-tool';
import { speedBelowSpindle } from './speed-below-spindle';
import { speedNotStated } from './speed-not-stated';
import { spindleOnAtChange } from './spindle-on-at-change';
import { spindleOnAtProbe } from './spindle-on-at-probe';
import { startRepeatedOnRestore } from './start-repeated-on-restore';
import { arcCentreMissing } from './arc-centre-missing';
import { arcImpossible } from './arc-impossible';
import { arcRadiusMismatch } from './arc-radius-mismatch';
import { cycleLeftOn } from './cycle-left-on';
import { cyclePlane } from './cycle-plane';
import { cycleWordsMissing } from './cycle-words-missing';
import { changeNotProven } from './change-not-proven';
import { handWork } from './hand-work';
import { pauseInProgram } from './pause-in-program';
import { probeInProgram } from './probe-in-program';
import { raisesAlarm } from './raises-alarm';
import { neverEnds } from './never-ends';
import { subprogramLoop } from './subprogram-loop';
import { subprogramMissing } from './subprogram-missing';
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
  neverEnds,
  noDecimalPoint,
  notModelled,
  oddCharacters,
  outOfRangeWord,
  raisesAlarm,
  repeatedWord,
  subprogramLoop,
  subprogramMissing,
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
  // tools
  changeWithoutTool,
  colletGrip,
  cutBeforeChange,
  holderFamily,
  lifeShort,
  mustNotTurn,
  notMeasured,
  numberOrder,
  oneNumberTwoTools,
  preselectLeftOver,
  selectedNotChanged,
  tooHeavy,
  tooLongForPocket,
  tooLongToCross,
  tooWideForPocket,
  toolByHand,
  toolCommentDisagrees,
  toolInTwoPockets,
  toolNotLoaded,
  toolUnknown,
  turnsWrongWay,
  // length
  flutesShort,
  lengthOffsetCancelledLow,
  lengthOffsetDisagrees,
  lengthOffsetMissing,
  lengthOffsetOtherTool,
  lengthOffsetStale,
  reachShort,
  // travel-and-clearance
  beamMeetsRack,
  beyondTravel,
  bootBelowTip,
  entersRack,
  entersZone,
  intoSpoilboard,
  nearTravel,
  obstacle,
  outsideSpoilboard,
  plungeAtRapid,
  rapidInStock,
  stockNotStated,
  // spindle-and-feed
  chipLoad,
  cutNoFeed,
  cutSpindleOff,
  dustOrVacuumOff,
  dwellInCut,
  feedAboveMachine,
  noSpinUp,
  speedAboveSpindle,
  speedAboveTool,
  speedBelowSpindle,
  speedNotStated,
  spindleOnAtChange,
  spindleOnAtProbe,
  startRepeatedOnRestore,
  // arcs-and-cycles
  arcCentreMissing,
  arcImpossible,
  arcRadiusMismatch,
  cycleLeftOn,
  cyclePlane,
  cycleWordsMissing,
  // unattended
  changeNotProven,
  handWork,
  pauseInProgram,
  probeInProgram,
];
