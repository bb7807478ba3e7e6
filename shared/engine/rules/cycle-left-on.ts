import type { MachineState, Place } from '../interpreter/events';
import { text } from './finding-data';
import { defineRule } from './rule';

/** A canned cycle still modal where no hole is meant (NISTIR 6556 section 3.5.16; common practice). */
export const cycleLeftOn = defineRule({
  id: 'cycle-left-on',
  group: 'arcs-and-cycles',
  title: 'A drill cycle is still on',
  severity: 'hold',
  hold: 'judge',
  protects: 'The work, the rack and the tool from a hole drilled where only a move was meant.',
  explanation:
    'A cycle stays in force until G80 or another motion code. Found where it is still on at a tool change, when the work offset changes, at a home move, and at the end where the end code does not cancel it (M2 and M30 do). Bare X and Y lines under a cycle are holes and are silent.',
  examples: {
    bad: 'G21 G90 G54\nG0 Z10\nG81 X10 Y10 Z-5 R2 F500\nT2 M6\nM30',
    good: 'G21 G90 G54\nG0 Z10\nG81 X10 Y10 Z-5 R2 F500\nX20\nG80\nT2 M6\nM30',
  },
  word: (data) => ({
    message: `${text(data, 'cycle')} is still in force ${WHEN[text(data, 'when')] ?? 'here'}, set at line ${String(data['setAt'])}.`,
    advice: 'Write G80 after the last hole.',
  }),
  observe: (_shop, report) => {
    const tell = (when: string, at: Place, state: MachineState) => {
      if (!isCycle(state.motionMode)) return;
      const setAt = state.setAt('motionMode')?.line ?? at.line;
      report.found({ cause: when, at, data: { cycle: state.motionMode, when, setAt } }, state);
    };
    return {
      toolChanging: ({ place }, state) => tell('change', place, state),
      offsetChanged: ({ place }, state) => tell('offset', place, state),
      quiet() {
        // Home moves are never quiet.
      },
      motion: (motion, state) => {
        if (motion.by === 'home') tell('home', state.place({ letters: 'G' }), state);
      },
      programEnd: ({ code, place }, state) => {
        if (code !== 'M2' && code !== 'M30') tell('end', place, state);
      },
    };
  },
});

const WHEN: Readonly<Record<string, string>> = {
  change: 'at the tool change',
  offset: 'as the work offset changes',
  home: 'at a home move',
  end: 'at the end of the program',
};

/** G73, G74, G76 and G81 to G89. */
function isCycle(motionMode: string): boolean {
  return /^G(7[346]|8[1-9])$/.test(motionMode);
}
