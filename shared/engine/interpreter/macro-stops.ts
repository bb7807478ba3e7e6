import type { Value } from '../expressions/value';
import type { ParameterKey } from '../parameters/parameter-name';
import type { Run } from './run';

const ALARM = 3_000;
const PAUSE = 3_006;

/**
 * In a macro dialect `#3000=1 (TEXT)` raises an alarm, after which nothing more is carried out, and
 * `#3006=1 (TEXT)` stops with a message until someone presses cycle start (facts sheet 12.1.10). Gives whether
 * the parameter was one of them.
 */
export function raiseOrPause(
  run: Run,
  key: ParameterKey,
  value: Value,
  bytes: { readonly from: number; readonly to: number },
): boolean {
  if (!run.grammar.isMacro || (key !== ALARM && key !== PAUSE)) return false;
  const place = run.machine.place({ bytes: [bytes.from, bytes.to] });
  // Nought raises nothing; a figure that is not known may.
  if (value === 0 || value === null) return true;
  if (key === PAUSE) run.tell.stop({ code: '#3006', place });
  else {
    run.tell.deed({ code: '#3000', does: 'alarm', place });
    run.endedBy = 'alarm';
  }
  return true;
}
