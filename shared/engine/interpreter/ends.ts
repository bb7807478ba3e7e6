import { LETTER } from '../blocks/block';
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

/**
 * M99 in a main program ends one turn of it. Where something called it, or with a P word, the walk goes on
 * elsewhere, and the end is not told here.
 */
export function returnFromProgram(run: Run): void {
  if (run.isCalled || run.block.has(LETTER.P)) run.endedBy = 'M99';
  else endProgram(run, 'M99');
}
