import { LETTER } from '../blocks/block';
import { tellProblem, type Run } from './run';

/** Feed in mm/min, or the F word itself under G93; tells it once a block when there is none. */
export function feedOf(run: Run): number {
  const { machine, block } = run;
  if (machine.feedMode === 'inverse-time') {
    if (block.has(LETTER.F) && machine.feed > 0) return machine.feed;
    tellProblem(run, 'cut-no-feed', undefined, {
      reason: 'inverse-time',
      code: machine.motionMode,
    });
    return NaN;
  }
  const feed = machine.feedMode === 'per-revolution' ? machine.feed * machine.speed : machine.feed;
  if (!(feed > 0)) tellProblem(run, 'cut-no-feed', undefined, { code: machine.motionMode });
  return feed;
}
