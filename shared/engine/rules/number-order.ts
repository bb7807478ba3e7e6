import { figure } from './finding-data';
import type { Place } from '../interpreter/events';
import { defineRule } from './rule';

/** M6 before its T: the tool chosen before is fetched. */
export const numberOrder = defineRule({
  id: 'number-order',
  group: 'tools',
  title: 'The tool number comes after its change',
  severity: 'stop',
  protects: 'The work from the tool chosen before the one that is meant.',
  explanation:
    'M6 with no new choice since the last change, and a T in the very next block: the change fetches the choice before. T and M6 in one block are ordinary in either order, because the words of a block have none (NISTIR 6556, 3.2.6); only for a macro-style controller, some of which act on M6 as they read it, is M6 in front noted, once. A T right behind an M6 that has fetched its own choice is made ahead for the next change and silent.',
  examples: {
    bad: 'G21 G90 G54\nT1 M6\nG0 X0\nM6\nT2\nM30',
    good: 'G21 G90 G54\nM6 T1\nT2\nG0 X0\nM6\nT3\nM30',
  },
  word: (data) => ({
    message:
      data['sameBlock'] === true
        ? `M6 stands in front of T${figure(data, 'tool')} in its block, and some macro-style controllers then change to the tool chosen before.`
        : `M6 stands before its tool number T${figure(data, 'tool')}, so it changes to the tool chosen before.`,
    advice: 'Write the T word before M6.',
  }),
  observe: (_shop, report) => {
    let isChosen = false;
    /** A change that fetched nothing new, and how many blocks ago. */
    let bareChange: Place | undefined;
    let blocksSince = 0;
    let isNoted = false;
    return {
      problem({ problem, place, facts }, state) {
        if (problem !== 'number-order' || isNoted) return;
        isNoted = true;
        const tool = typeof facts['tool'] === 'number' ? facts['tool'] : null;
        const data = { tool, sameBlock: true };
        report.found({ cause: 'same-block', at: place, severity: 'note', data }, state);
      },
      toolSelected({ number }, state) {
        isChosen = true;
        if (!bareChange || blocksSince !== 1 || number === state.held.number) return;
        report.found({ cause: '', at: bareChange, tool: number, data: { tool: number } }, state);
      },
      toolChanging({ place, selectedHere }) {
        bareChange = isChosen || selectedHere ? undefined : place;
        blocksSince = 0;
        isChosen = false;
      },
      quiet(quiet) {
        if (bareChange && blocksSince <= 1) quiet.close();
      },
      block() {
        blocksSince += 1;
      },
    };
  },
});
