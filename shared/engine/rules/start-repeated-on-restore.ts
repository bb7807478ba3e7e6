import type { Turning } from '../interpreter/events';
import { text } from './finding-data';
import { defineRule } from './rule';

/** Saved states deeper than this are forgotten, oldest first, as in the walk itself. */
const MOST_SAVED = 32;

/** A restored state that starts the spindle again. */
export const startRepeatedOnRestore = defineRule({
  id: 'start-repeated-on-restore',
  group: 'spindle-and-feed',
  title: 'Restoring the state may start the spindle',
  severity: 'stop',
  protects: 'Whoever reaches in because the spindle was stopped.',
  explanation:
    'Where the setup declares codes that save and restore the state, some controllers bring back the spindle with it. A state saved while the spindle turned and restored after it was stopped may start it without an M3 in sight. Common practice, no source.',
  examples: {
    setup: {
      controller: {
        codes: [
          { code: 'M70', does: 'save-state' },
          { code: 'M72', does: 'restore-state' },
        ],
      },
    },
    bad: 'G21 G90 G54\nT1 M6\nS18000 M3\nM70\nM5\nM72\nM30',
    good: 'G21 G90 G54\nT1 M6\nS18000 M3\nM5\nM70\nM72\nM30',
  },
  word: (data) => ({
    message: `${text(data, 'code')} restores a state that was saved with the spindle turning, and the spindle has been stopped since.`,
    advice:
      'Stop the spindle before the state is saved, and start it again with M3 where it is wanted.',
  }),
  observe: (_shop, report) => {
    const saved: Turning[] = [];
    return {
      deed({ code, does, place }, state) {
        if (does === 'save-state') {
          if (saved.length >= MOST_SAVED) saved.shift();
          saved.push(state.turning);
        }
        if (does !== 'restore-state') return;
        const before = saved.pop();
        if (before === undefined || before === 'off' || state.turning !== 'off') return;
        report.found({ cause: code, at: place, data: { code } }, state);
      },
    };
  },
});
