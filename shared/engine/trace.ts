import type { Motion, MachineState, Observer, ToolChangedEvent } from './interpreter/events';
import { Reading } from './reading';
import type { Within } from './report/report';
import type { Setup } from './shop/setup';
import { openShop } from './shop/shop';

/** One motion as `trace` prints it: gauge point in machine mm to 1e-6, `a` in degrees when it moved. */
export interface TraceMotion {
  readonly line: number;
  readonly within?: Within | undefined;
  readonly kind: 'rapid' | 'feed' | 'arc' | 'probe' | 'dwell' | 'change';
  readonly to?: {
    readonly x: number;
    readonly y: number;
    readonly z: number;
    readonly a?: number | undefined;
  };
  /** mm/min; left out where none is known and on rapids. */
  readonly feed?: number | undefined;
  readonly plane?: 'xy' | 'zx' | 'yz' | undefined;
  /** Both coordinates of the plane, by their axis letters. */
  readonly centre?: Readonly<Partial<Record<'x' | 'y' | 'z', number>>> | undefined;
  /** Radians; > 0 is counterclockwise seen from the positive depth axis. */
  readonly turn?: number | undefined;
  readonly seconds?: number | undefined;
  readonly tool?: number | null | undefined;
}

export interface Trace {
  push(bytes: Uint8Array): void;
  /** 'read-again': the blocks are not run in the order of the text; push all bytes once more, then call again. */
  endOfText(): 'done' | 'read-again';
}

export interface TraceOptions {
  /** Skips blocks with a `/` in front. */
  readonly blockDelete?: 'on' | undefined;
  /** Called beside the trace, with the events themselves. */
  readonly observers?: readonly Observer[] | undefined;
}

/** Walks a program for its motions alone: no rule runs. */
export function startTrace(
  setup: Setup,
  emit: ((motion: TraceMotion) => void) | undefined,
  options: TraceOptions = {},
): Trace {
  const observers = [...(emit ? [traceObserver(emit)] : []), ...(options.observers ?? [])];
  const reading = new Reading(openShop(setup), observers, { skips: options.blockDelete === 'on' });
  return {
    push: (bytes) => reading.push(bytes),
    endOfText: () => (reading.end() === 'read-again' ? 'read-again' : 'done'),
  };
}

function traceObserver(emit: (motion: TraceMotion) => void): Observer {
  return {
    motion(motion, state) {
      const turnsA = motion.toA !== motion.fromA;
      if ((!motion.moves && !turnsA) || motion.isAlternative) return;
      const { x, y, z } = roundPoint(motion.toX, motion.toY, motion.toZ);
      emit({
        ...placeOf(state),
        kind: motion.kind,
        to: turnsA ? { x, y, z, a: round(motion.toA) } : { x, y, z },
        ...(Number.isNaN(motion.feed) ? {} : { feed: round(motion.feed) }),
        ...(motion.kind === 'arc' ? arcParts(motion) : {}),
      });
    },
    dwell({ seconds }, state) {
      emit({ ...placeOf(state), kind: 'dwell', seconds: round(seconds) });
    },
    toolChanged(event: ToolChangedEvent, state) {
      emit({
        ...placeOf(state),
        kind: 'change',
        to: roundPoint(state.x, state.y, state.z),
        tool: event.to,
      });
    },
  };
}

function placeOf(state: MachineState): { line: number; within?: Within } {
  const { line, within } = state.place({ letters: 'none' });
  return within ? { line, within } : { line };
}

function arcParts(motion: Motion) {
  const [u, v] = [motion.plane[0] as 'x' | 'y' | 'z', motion.plane[1] as 'x' | 'y' | 'z'];
  return {
    plane: motion.plane,
    centre: { [u]: round(motion.centreU), [v]: round(motion.centreV) },
    turn: motion.turn,
  };
}

const roundPoint = (x: number, y: number, z: number) => ({ x: round(x), y: round(y), z: round(z) });

/** To 1e-6, and never a minus zero. */
function round(value: number): number {
  return Math.round(value * 1e6) / 1e6 + 0;
}
