import type { Motion } from '../interpreter/events';
import { isProgramMotion } from './mode-not-stated';
import { text } from './finding-data';
import { defineRule } from './rule';

/** Cutting with whatever happens to be in the spindle. */
export const cutBeforeChange = defineRule({
  id: 'cut-before-change',
  group: 'tools',
  title: 'The program cuts before it has called a tool',
  severity: 'hold',
  hold: 'look',
  protects: 'The work from being cut with the tool that happens to be in the spindle.',
  explanation:
    'A feed move before the first change, while the loading does not say which tool the spindle holds. Where it does, the program may count on that tool and this is silent. A program that names a tool but never fetches it has another fault, which has its own rule.',
  examples: {
    setup: { loading: { inSpindle: 'unknown' } },
    bad: 'G21 G90 G54\nS18000 M3\nG1 X10 F1000\nM30',
    good: 'G21 G90 G54\nT1 M6\nS18000 M3\nG1 X10 F1000\nM30',
  },
  word: (data) => ({
    message:
      text(data, 'held') === 'nothing'
        ? 'The program cuts without having called a tool, and the loading says that the spindle is empty.'
        : 'The program cuts without having called a tool, and the loading does not say which one the spindle holds.',
    advice:
      'Call the tool at the head of the program, or look what is in the spindle and record it.',
  }),
  observe: (_shop, report) => {
    let isDone = false;
    return {
      quiet({ feed }) {
        if (!isDone) feed.close();
      },
      motion(motion, state) {
        if (isDone || !cuts(motion)) return;
        isDone = true;
        if (state.changed || state.selectedTool !== null) return;
        const { held } = state;
        if (held.known && held.number !== 0) return;
        const data = { held: held.known ? 'nothing' : 'unknown' };
        report.found({ cause: '', at: state.place({ letters: 'none' }), data }, state);
      },
    };
  },
});

function cuts(motion: Motion): boolean {
  return (
    (motion.kind === 'feed' || motion.kind === 'arc') && motion.moves && isProgramMotion(motion)
  );
}
