import { LETTER } from '../blocks/block';
import { GROUP, codeName } from '../blocks/code-groups';
import { calledAs } from '../shop/called-as';
import { SETTING } from './machine';
import { setModal } from './modal-words';
import { placeProgramZero } from './program-zero';
import { refuse, tellProblem, type Run } from './run';
import { wholeNumber } from './whole-number';

/** G54 … G59.3 and G54.1 P: which origin program coordinates count from. */
export function applyWorkOffset(run: Run): void {
  const { block, machine } = run;
  const code = codeName('G', block.codes[GROUP.workOffset]!);
  let to = code;
  if (code === 'G54.1') {
    const number = block.has(LETTER.P) ? wholeNumber(block.value(LETTER.P)) : NaN;
    if (!(number >= 1))
      return refuse(run, 'missing-word', { letters: 'P', code }, { code, letter: 'P' });
    to = `G54.1P${number}`;
  }
  const from = machine.workOffset;
  machine.workOffset = to;
  if (from !== to) run.offsets.settle(to);
  placeProgramZero(run);
  setModal(run, 'workOffset', GROUP.workOffset, from, to);
  if (from !== to) run.tell.offsetChanged({ from, to, place: machine.place({ code }) });
}

/** G43, G43.1 and G49: no motion; the next Z word meets the new length. */
export function applyLength(run: Run): void {
  const { block, machine, controller } = run;
  const { switches } = controller;
  const code = block.codes[GROUP.length]!;
  if (code === 490) return setLength(run, 'G49', null, 0);
  if (code === 431) return setDynamicLength(run);
  if (block.has(LETTER.H)) {
    const number = wholeNumber(block.value(LETTER.H));
    if (!(number >= 0)) {
      const value = block.value(LETTER.H);
      const what = block.written(block.wordOf[LETTER.H]!);
      const needs = value < 0 ? 'not-negative' : 'whole';
      return refuse(
        run,
        'out-of-range-word',
        { letters: 'H' },
        { letter: 'H', what, value, needs },
      );
    }
    return setLength(run, 'G43', number, lengthInTable(run, number));
  }
  if (switches.lengthWithoutH === 'refused' || switches.strict)
    return refuse(run, 'missing-word', { code: 'G43' }, { code: 'G43', letter: 'H' });
  const held = machine.held.number;
  const number = held ? (calledAs(run.shop, held) ?? held) : held;
  setLength(run, 'G43', number, number === null ? 0 : lengthInTable(run, number));
}

/** G43.1 takes the length from its own axis word, so that word moves nothing. */
function setDynamicLength(run: Run): void {
  const { block, machine } = run;
  if (!block.has(LETTER.Z))
    return refuse(run, 'missing-word', { code: 'G43.1' }, { code: 'G43.1', letter: 'Z' });
  setLength(run, 'G43.1', null, block.value(LETTER.Z) * machine.unit);
  block.seen &= ~(1 << LETTER.Z);
}

/** H0 is no offset; an H that the table does not hold counts as zero and is told. */
function lengthInTable(run: Run, number: number): number {
  if (number === 0) return 0;
  const length = run.lengths.get(number);
  if (length === undefined)
    tellProblem(
      run,
      'length-offset-missing',
      { letters: 'H', code: 'G43' },
      { reason: 'not-in-table', number },
    );
  return length ?? 0;
}

function setLength(
  run: Run,
  code: 'G43' | 'G43.1' | 'G49',
  number: number | null,
  after: number,
): void {
  const { block, machine } = run;
  const before = machine.lengthOffset;
  machine.lengthOffset = after;
  machine.lengthFrom = number;
  machine.lengthAppliedFor = code === 'G49' ? null : machine.held.number;
  placeProgramZero(run);
  machine.noteSet(SETTING.lengthOffset, block.codeWords[GROUP.length]!);
  const place = machine.place({ letters: code === 'G43' ? 'H' : '', code });
  run.tell.lengthOffset({ code, number, before, after, place });
}

/** After a change the controller or the macro applies the length of what is now held. */
export function applyLengthOfHeld(run: Run, word: number): void {
  const { machine, shop } = run;
  const { number, tool } = machine.held;
  const before = machine.lengthOffset;
  const { lengthReference } = run.controller;
  const after =
    number === null || number === 0
      ? 0
      : (run.lengths.get(number) ?? (tool ? tool.gaugeLength - lengthReference : 0));
  machine.lengthOffset = after;
  machine.lengthFrom = number;
  machine.lengthAppliedFor = number;
  placeProgramZero(run);
  machine.noteSet(SETTING.lengthOffset, word);
  if (shop.setup.controller.lengthScheme === 'none') return;
  run.tell.lengthOffset({
    code: number === 0 ? 'G49' : 'G43',
    number,
    before,
    after,
    place: machine.place({ code: 'M6', letters: 'T' }),
  });
}
