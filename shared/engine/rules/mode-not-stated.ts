import type { MachineState, Motion, Observer, SettableState } from '../interpreter/events';
import type { FindingData, Severity } from '../report/report';
import type { Reporter } from './rule';

/**
 * For the rules that ask whether a mode was stated before it was first relied on. Reports once, at the
 * first block that relies on it; nothing is written there that could be underlined.
 */
export function reportUnstated(
  report: Reporter,
  what: SettableState,
  relies: (motion: Motion) => boolean,
  judge: (state: MachineState) => { readonly severity?: Severity; readonly data: FindingData },
  kinds: 'all' | 'arcs' = 'all',
): Observer {
  let isDone = false;
  return {
    quiet(quiet) {
      if (isDone) return;
      if (kinds === 'arcs') quiet.hasArcs = false;
      else quiet.close();
    },
    motion(motion, state) {
      if (isDone || !relies(motion)) return;
      isDone = true;
      if (state.setAt(what) !== undefined) return;
      const at = state.place({ letters: 'none' });
      report.found({ cause: '', at, ...judge(state) }, state);
    },
  };
}

/** Motion in program coordinates: machine moves and home moves rely on no work offset and no G90. */
export function isProgramMotion(motion: Motion): boolean {
  return motion.by === 'program' || motion.by === 'cycle';
}
