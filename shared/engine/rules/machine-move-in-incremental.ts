import { text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** G53 under G91 where the controller does not obey it. */
export const machineMoveInIncremental = defineRule({
  id: 'machine-move-in-incremental',
  group: 'state',
  title: 'A machine-coordinate move in incremental mode',
  severity: 'stop',
  protects: 'The retract that this controller refuses, or runs as a relative move.',
  explanation:
    'G53 names machine positions and belongs to G90 (NISTIR 6556, 3.5.12). Controllers differ under G91: obey, refuse or ignore; the description of this one says refuse or ignore.',
  examples: {
    setup: { controller: { switches: { incrementalMachineMove: 'refused' } } },
    bad: 'G21 G90 G54\nG91\nG53 G0 Z0\nM30',
    good: 'G21 G90 G54\nG53 G0 Z0\nM30',
  },
  word: (data) => ({
    message: `G53 stands under G91, which this controller ${text(data, 'does') === 'ignored' ? 'ignores, so the move is relative' : 'refuses'}.`,
    advice: 'Write G90 before the G53 move.',
  }),
  observe: (_shop, report) => reportProblem(report, 'machine-move-in-incremental', () => ''),
});
