import { LETTER } from '../blocks/block';
import { GROUP } from '../blocks/code-groups';
import type { ToolChangedEvent } from './events';
import { hold } from './held-tool';
import { SETTING } from './machine';
import { refuseNegative } from './modal-words';
import { applyLengthOfHeld } from './offset-words';
import { refuse, tellProblem, type Run } from './run';
import { wholeNumber } from './whole-number';

/** T: chooses what the next change fetches; moves nothing. */
export function selectTool(run: Run): void {
  const { block, machine, controller, shop } = run;
  const number = wholeNumber(block.value(LETTER.T));
  if (!(number >= 0)) return refuseNegative(run, LETTER.T);
  const word = block.wordOf[LETTER.T]!;
  if (controller.toolWord === 'pocket' && number !== 0 && !shop.pocketByNumber.has(number))
    return refuse(
      run,
      'out-of-range-word',
      { letters: 'T' },
      {
        letter: 'T',
        what: block.written(word),
        value: number,
        needs: 'pocket',
      },
    );
  machine.selectedTool = number;
  machine.noteSet(SETTING.selectedTool, word);
  run.tell.toolSelected({ number, place: machine.place({ letters: 'T' }) });
}

/** M6, or T where T itself changes. */
export function changeTool(run: Run): void {
  const { machine, controller } = run;
  const written = machine.selectedTool;
  const code = controller.changeOn;
  if (written === null)
    return tellProblem(
      run,
      'change-without-tool',
      { code: 'M6' },
      { code, reason: 'never-selected' },
    );
  checkOrder(run);
  if (controller.toolChange === 'ignored') return;
  if (written === 0 && controller.toolZero === 'ignored') return;
  if (written === 0 && controller.toolZero === 'refused')
    return refuse(
      run,
      'out-of-range-word',
      { letters: 'T', code: 'M6' },
      {
        letter: 'T',
        what: 'T0',
        value: 0,
        needs: 'tool',
      },
    );
  carryOutChange(run, written);
}

/**
 * `M6 T2`: words of a block have no order in the published language, but a macro-dialect control acts on
 * M6 as it reads it and loads what was chosen before (common practice, no source).
 */
function checkOrder(run: Run): void {
  const { block, controller } = run;
  if (controller.language !== 'custom-macro' || !block.has(LETTER.T)) return;
  if (!block.hasGroup(GROUP.change)) return;
  if (block.codeWords[GROUP.change]! < block.wordOf[LETTER.T]!)
    tellProblem(run, 'number-order', { letters: 'T', code: 'M6' }, { tool: block.value(LETTER.T) });
}

function carryOutChange(run: Run, written: number): void {
  const { block, machine, controller } = run;
  const { known, number, tool } = machine.held;
  const to = toolMeant(run, written);
  const selectedHere = block.has(LETTER.T);
  const event: ToolChangedEvent = {
    from: { known, number, tool },
    to,
    tool: run.shop.toolByNumber.get(to),
    written,
    selectedHere,
    place: machine.place({ letters: selectedHere ? 'T' : '', code: 'M6' }),
    turningBefore: machine.turning,
  };
  run.tell.toolChanging(event);
  const { changePoint } = run.shop.setup.machine;
  if (changePoint) {
    machine.x = changePoint.x;
    machine.y = changePoint.y;
    machine.z = changePoint.z;
    run.unknown = undefined;
  }
  machine.changed = true;
  hold(run, to);
  if (controller.changeStopsSpindle) machine.turning = 'off';
  if (controller.lengthOffset !== 'program')
    applyLengthOfHeld(run, block.has(LETTER.T) ? block.wordOf[LETTER.T]! : -1);
  run.tell.toolChanged(event);
}

/** The tool a T value means: a place where T names pockets, and an empty pocket holds nothing. */
function toolMeant({ controller, shop }: Run, written: number): number {
  if (controller.toolWord === 'tool' || written === 0) return written;
  return shop.toolOfPocket.get(written) ?? 0;
}
