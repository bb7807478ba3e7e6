import { figure } from './finding-data';
import { defineRule } from './rule';

/** A speed past what the machine description says the spindle can turn. */
export const speedAboveSpindle = defineRule({
  id: 'speed-above-spindle',
  group: 'spindle-and-feed',
  title: 'Faster than the spindle can turn',
  severity: 'stop',
  protects: 'The spindle, and the cut from a speed other than the feed was chosen for.',
  explanation:
    'Most controllers cut the speed down to what the spindle can do, some raise an alarm; either way the program was written for another machine. Judged while the spindle turns, so a stray S word alone is silent. Speed overrides at the panel are not known here.',
  examples: {
    bad: 'G21 G90 G54\nT1 M6\nS30000 M3\nM30',
    good: 'G21 G90 G54\nT1 M6\nS24000 M3\nM30',
  },
  word: (data) => ({
    message: `Asks for ${figure(data, 'speed')} rev/min; this spindle turns at most ${figure(data, 'most')}.`,
    advice: 'Lower the speed, and the feed with it, to what this spindle can do.',
  }),
  observe: (shop, report) => {
    const most = shop.setup.machine.spindle.maxRpm;
    return {
      spindle({ turning, speed, place }, state) {
        if (turning === 'off' || speed <= most) return;
        report.found({ cause: '', by: speed - most, at: place, data: { speed, most } }, state);
      },
    };
  },
});
