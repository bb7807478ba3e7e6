import { LETTER } from '../blocks/block';
import { hasAxisWord, moveStraight, namedAxes, readTarget } from './motions';
import { tellProblem, type Run } from './run';

/** G28 and G30: by way of the stated point to the stored one, which is in machine coordinates. */
export function moveHome(run: Run, code: number): void {
  const { block, machine, controller } = run;
  const name = code === 280 ? 'G28' : 'G30';
  const { references } = run.shop.setup.machine;
  const home = code === 280 ? references.g28 : references.g30;
  const named = namedAxes(block.seen);
  if (hasAxisWord(block.seen)) {
    run.motion.named = named;
    moveStraight(run, 'rapid', 'home', readTarget(run, run.target), NaN);
  }
  if (!home) {
    tellProblem(run, 'not-modelled', { code: name }, { what: name, reason: 'no-reference' });
    return;
  }
  const all = controller.switches.homeAxes === 'all' || named === 0;
  const { target } = run;
  target.x = all || block.has(LETTER.X) ? home.x : machine.x;
  target.y = all || block.has(LETTER.Y) ? home.y : machine.y;
  target.z = all || block.has(LETTER.Z) ? home.z : machine.z;
  target.a = machine.a;
  run.motion.named = all ? 7 : named;
  moveStraight(run, 'rapid', 'home', target, NaN);
}
