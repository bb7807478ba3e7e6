import { LETTER, type Block } from '../blocks/block';
import { refuse, type Run } from './run';
import { refuseNegative } from './modal-words';

/** G4: P in the controller's unit. Macro dialects also take X or U, in seconds, instead of P. */
export function dwell(run: Run): void {
  const { block, controller } = run;
  const letter = dwellLetter(block, controller.language === 'custom-macro');
  if (letter < 0) return refuse(run, 'missing-word', { code: 'G4' }, { code: 'G4', letter: 'P' });
  const written = block.value(letter);
  if (!(written >= 0)) return refuseNegative(run, letter);
  if (letter !== LETTER.P) block.seen &= ~(1 << letter);
  const isSeconds = letter !== LETTER.P || controller.dwell === 'seconds';
  run.tell.dwell({ seconds: isSeconds ? written : written / 1000, by: 'program' });
}

function dwellLetter(block: Block, isMacro: boolean): number {
  if (block.has(LETTER.P)) return LETTER.P;
  if (!isMacro) return -1;
  if (block.has(LETTER.X)) return LETTER.X;
  return block.has(LETTER.U) ? LETTER.U : -1;
}
