import { LETTER } from '../blocks/block';
import { GROUP, codeName } from '../blocks/code-groups';
import { SETTING } from './machine';
import { setModal } from './modal-words';
import { tellProblem, type Run } from './run';
import { wholeNumber } from './tool-change';

/** Recomputes where program zero lies after any change of origin, shift or length. */
export function placeProgramZero(run: Run): void {
  const { machine, offsets } = run;
  const origin = offsets.origin(machine.workOffset);
  machine.originX = origin.x;
  machine.originY = origin.y;
  machine.originZ = origin.z;
  machine.originA = origin.a;
  machine.shiftX = offsets.preset.x + offsets.local.x;
  machine.shiftY = offsets.preset.y + offsets.local.y;
  machine.shiftZ = offsets.preset.z + offsets.local.z;
  machine.shiftA = offsets.preset.a + offsets.local.a;
  machine.baseX = (origin.x ?? 0) + machine.shiftX;
  machine.baseY = (origin.y ?? 0) + machine.shiftY;
  machine.baseZ = (origin.z ?? 0) + machine.shiftZ + machine.lengthOffset;
  machine.baseA = (origin.a ?? 0) + machine.shiftA;
}

export function applyWorkOffset(run: Run): void {
  const { block, machine } = run;
  const to = codeName('G', block.codes[GROUP.workOffset]!);
  const from = machine.workOffset;
  machine.workOffset = to;
  placeProgramZero(run);
  setModal(run, 'workOffset', GROUP.workOffset, from, to);
  run.tell.offsetChanged({ from, to, place: machine.place({ code: to }) });
}

/** G43, G43.1 and G49: no motion; the next Z word meets the new length. */
export function applyLength(run: Run): void {
  const { block, machine } = run;
  const code = block.codes[GROUP.length]!;
  if (code === 490) return setLength(run, 'G49', null, 0);
  if (code === 431) {
    if (!block.has(LETTER.Z)) return refuseLength(run, 'G43.1', 'Z');
    return setLength(run, 'G43.1', null, block.value(LETTER.Z) * machine.unit);
  }
  if (block.has(LETTER.H)) {
    const number = wholeNumber(block.value(LETTER.H));
    if (!(number >= 0)) {
      tellProblem(
        run,
        'out-of-range-word',
        { letters: 'H' },
        {
          letter: 'H',
          what: 'H',
          value: block.value(LETTER.H),
          needs: 'whole',
        },
      );
      run.refused = true;
      return;
    }
    return setLength(run, 'G43', number, lengthInTable(run, number));
  }
  const { number } = machine.held;
  if (run.controller.switches.lengthWithoutH === 'refused' || run.controller.switches.strict)
    return refuseLength(run, 'G43', 'H');
  setLength(run, 'G43', number, number === null ? 0 : lengthInTable(run, number));
}

function refuseLength(run: Run, code: string, letter: string): void {
  tellProblem(run, 'missing-word', { code }, { code, letter });
  run.refused = true;
}

/** H0 is no offset; an H that the table does not hold counts as zero and is told. */
function lengthInTable(run: Run, number: number): number {
  if (number === 0) return 0;
  const length = run.shop.setup.offsets.length[String(number)];
  if (length === undefined)
    tellProblem(run, 'length-offset-missing', { letters: 'H' }, { reason: 'not-in-table', number });
  return length ?? 0;
}

export function setLength(
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
  run.tell.lengthOffset({
    code,
    number,
    before,
    after,
    place: machine.place({ letters: code === 'G43' ? 'H' : '', code }),
  });
}
