import { LETTER } from '../blocks/block';
import { GROUP } from '../blocks/code-groups';
import type { ToolChangedEvent } from './events';
import { SETTING } from './machine';
import { tellProblem, type Run } from './run';

/** A whole number within 0.0001 (NISTIR 6556 3.2.2.1), or NaN. */
export function wholeNumber(value: number): number {
  const whole = Math.round(value);
  return Math.abs(value - whole) <= 0.0001 ? whole : NaN;
}

/** T: chooses what the next change fetches; moves nothing. */
export function selectTool(run: Run): void {
  const { block, machine } = run;
  const written = block.value(LETTER.T);
  const number = wholeNumber(written);
  if (!(number >= 0)) {
    tellProblem(
      run,
      'out-of-range-word',
      { letters: 'T' },
      {
        letter: 'T',
        what: 'T',
        value: written,
        needs: written < 0 ? 'not-negative' : 'whole',
      },
    );
    run.refused = true;
    return;
  }
  machine.selectedTool = number;
  machine.noteSet(SETTING.selectedTool, block.wordOf[LETTER.T]!);
  run.tell.toolSelected({ number, place: machine.place({ letters: 'T' }) });
}

/** M6, or T where T itself changes. */
export function changeTool(run: Run): void {
  const { block, machine, controller } = run;
  const selectedHere = block.has(LETTER.T);
  if (machine.selectedTool === null) {
    tellProblem(run, 'change-without-tool', { code: 'M6' }, {});
    return;
  }
  if (controller.toolChange === 'ignored') return;
  const written = machine.selectedTool;
  if (written === 0 && controller.toolZero === 'ignored') return;
  const to = toolMeant(run, written);
  const event: ToolChangedEvent = {
    from: { known: machine.held.known, number: machine.held.number, tool: machine.held.tool },
    to,
    tool: to === null ? undefined : run.shop.toolByNumber.get(to),
    written,
    selectedHere,
    place: machine.place(
      block.hasGroup(GROUP.change)
        ? { letters: selectedHere ? 'T' : '', code: 'M6' }
        : { letters: 'T' },
    ),
    turningBefore: machine.turning,
  };
  run.tell.toolChanging(event);
  const { changePoint } = run.shop.setup.machine;
  if (changePoint) {
    machine.x = changePoint.x;
    machine.y = changePoint.y;
    machine.z = changePoint.z;
  }
  machine.changed = true;
  hold(run, to);
  if (controller.changeStopsSpindle || controller.switches.strict) machine.turning = 'off';
  run.tell.toolChanged(event);
}

/** The tool a T value means; a place where T names pockets. Null where the pocket's tool is not known. */
function toolMeant(run: Run, written: number): number | null {
  if (run.controller.toolWord === 'tool' || written === 0) return written;
  return run.shop.toolOfPocket.get(written) ?? 0;
}

export function hold(run: Run, number: number | null): void {
  const { held } = run.machine;
  held.known = number !== null;
  held.number = number;
  held.tool = number === null ? undefined : run.shop.toolByNumber.get(number);
}
