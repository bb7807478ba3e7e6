import { defineRule } from './rule';

/** A probing move (G38.2 and its kin, NISTIR 6556 section 3.5.9). */
export const probeInProgram = defineRule({
  id: 'probe-in-program',
  group: 'unattended',
  title: 'The program probes',
  severity: 'note',
  unattended: 'hold',
  hold: 'judge',
  protects: 'The run from going on from a place that only the probe knows.',
  explanation:
    'Where a probing move ends depends on what it touches, so everything set from it is unknown before the run. Here the whole way to its target is judged. Whether the probe is fitted, plugged in and touches the right thing cannot be seen.',
  examples: {
    bad: 'G21 G90 G54\nG38.2 Z-5 F100\nM30',
    good: 'G21 G90 G54\nG1 Z-5 F100\nM30',
  },
  word: () => ({
    message: 'The head probes here, and where it ends depends on what it touches.',
    advice: 'Watch the probing, or measure beforehand and write the figure into the program.',
  }),
  observe: (_shop, report) => ({
    quiet() {
      // A probe is never quiet.
    },
    motion(motion, state) {
      if (motion.kind !== 'probe') return;
      report.found({ cause: '', at: state.place({ letters: 'G' }), data: {} }, state);
    },
  }),
});
