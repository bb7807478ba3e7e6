import { text } from './finding-data';
import { reportProblem } from './report-problem';
import { defineRule } from './rule';

/** A work offset that nobody has set yet. */
export const workOffsetUnset = defineRule({
  id: 'work-offset-unset',
  group: 'state',
  title: 'The work offset has no value yet',
  severity: 'hold',
  hold: 'look',
  protects: 'The work from being cut wherever an old or empty offset happens to point.',
  explanation:
    'Ordinary until the sheet is on and zero is set. Everything that rests on machine position is then judged as if the offset were zero; the window in the report says which values travel allows. Reported once for each offset.',
  examples: {
    setup: { offsets: { work: { G54: undefined } } },
    bad: 'G21 G90 G54\nG0 X10 Y10\nM30',
    good: 'G21 G90 G54\nG53 G0 Z0\nM30',
  },
  word: (data) => ({
    message: `${text(data, 'offset')} has no value in the offset table; what depends on where the work lies is not judged.`,
    advice: `Set ${text(data, 'offset')} inside the window the report gives, enter it, and check again.`,
  }),
  observe: (_shop, report) =>
    reportProblem(report, 'work-offset-unset', (facts) => text(facts, 'offset')),
});
