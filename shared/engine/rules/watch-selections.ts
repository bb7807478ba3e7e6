import type { MachineState, Observer, Place } from '../interpreter/events';
import { isProgramMotion } from './mode-not-stated';

/** A T word that no change consumed. */
export interface LeftSelection {
  readonly number: number;
  readonly place: Place;
  /** Whether the tool in the spindle had already cut since its change when this was chosen. */
  readonly cutBefore: boolean;
  /** Whether it went on cutting after it. */
  readonly cutAfter: boolean;
  /** Whether the program ended with it; otherwise another T took its place. */
  readonly atEnd: boolean;
  readonly changed: boolean;
  /** The first tool the program changes to; undefined when it changes to none. */
  readonly firstTool: number | undefined;
}

/** Watches every T word, and tells of those that no later change consumes. */
export function watchSelections(
  judge: (left: LeftSelection, state: MachineState) => void,
): Observer {
  let pending: { number: number; place: Place; cutBefore: boolean } | undefined;
  let cutSinceChange = false;
  let cutAfter = false;
  let firstTool: number | undefined;
  const leave = (atEnd: boolean, state: MachineState) => {
    if (!pending) return;
    const left = { ...pending, cutAfter, atEnd, changed: state.changed, firstTool };
    pending = undefined;
    if (state.held.number !== left.number) judge(left, state);
  };
  return {
    toolSelected({ number, place }, state) {
      if (pending && pending.number !== number) leave(false, state);
      if (pending) return;
      pending = { number, place, cutBefore: cutSinceChange };
      cutAfter = false;
    },
    toolChanging(event) {
      pending = undefined;
      firstTool ??= event.written;
    },
    toolChanged() {
      cutSinceChange = false;
      cutAfter = false;
    },
    motion(motion) {
      if (cutAfter && cutSinceChange) return;
      if (motion.kind === 'rapid' || !motion.moves || !isProgramMotion(motion)) return;
      cutSinceChange = true;
      if (pending) cutAfter = true;
    },
    programEnd(_event, state) {
      leave(true, state);
    },
  };
}
