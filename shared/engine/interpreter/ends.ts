import type { ProgramEndEvent, StopEvent } from './events';
import type { Run } from './run';

export function stopProgram(run: Run, code: StopEvent['code']): void {
  run.tell.stop({ code, place: run.machine.place({ code }) });
}

/** Told before the end code resets anything; nothing after it is carried out, so nothing is reset. */
export function endProgram(run: Run, code: Exclude<ProgramEndEvent['code'], 'end-of-text'>): void {
  run.tell.programEnd({ code, place: run.machine.place({ code }) });
  run.endedBy = code;
}
