import type { OtherCode } from '../blocks/block';
import { codeName, GROUP } from '../blocks/code-groups';
import { hasAxisWord, readTarget, standAt } from './motions';
import { tellProblem, type Run } from './run';
import { LETTER } from '../blocks/block';

/** Codes whose axis words are no end point: tables, scaling, rotation, calls. */
const SETS_ONLY: readonly number[] = [100, 160, 500, 510, 511, 650, 660, 661, 680];
/** Codes that call a subprogram or jump. */
const CALLS: readonly string[] = ['M97', 'M98', 'G65', 'G66', 'G66.1'];

/**
 * A code that this engine gives no meaning. Its axis words are its own unless a motion code stands beside
 * it; if they can be an end point, the walk goes on from there, and the finding says that it was not seen.
 */
export function carryOutUnknown(run: Run, { letter, tenths }: OtherCode): void {
  const { block } = run;
  const what = codeName(letter, tenths);
  const isCall = CALLS.includes(what);
  if (isCall) run.callsMade = true;
  tellProblem(run, 'not-modelled', { code: what }, isCall ? { what, reason: 'call' } : { what });
  if (letter !== 'G' || block.hasGroup(GROUP.motion) || !hasAxisWord(block.seen)) return;
  if (!SETS_ONLY.includes(tenths)) standAt(run, readTarget(run, run.target));
  for (const axis of [LETTER.X, LETTER.Y, LETTER.Z, LETTER.A]) block.seen &= ~(1 << axis);
}
