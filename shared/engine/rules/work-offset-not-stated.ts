import { text } from './finding-data';
import { startStateIsSure } from './end-code-resets';
import { isProgramMotion, reportUnstated } from './mode-not-stated';
import { defineRule } from './rule';

/** The program moves before it says from which work zero. */
export const workOffsetNotStated = defineRule({
  id: 'work-offset-not-stated',
  group: 'state',
  title: 'No work offset is stated before the first move',
  severity: 'hold',
  hold: 'judge',
  protects: 'The work from being cut from the zero of the job before.',
  explanation:
    'No G54 to G59.3 stands before the first move in program coordinates. Where the end code is known to select the first offset again (M2 and M30 in the published language, NISTIR 6556, 3.6.1) this is only a note; elsewhere whatever was selected last still holds.',
  examples: {
    setup: { controller: { language: 'custom-macro' } },
    bad: 'G21 G90\nG0 X10 Y10\nM30',
    good: 'G21 G90\nG53 G0 Z0\nG54\nG0 X10 Y10\nM30',
  },
  word: (data) => ({
    message: `The program moves without having stated a work offset; this controller would use ${text(data, 'offset')} if nothing changed it.`,
    advice: `Write the work offset, such as ${text(data, 'offset')}, at the head of the program.`,
  }),
  observe: (shop, report) =>
    reportUnstated(report, 'workOffset', isProgramMotion, (state) => ({
      data: { offset: state.workOffset },
      severity: startStateIsSure(shop.setup.controller) ? 'note' : 'hold',
    })),
});
