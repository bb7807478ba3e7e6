import { LETTER, letterBits, letterName } from '../blocks/block';
import { GROUP } from '../blocks/code-groups';
import { takesTurns } from './arcs';
import { keepDiameterNumber, keepsDiameterNumber } from './compensation/switch-compensation';
import { tellProblem, type Run } from './run';
import { isCycle } from './cycles';

/** Letters that only some codes use. X, Y, Z, F, S and T always mean something. */
export const RARE_LETTERS = letterBits('ABCDEHIJKLPQRUVW');
const CENTRES = letterBits('IJKR');
const CYCLE_WORDS = letterBits('RPQL');
/** M99, whose P says where to return to. */
const RETURN = 990;
/** Letters of axes or devices this engine does not follow: of rotary axes it knows A alone. */
const FOREIGN = letterBits('BCEUVW');
/** With one of these beside them, an H or D of nought only says again that nothing is on. */
const CANCELS = (1 << GROUP.compensation) | (1 << GROUP.length) | (1 << GROUP.change);

/**
 * Words that no code of the block uses (NISTIR 6556 refuses them). They are told as not modelled,
 * because a controller that gives such a word a meaning would do something nobody checked.
 */
export function checkUse(run: Run): void {
  const { block, machine, shop } = run;
  let unused = block.seen & RARE_LETTERS;
  const code = motionInForce(run);
  if (code === 20 || code === 30) {
    unused &= ~CENTRES;
    if (unused === 0) return;
    if (takesTurns(run)) unused &= ~(1 << LETTER.P);
  }
  // An unknown or declared code takes its words with it; the code itself is told if it is unknown.
  if (block.others.length > 0) unused &= FOREIGN & ~letterBits('EUVW');
  unused &= ~usedBy(run, code);
  if ((unused & (1 << LETTER.D)) !== 0 && keepsDiameterNumber(run)) {
    unused &= ~(1 << LETTER.D);
    keepDiameterNumber(run);
  }
  if (shop.setup.machine.travel.a !== undefined) unused &= ~(1 << LETTER.A);
  if (unused === 0) return;
  for (let letter = 0; letter < 26; letter++) {
    if ((unused & (1 << letter)) === 0 || isIdle(run, letter)) continue;
    const word = block.wordOf[letter]!;
    const isForeign = (FOREIGN & (1 << letter)) !== 0;
    const reason = isForeign ? 'other-axis' : letter === LETTER.A ? 'no-axis' : 'no-use';
    tellProblem(
      run,
      'not-modelled',
      { letters: letterName(letter) },
      {
        what: block.written(word),
        letter: letterName(letter),
        reason,
        code: machine.motionMode,
      },
    );
  }
}

function motionInForce({ block, machine }: Run): number {
  if (block.hasGroup(GROUP.cycle) && block.codes[GROUP.cycle] !== 800)
    return block.codes[GROUP.cycle]!;
  return block.hasGroup(GROUP.motion) ? block.codes[GROUP.motion]! : machine.motionCode;
}

function usedBy({ block, controller }: Run, motion: number): number {
  let used = 0;
  const once = block.hasGroup(GROUP.once) ? block.codes[GROUP.once]! : -1;
  if (isCycle(motion)) used |= CYCLE_WORDS;
  if (motion === 870 || (isCycle(motion) && controller.language === 'custom-macro'))
    used |= letterBits('IJK');
  if (once === 40) used |= letterBits('PU');
  if (once === 100) used |= letterBits('PLRIJQ');
  if (block.hasGroup(GROUP.compensation)) used |= letterBits('D');
  if (block.hasGroup(GROUP.length)) used |= letterBits('H');
  if (block.hasGroup(GROUP.workOffset) && block.codes[GROUP.workOffset] === 541)
    used |= letterBits('P');
  if (block.hasGroup(GROUP.path)) used |= letterBits('PQ');
  if (block.hasGroup(GROUP.stop) && block.codes[GROUP.stop] === RETURN) used |= letterBits('P');
  return used;
}

/** A nought that says nothing, or a flat centre word that posts add to every arc of a helix. */
function isIdle({ block, dialect }: Run, letter: number): boolean {
  if (dialect.isStrict || block.value(letter) !== 0) return false;
  return (letter === LETTER.H || letter === LETTER.D) && (block.groups & CANCELS) !== 0;
}
