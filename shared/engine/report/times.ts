import { travelSeconds } from '../geometry/kinematics';
import { arcTangent, type MutablePoint } from '../geometry/path';
import type { MachineState, Motion, Observer } from '../interpreter/events';
import { findPathLimits, independentSeconds, type PathLimits } from '../shop/motion-seconds';
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

/**
 * How long the program takes. Every motion speeds up, cruises and slows down as its axes allow. Under
 * exact stop (G61, G61.1), and for rapids, it begins and ends at rest. Blended (G64), a feed motion
 * hands over to the next at the part of the slower feed that points the new way: all of it straight on,
 * none at a right angle or sharper. What a controller looks ahead beyond one block is not modelled.
 */
export function watchTimes(shop: Shop): Observer & { result(): Times } {
  const { machine, controller } = shop.setup;
  const sums = { cutting: 0, rapid: 0, changes: 0, dwell: 0, air: 0 };
  const cuttingByTool = new Map<number, number>();
  const pending = new PendingFeed();
  const limits: PathLimits = { speed: 0, acceleration: 0 };
  const direction: MutablePoint = { x: 0, y: 0, z: 0 };
  let speed = 0;
  const settle = (leave: number) => {
    const seconds = pending.settle(leave);
    if (seconds === 0) return;
    if (!pending.isCutting) sums.air += seconds;
    else {
      sums.cutting += seconds;
      cuttingByTool.set(pending.tool, (cuttingByTool.get(pending.tool) ?? 0) + seconds);
    }
  };
  const rest = () => settle(0);
  const follow = (motion: Motion, state: MachineState) => {
    findPathLimits(motion, machine, limits);
    startDirection(motion, direction);
    const handed = state.path === 'G64' ? pending.handOver(direction, limits.speed) : 0;
    settle(handed);
    pending.begin(motion, limits, handed);
    pending.isCutting = state.turning !== 'off';
    pending.tool = state.held.number ?? -1;
  };
  const spinTo = (next: number) => {
    const needed = (machine.spindle.spinUp * (next - speed)) / machine.spindle.maxRpm;
    if (machine.spindle.waits && needed > 0) sums.dwell += needed;
    speed = next;
  };
  return {
    motion(motion, state) {
      if (!motion.moves || motion.by === 'change' || motion.isAlternative) return;
      if (motion.kind !== 'rapid') return follow(motion, state);
      rest();
      if (controller.rapids === 'independent') {
        sums.rapid += independentSeconds(motion, machine);
        return;
      }
      findPathLimits(motion, machine, limits);
      sums.rapid += travelSeconds(motion.length, limits.acceleration, limits.speed, 0, 0);
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

/** The feed motion whose end is not timed yet, because the next one decides how fast it is left. */
class PendingFeed {
  isCutting = false;
  tool = -1;
  private isOpen = false;
  private length = 0.5;
  private enter = 0.5;
  private speed = 0.5;
  private acceleration = 0.5;
  private readonly end: MutablePoint = { x: 0, y: 0, z: 0 };

  begin(motion: Motion, limits: PathLimits, enter: number): void {
    this.isOpen = true;
    this.length = motion.length;
    this.speed = limits.speed;
    this.acceleration = limits.acceleration;
    this.enter = Math.min(enter, limits.speed);
    endDirection(motion, this.end);
  }

  /** Speed at which the next motion is entered: what points its way, and can be reached on this one. */
  handOver(next: MutablePoint, nextSpeed: number): number {
    if (!this.isOpen) return 0;
    const { end } = this;
    const along = end.x * next.x + end.y * next.y + end.z * next.z;
    if (!(along > 0)) return 0;
    const handed = Math.min(this.speed, nextSpeed) * Math.min(1, along);
    const reached = this.enter * this.enter + 2 * this.acceleration * this.length;
    return handed * handed <= reached ? handed : Math.sqrt(reached);
  }

  /** Seconds of the open motion, left at this speed; 0 when none is open. */
  settle(leave: number): number {
    if (!this.isOpen) return 0;
    this.isOpen = false;
    return travelSeconds(this.length, this.acceleration, this.speed, this.enter, leave);
  }
}

function startDirection(motion: Motion, out: MutablePoint): void {
  if (motion.kind === 'arc') arcTangent(motion, 0, out);
  else straight(motion, out);
}
function endDirection(motion: Motion, out: MutablePoint): void {
  if (motion.kind === 'arc') arcTangent(motion, 1, out);
  else straight(motion, out);
}
function straight(motion: Motion, out: MutablePoint): void {
  out.x = (motion.toX - motion.fromX) / motion.length;
  out.y = (motion.toY - motion.fromY) / motion.length;
  out.z = (motion.toZ - motion.fromZ) / motion.length;
}
