import { figure } from './finding-data';
import { defineRule } from './rule';

/** A speed under what the machine description says the spindle can hold. */
export const speedBelowSpindle = defineRule({
  id: 'speed-below-spindle',
  group: 'spindle-and-feed',
  title: 'Slower than the spindle can turn',
  severity: 'hold',
  hold: 'judge',
  protects: 'The spindle, which has little torque and poor cooling under its least speed.',
  explanation:
    'Some controllers raise the speed to the least one without a word, some let the spindle stall. S0 is not judged here: with it the spindle does not turn at all.',
  examples: {
    bad: 'G21 G90 G54\nT1 M6\nS900 M3\nM30',
    good: 'G21 G90 G54\nT1 M6\nS6000 M3\nM30',
  },
  word: (data) => ({
    message: `Asks for ${figure(data, 'speed')} rev/min; this spindle turns at least ${figure(data, 'least')}.`,
    advice: 'Choose a speed this spindle can hold, and fit the feed to it.',
  }),
  observe: (shop, report) => {
    const least = shop.setup.machine.spindle.minRpm;
    return {
      spindle({ turning, speed, place }, state) {
        if (turning === 'off' || speed === 0 || least <= speed) return;
        // A start without any S word is a finding of its own.
        if (state.setAt('speed') === undefined) return;
        report.found({ cause: '', by: least - speed, at: place, data: { speed, least } }, state);
      },
    };
  },
});
