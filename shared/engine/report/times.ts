import type { MachineState, Motion, Observer } from '../interpreter/events';
import { Pace } from '../interpreter/quiet/pace';
import { turnSeconds } from '../shop/motion-seconds';
import type { Shop } from '../shop/shop';

export interface Times {
  readonly total: number;
  /** Feed motion with the spindle on. */
  readonly cutting: number;
  readonly rapid: number;
  readonly changes: number;
  /** Dwells, and waiting for the spindle where it holds the program. */
  readonly dwell: number;
  /** Of `cutting`, by tool number. */
  readonly cuttingByTool: ReadonlyMap<number, number>;
}

/** How long the program takes, and each tool in it; how fast the head goes is the business of its pace. */
export function watchTimes(shop: Shop): Observer & { result(): Times } {
  const { machine } = shop.setup;
  const sums = { cutting: 0, rapid: 0, changes: 0, dwell: 0, air: 0 };
  const cuttingByTool = new Map<number, number>();
  const pace = new Pace(shop.setup);
  let isCutting = false;
  let tool = -1;
  let speed = 0;
  const addFeed = (seconds: number) => {
    if (isCutting) {
      sums.cutting += seconds;
      cuttingByTool.set(tool, (cuttingByTool.get(tool) ?? 0) + seconds);
    } else sums.air += seconds;
  };
  /** Puts down what the pace has timed to the tool and the spindle it was timed under. */
  const book = () => {
    const seconds = pace.takeFeedSeconds();
    sums.rapid += pace.rapidSeconds;
    pace.rapidSeconds = 0;
    if (seconds !== 0) addFeed(seconds);
  };
  const rest = () => {
    pace.rest();
    book();
  };
  const noteState = (state: MachineState) => {
    const cuts = state.turning !== 'off';
    const number = state.held.number ?? -1;
    if (cuts !== isCutting || number !== tool) book();
    isCutting = cuts;
    tool = number;
  };
  const turn = (motion: Motion, state: MachineState) => {
    const seconds = turnSeconds(motion);
    if (seconds === 0) return;
    rest();
    noteState(state);
    addFeed(seconds);
  };
  const spinTo = (next: number) => {
    const needed = (machine.spindle.spinUp * (next - speed)) / machine.spindle.maxRpm;
    if (machine.spindle.waits && needed > 0) sums.dwell += needed;
    speed = next;
  };
  return {
    pace,
    // Quiet motion is timed where it is read, under the state in which it was asked for.
    quiet(_quiet, state) {
      noteState(state);
    },
    motion(motion, state) {
      if (motion.by === 'change' || motion.isAlternative) return;
      if (!motion.moves) return turn(motion, state);
      noteState(state);
      follow(pace, motion, state.path === 'G64');
    },
    dwell(event) {
      rest();
      sums.dwell += event.seconds;
    },
    spindle(event) {
      rest();
      spinTo(event.turning === 'off' ? 0 : event.speed);
    },
    toolChanged(event, state) {
      rest();
      if (event.from.known && event.from.number === event.to) return;
      sums.changes += machine.changeSeconds;
      if (state.turning === 'off') speed = 0;
    },
    stop: rest,
    programEnd: rest,
    result() {
      rest();
      const { cutting, rapid, changes, dwell, air } = sums;
      return {
        total: cutting + rapid + changes + dwell + air,
        cutting,
        rapid,
        changes,
        dwell,
        cuttingByTool,
      };
    },
  };
}

function follow(pace: Pace, motion: Motion, isBlended: boolean): void {
  if (motion.kind === 'rapid') return pace.rapid(motion);
  if (motion.kind === 'arc') return pace.followArc(motion, isBlended);
  const dx = motion.toX - motion.fromX;
  const dy = motion.toY - motion.fromY;
  const dz = motion.toZ - motion.fromZ;
  pace.followLine(dx, dy, dz, motion.length, motion.feed, isBlended);
}
