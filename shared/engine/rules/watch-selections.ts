import type { MachineState, Observer, Place } from '../interpreter/events';
import { isProgramMotion } from './mode-not-stated';

/** A T word whose tool no later change fetches. */
export interface LeftSelection {
  readonly number: number;
  readonly place: Place;
  /** What the spindle held when it was chosen; null where that is not known. */
  readonly held: number | null;
  /** Whether that tool had already cut since its change. */
  readonly cutBefore: boolean;
  /** Whether the cutting went on with it. */
  readonly cutAfter: boolean;
  /** Whether it is the choice in force as the program ends; otherwise another T took its place. */
  readonly atEnd: boolean;
  /** Whether any change came before it. */
  readonly changed: boolean;
  /** The first tool the program changes to; undefined when it changes to none. */
  readonly firstTool: number | undefined;
}

type Selection = Pick<LeftSelection, 'number' | 'place' | 'held' | 'cutBefore' | 'changed'> & {
  cutAfter: boolean;
};

/**
 * Watches every T word, and tells at the end of those whose tool no later change fetches. A choice
 * that another T replaces is kept until then, because a tool chosen ahead may be chosen again later.
 */
export function watchSelections(
  judge: (left: LeftSelection, state: MachineState) => void,
): Observer {
  let pending: Selection | undefined;
  const replaced = new Map<number, Selection>();
  let hasCut = false;
  let firstTool: number | undefined;
  return {
    toolSelected({ number, place }, state) {
      if (pending?.number === number) return;
      if (pending && !replaced.has(pending.number)) replaced.set(pending.number, pending);
      pending = undefined;
      const { held, changed } = state;
      if (held.number === number) return;
      pending = {
        number,
        place,
        held: held.number,
        cutBefore: hasCut,
        changed,
        cutAfter: false,
      };
    },
    toolChanging(event) {
      pending = undefined;
      replaced.delete(event.written);
      firstTool ??= event.written;
      hasCut = false;
    },
    quiet({ feed }) {
      if (!hasCut || (pending && !pending.cutAfter)) feed.close();
    },
    motion(motion) {
      if (hasCut && (!pending || pending.cutAfter)) return;
      if (motion.kind === 'rapid' || !motion.moves || !isProgramMotion(motion)) return;
      hasCut = true;
      if (pending) pending.cutAfter = true;
    },
    programEnd(_event, state) {
      for (const left of replaced.values()) judge({ ...left, atEnd: false, firstTool }, state);
      if (pending) judge({ ...pending, atEnd: true, firstTool }, state);
      replaced.clear();
      pending = undefined;
    },
  };
}
