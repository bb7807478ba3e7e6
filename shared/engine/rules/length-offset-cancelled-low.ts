import type { Motion, MachineState } from '../interpreter/events';
import { LIMIT_SLACK } from '../geometry/tolerance';
import { figure, has, toolWords } from './finding-data';
import { defineRule } from './rule';
import { usesLengthTable, watchProgramZ, type LengthSinceChange } from './watch-length';

/** The length is taken away, and Z then moves down as if there were no tool. */
export const lengthOffsetCancelledLow = defineRule({
  id: 'length-offset-cancelled-low',
  group: 'length',
  title: 'Z moves down after the length offset was cancelled',
  severity: 'stop',
  protects:
    'The stock, the table and the tip from a move that comes down by the whole length of the tool.',
  explanation:
    'G49 and H0 move nothing by themselves; the next Z word in program coordinates is then read as a height of the spindle nose. A move up is ordinary, as are G53 and G28, which do not heed the length: only a move that takes the head down is reported.',
  examples: {
    bad: 'G21 G90 G54\nT1 M6\nG43 H1 G0 Z50\nG49\nG0 Z20\nM30',
    good: 'G21 G90 G54\nT1 M6\nG43 H1 G0 Z50\nG49\nG53 G0 Z0\nM30',
  },
  word: (data, lengths) => ({
    message: `The length offset of ${toolWords(data)} is cancelled${has(data, 'setAt') ? ` (line ${figure(data, 'setAt')})` : ''}, and Z then moves down by ${lengths.length(figure(data, 'down'))} in program coordinates.`,
    advice: 'Retract by G53 G0 Z0 first, and leave G49 out where no program move follows.',
  }),
  observe: (shop, report) => {
    if (!usesLengthTable(shop)) return {};
    const judge = (motion: Motion, state: MachineState, since: LengthSinceChange) => {
      const down = motion.fromZ - motion.minZ;
      if (!since.cancelled || down <= LIMIT_SLACK) return;
      const setAt = state.setAt('lengthOffset')?.line;
      const { number, tool } = state.held;
      const data = {
        tool: number,
        name: tool?.name ?? '',
        down,
        ...(setAt !== undefined && { setAt }),
      };
      report.found({ cause: '', by: down, at: state.place({ letters: 'Z' }), data }, state);
    };
    return watchProgramZ(shop, judge, (_state, since) => !since.cancelled);
  },
});
