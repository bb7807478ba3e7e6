import type { MachineState } from '../interpreter/events';
import { Material } from '../shop/material';
import { figure } from './finding-data';
import { defineRule } from './rule';

/** Turning in one place in material for longer than this (s) rubs instead of cutting. Common practice, no source. */
const LONGEST_DWELL = 1;

export const dwellInCut = defineRule({
  id: 'dwell-in-cut',
  group: 'spindle-and-feed',
  title: 'Dwells in the cut',
  severity: 'hold',
  hold: 'judge',
  protects:
    'The work and the shop from a cutter that rubs in one place until it chars: a fire in the extraction begins so.',
  explanation:
    'A dwell of more than 1 s with the spindle turning and the tip in the stock. Drills, and the dwells of drilling cycles, are meant to clean the bottom of the hole and are left out. Without a job sheet everything under Z zero counts as stock.',
  examples: {
    bad: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5\nG1 Z-5 F1000\nG4 P3\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG4 P3\nG43 H1\nG0 X50 Y50 Z5\nG1 Z-5 F1000\nM30',
  },
  word: (data, lengths) => ({
    message: `Dwells ${figure(data, 'seconds')} s with the cutter turning ${lengths.length(figure(data, 'deep'))} deep in the stock.`,
    advice: 'Retract before the dwell, or shorten it to a second or less.',
  }),
  observe: (shop, report) => {
    const material = new Material(shop);
    return {
      dwell({ seconds, by }, state) {
        if (seconds <= LONGEST_DWELL || by === 'cycle' || !isInCut(state, material)) return;
        report.found(
          {
            cause: '',
            by: seconds,
            at: state.place({ code: 'G4', letters: 'P' }),
            data: { seconds, deep: material.depthAt(state.z, state) },
          },
          state,
        );
      },
    };
  },
});

function isInCut(state: MachineState, material: Material): boolean {
  if (state.turning === 'off' || /drill/i.test(state.held.tool?.kind ?? '')) return false;
  return material.isMetAt(state.x, state.y, state.z, state);
}
