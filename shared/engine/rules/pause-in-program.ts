import { text } from './finding-data';
import { defineRule } from './rule';

/** M0, M1 or M60: the program waits for somebody (NISTIR 6556 section 3.6.1). */
export const pauseInProgram = defineRule({
  id: 'pause-in-program',
  group: 'unattended',
  title: 'The program waits for a person',
  severity: 'note',
  unattended: 'stop',
  hold: 'look',
  protects:
    'An unattended run from standing still all night with the spindle or the extraction as they were.',
  explanation:
    'M0 and M60 stop the program until someone presses cycle start, and so does #3006=1 in a macro dialect. M1 does so only while the optional stop switch is on, so for an unattended run it is a hold: someone must see that the switch is off. Whether a person will be there cannot be told from the program. Where the shop allows pauses in unattended runs by policy, all of them are notes.',
  examples: { bad: 'G21 G90 G54\nM0\nM30', good: 'G21 G90 G54\nG4 P1\nM30' },
  word: (data) =>
    text(data, 'code') === 'M1'
      ? {
          message: 'M1 stops here when the optional stop switch is on.',
          advice: 'Optional stop must be off for an unattended run; look at the switch before it.',
        }
      : {
          message: `${named(text(data, 'code'))} stops here until someone presses cycle start.`,
          advice: 'Run it with a person there, or take the stop out of the program.',
        },
  observe: (shop, report) => {
    const isAllowed = shop.setup.policy.unattended.allowPauses;
    return {
      stop({ code, place }, state) {
        const unattended = isAllowed ? 'note' : code === 'M1' ? 'hold' : 'stop';
        report.found({ cause: code, at: place, unattended, data: { code } }, state);
      },
    };
  },
});

/** A sentence does not begin with a number sign. */
const named = (code: string): string => (code.startsWith('#') ? `“${code}”` : code);
