import type { MachineState, Place } from '../interpreter/events';
import { endCodeResets } from './end-code-resets';
import { figure, has, text } from './finding-data';
import { defineRule } from './rule';

/** A G92 or G52 shift still in force where nothing takes it away. */
export const localShiftLeft = defineRule({
  id: 'local-shift-left',
  group: 'state',
  title: 'A local shift is left on',
  severity: 'hold',
  hold: 'judge',
  protects: 'The next program from a work zero that is shifted and does not look it.',
  explanation:
    'A shift set by G92 or G52 adds to every work offset and shows nowhere. Where the end code does not clear it (in the published language M2 and M30 do, NISTIR 6556, 3.6.1), it stays for the next program; it is also reported at a change on a machine whose macro is not known to work in machine coordinates alone.',
  examples: {
    setup: { controller: { language: 'custom-macro' } },
    bad: 'G21 G90 G54\nG52 X100\nG0 X0\nM30',
    good: 'G21 G90 G54\nG52 X100\nG0 X0\nG52 X0 Y0 Z0\nM30',
  },
  word: (data, lengths) => ({
    message: `A shift of ${axesWords(data, lengths.position)} is still on ${text(data, 'where') === 'change' ? 'at the tool change' : 'as the program ends'}${has(data, 'setAt') ? ` (set in line ${figure(data, 'setAt')})` : ''}.`,
    advice: 'Cancel it before, by G52 X0 Y0 Z0 or G92.1 as it was set.',
  }),
  observe: (shop, report) => {
    const { controller } = shop.setup;
    const judge = (where: 'end' | 'change', at: Place, state: MachineState) => {
      const { shiftX: x, shiftY: y, shiftZ: z } = state;
      if (x === 0 && y === 0 && z === 0) return;
      const setAt = state.setAt('localShift')?.line;
      const data = { where, x, y, z, ...(setAt !== undefined && { setAt }) };
      report.found({ cause: where, at, data }, state);
    };
    return {
      toolChanging(event, state) {
        if (controller.toolChange === 'macro' && !endCodeResets(controller, 'M30'))
          judge('change', event.place, state);
      },
      programEnd(event, state) {
        if (!endCodeResets(controller, event.code)) judge('end', event.place, state);
      },
    };
  },
});

function axesWords(
  data: Parameters<typeof text>[0],
  position: (axis: string, mm: number) => string,
): string {
  return ['x', 'y', 'z']
    .filter((axis) => figure(data, axis) !== 0)
    .map((axis) => position(axis, figure(data, axis)))
    .join(', ');
}
