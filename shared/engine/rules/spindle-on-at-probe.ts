import { defineRule } from './rule';

/** A probing move with the spindle turning. Common practice, no source. */
export const spindleOnAtProbe = defineRule({
  id: 'spindle-on-at-probe',
  group: 'spindle-and-feed',
  title: 'The spindle turns while probing',
  severity: 'stop',
  protects: 'The probe or the tool setter, and whoever stands near.',
  explanation:
    'A probe that turns tears its cable or its tip off, and a turning cutter ruins a setter. Whether the spindle has come to rest after M5 is not judged here.',
  examples: {
    bad: 'G21 G90 G54\nS9000 M3\nG38.2 Z-5 F100\nM30',
    good: 'G21 G90 G54\nM5\nG38.2 Z-5 F100\nM30',
  },
  word: () => ({
    message: 'The head probes here with the spindle turning.',
    advice: 'Write M5 and a dwell until the spindle is still before probing.',
  }),
  observe: (_shop, report) => ({
    quiet() {
      // A probe is never quiet.
    },
    motion(motion, state) {
      if (motion.kind !== 'probe' || state.turning === 'off') return;
      report.found({ cause: '', at: state.place({ letters: 'G' }), data: {} }, state);
    },
  }),
});
