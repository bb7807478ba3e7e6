import { text } from './finding-data';
import { defineRule } from './rule';

/** Zero is set where the head happens to stand. */
export const positionAssumed = defineRule({
  id: 'position-assumed',
  group: 'state',
  title: 'Zero is set where the head happens to stand',
  severity: 'hold',
  unattended: 'stop',
  hold: 'look',
  protects: 'The work, the clamps and the rack from a program that starts from the wrong place.',
  explanation:
    'G92 with axis words makes the present position the stated one. Everything after it is right only if a person put the head exactly there; nobody does at night. G92 with S alone is a speed limit and is not meant.',
  examples: { bad: 'G21 G90 G54\nG92 X0 Y0 Z0\nM30', good: 'G21 G90 G54\nG0 X0 Y0\nM30' },
  word: (data) => ({
    message: `${text(data, 'code')} takes the place where the head stands now as the one it states.`,
    advice:
      'Set a work offset (G54 to G59) instead, or look that the head stands where the program assumes before the start.',
  }),
  observe: (_shop, report) => ({
    localShift({ code, withAxes, place }, state) {
      if (code !== 'G92' || !withAxes) return;
      report.found({ cause: code, at: place, data: { code } }, state);
    },
  }),
});
