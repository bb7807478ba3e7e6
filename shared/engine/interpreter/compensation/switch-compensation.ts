import { LETTER } from '../../blocks/block';
import { GROUP, codeName } from '../../blocks/code-groups';
import { ownDiameterNumber } from '../../shop/called-as';
import type { MachineState } from '../events';
import { refuseNegative, setModal } from '../modal-words';
import { refuseWhileCompensating } from '../one-block-codes';
import { refuse, tellProblem, type Run } from '../run';
import { wholeNumber } from '../whole-number';

const OFF = 400;
/** Less is no radius, mm: the side of the cutter would be lost in rounding. */
const NO_RADIUS = 1e-6;
/** G41.1 and G42.1: the D word is the diameter itself. */
const BY_DIAMETER: readonly number[] = [411, 421];

/** G40, G41, G42 and their .1 forms: no motion; the next XY move meets the offset. */
export function switchCompensation(run: Run): void {
  const code = run.block.codes[GROUP.compensation]!;
  if (code === OFF) switchOff(run);
  else switchOn(run, code);
}

function switchOff(run: Run): void {
  const { machine, offset } = run;
  if (machine.compensation !== 'off' && machine.isOffset) {
    if (offset.isEntering)
      tellProblem(run, 'compensation-entry', { code: 'G40' }, { reason: 'no-move' });
    offset.isLeaving = machine.isOffset = !offset.isEntering;
    offset.isLow = true;
    offset.side = 0;
  }
  tellSide(run, 'off', null);
}

function switchOn(run: Run, code: number): void {
  const { block, machine, offset, dialect } = run;
  const name = codeName('G', code);
  if (machine.planeIndex !== 0)
    return refuse(
      run,
      'compensation-entry',
      { code: name },
      { reason: 'plane', plane: machine.plane },
    );
  const side = code < 420 ? 'left' : 'right';
  const isDiameter = BY_DIAMETER.includes(code);
  if (isDiameter && !block.has(LETTER.D))
    return refuse(run, 'missing-word', { code: name }, { code: name, letter: 'D' });
  const number = isDiameter ? null : readNumber(run);
  if (run.refused) return;
  const diameter = isDiameter
    ? block.value(LETTER.D) * machine.unit
    : findDiameter(run, name, number);
  const isRestated = side === machine.compensation && offset.radius === Math.abs(diameter) / 2;
  if (dialect.isStrict || !isRestated) {
    // Macro-style controllers take a new side as a new entry; the published language refuses it.
    const isRefused = dialect.isStrict || run.controller.language === 'rs274ngc';
    if (isRefused && refuseWhileCompensating(run, name)) return;
    begin(run, side, diameter);
  }
  tellSide(run, side, number);
}

/** From now on the cutter is to run half the diameter to a side, and has yet to go there. */
function begin(run: Run, side: 'left' | 'right', diameter: number): void {
  const { machine, offset } = run;
  if (!machine.isOffset) {
    offset.x = machine.x;
    offset.y = machine.y;
  }
  offset.toolX = machine.x;
  offset.toolY = machine.y;
  offset.side = (side === 'left') === diameter >= 0 ? 1 : -1;
  offset.radius = Math.abs(diameter) / 2;
  offset.isEntering = true;
  offset.isLeaving = false;
  offset.room = NaN;
  machine.isOffset = offset.radius > NO_RADIUS;
}

/**
 * Whether a D word without G41 or G42 means anything: a macro-style controller keeps it for the next of them, and
 * with one of them on goes over to it (common practice, no source).
 */
export const keepsDiameterNumber = ({ controller, dialect }: Run): boolean =>
  controller.language === 'custom-macro' && !dialect.isStrict;

export function keepDiameterNumber(run: Run): void {
  const { machine } = run;
  const number = readNumber(run);
  const side = machine.compensation;
  if (side === 'off' || run.refused) return;
  begin(run, side, findDiameter(run, 'D', number));
  run.tell.compensation({ side, number, place: machine.place({ letters: 'D' }) });
}

function tellSide(run: Run, side: MachineState['compensation'], number: number | null): void {
  const { block, machine } = run;
  setModal(run, 'compensation', GROUP.compensation, machine.compensation, side);
  machine.compensation = side;
  const code = codeName('G', block.codes[GROUP.compensation]!);
  run.tell.compensation({ side, number, place: machine.place({ letters: 'D', code }) });
}

/** The number of the diameter offset, null where none is stated; refuses a D that is no number. */
function readNumber(run: Run): number | null {
  const { block, offset } = run;
  if (!block.has(LETTER.D)) return offset.number;
  const number = wholeNumber(block.value(LETTER.D));
  if (!(number >= 0)) refuseNegative(run, LETTER.D);
  else if (keepsDiameterNumber(run)) offset.number = number;
  return number;
}

/**
 * The diameter in the offset table, mm: of the D number, or of the held tool's own. Where the table does not hold it
 * that is told, and the path is followed at the radius of the held tool, or of the widest there is.
 */
function findDiameter(run: Run, name: string, number: number | null): number {
  const { block, machine, shop } = run;
  const { tools } = shop.setup;
  if (number === 0) return 0;
  const held = machine.held.number;
  // With nothing in the spindle there is no number of its own, as with a tool that is not known.
  const own = held ? ownDiameterNumber(shop, held) : undefined;
  const diameter = run.diameters.get(number ?? own ?? NaN);
  if (diameter !== undefined) return diameter;
  const facts = { letter: 'D', value: number ?? own ?? 0 };
  if (number !== null && block.has(LETTER.D)) {
    const what = block.written(block.wordOf[LETTER.D]!);
    const tell = run.dialect.isStrict ? refuse : tellProblem;
    tell(run, 'out-of-range-word', { letters: 'D' }, { ...facts, what, needs: 'in-table' });
  } else if (number !== null || own !== undefined)
    tellProblem(
      run,
      'out-of-range-word',
      { code: name },
      { ...facts, what: name, needs: 'own-diameter' },
    );
  else
    tellProblem(
      run,
      'not-modelled',
      { code: name },
      { what: name, reason: 'depends', of: 'which tool the spindle holds' },
    );
  return machine.held.tool?.diameter ?? Math.max(0, ...tools.map((tool) => tool.diameter));
}
