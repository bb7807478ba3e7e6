import { text } from './finding-data';
import { isProgramMotion, reportUnstated } from './mode-not-stated';
import { defineRule } from './rule';

/** The program moves before it says in which unit. */
export const unitsNotStated = defineRule({
  id: 'units-not-stated',
  group: 'state',
  title: 'Units are not stated before the first move',
  severity: 'hold',
  hold: 'judge',
  protects: 'The machine from moves 25.4 times too long or too short.',
  explanation:
    'Neither G20 nor G21 stands before the first move in program coordinates. The end code does not put units back (NISTIR 6556, 3.6.1), so what holds is what the last program, or a person at the panel, left. The check goes on with what the controller description names. Moves in machine coordinates and home moves before the unit word are not counted.',
  examples: { bad: 'G90 G54\nG0 X10 Y10\nM30', good: 'G90 G54\nG21\nG0 X10 Y10\nM30' },
  word: (data) => ({
    message: `The program moves without having stated its units; this controller would take ${text(data, 'units') === 'inch' ? 'inches' : 'millimetres'} if nothing changed it.`,
    advice: 'Write G21 (millimetres) or G20 (inches) at the head of the program.',
  }),
  observe: (_shop, report) =>
    reportUnstated(report, 'units', isProgramMotion, (state) => ({
      data: { units: state.units },
    })),
});
