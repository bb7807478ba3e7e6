import { text } from './finding-data';
import { defineRule } from './rule';

/** `#3000=1` in a macro dialect, or a code that the setup declares as an alarm. */
export const raisesAlarm = defineRule({
  id: 'raises-alarm',
  group: 'reading',
  title: 'The program raises an alarm',
  severity: 'stop',
  protects:
    'The run from standing still in the middle, with the spindle and the holding as they were.',
  explanation:
    'An alarm is how a program refuses to go on. Where the check comes to one, the machine will too, and nothing after it is carried out or judged. An alarm behind a condition that does not come true is never reached and never found.',
  examples: {
    setup: { controller: { language: 'custom-macro' } },
    bad: 'G21 G90 G54\n#3000=1 (CLAMP NOT CLOSED)\nM30',
    good: 'G21 G90 G54\n#100=1 (CLAMP CLOSED)\nM30',
  },
  word: (data) => ({
    message: `The program raises an alarm here (${text(data, 'code')}), and nothing after it is carried out.`,
    advice: 'Take away what leads here, or take the alarm out if it is not meant.',
  }),
  observe: (_shop, report) => ({
    deed({ code, does, place }, state) {
      if (does === 'alarm') report.found({ cause: code, at: place, data: { code } }, state);
    },
  }),
});
