import type { MachineState, Motion, Observer } from '../interpreter/events';
import type { Shop } from '../shop/shop';
import { isProgramMotion } from './mode-not-stated';

/** What has happened to the length offset since the tool now held was fetched. */
export interface LengthSinceChange {
  /** Whether an offset was applied, by the program or by the change. */
  readonly applied: boolean;
  /** Whether one was applied and then taken away again, by G49 or H0. */
  readonly cancelled: boolean;
  /** The number by which the held tool was called: its own, or that of its pocket. */
  readonly called: number;
}

/** Whether lengths on this machine come from the offset table at all. */
export function usesLengthTable(shop: Shop): boolean {
  const { lengthScheme } = shop.setup.controller;
  return lengthScheme !== 'none' && lengthScheme !== 'measured-in-macro';
}

/**
 * For the rules that ask whether the length in force is the right one: calls for every Z move in
 * program coordinates after a change to a tool. Moves by G53, G28 and G30 are gauge-point moves and
 * do not count.
 */
export function watchProgramZ(
  shop: Shop,
  judge: (motion: Motion, state: MachineState, since: LengthSinceChange) => void,
  isRight: (state: MachineState, since: LengthSinceChange) => boolean,
): Observer {
  const isAppliedByChange = shop.setup.controller.lengthOffset !== 'program';
  const since = { applied: false, cancelled: false, called: 0 };
  return {
    toolChanged(event) {
      since.applied = isAppliedByChange;
      since.cancelled = false;
      since.called = event.written;
    },
    lengthOffset(event) {
      const isOff = event.code === 'G49' || event.number === 0;
      if (!isOff) since.applied = true;
      since.cancelled = isOff && since.applied;
    },
    quiet(quiet, state) {
      if (state.changed && state.held.number && !isRight(state, since)) quiet.close();
    },
    motion(motion, state) {
      if (!state.changed || !isProgramMotion(motion)) return;
      if ((motion.named & NAMES_Z) === 0 && motion.fromZ === motion.toZ) return;
      if (state.held.number) judge(motion, state, since);
    },
  };
}

const NAMES_Z = 4;

/** Whether any length offset is in force; G43.1 has a value but no number. */
export function hasLength(state: MachineState): boolean {
  return state.lengthFrom === null ? state.lengthOffset !== 0 : state.lengthFrom !== 0;
}
