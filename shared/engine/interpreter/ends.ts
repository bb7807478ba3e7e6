import type { StopEvent } from './events';
import type { Run } from './run';

export function stopProgram(run: Run, code: StopEvent['code']): void {
  run.tell.stop({ code, place: run.machine.place({ code }) });
}

/** Tells the end before its resets. */
export function endProgram(run: Run, code: 'M2' | 'M30' | 'M99' | '%'): void {
  run.tell.programEnd({ code, place: run.machine.place({ code }) });
  run.endedBy = code;
}
