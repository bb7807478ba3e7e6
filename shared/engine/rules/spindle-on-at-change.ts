import { text } from './finding-data';
import { defineRule } from './rule';

/** A tool change called while the spindle turns. Common practice, no source. */
export const spindleOnAtChange = defineRule({
  id: 'spindle-on-at-change',
  group: 'spindle-and-feed',
  title: 'The spindle turns as the tool change is called',
  severity: 'stop',
  protects: 'The rack, the holder and whoever stands near from a turning tool in the forks.',
  explanation:
    'Silent where the setup says that the controller stops the spindle and waits by itself for a change. Where a macro changes the tool and was not walked, it is a hold: the macro may stop the spindle, which this version cannot see. An M5 on the change block comes too late: the change is carried out before it (NISTIR 6556 Table 8).',
  examples: {
    setup: { controller: { changeStopsSpindle: false } },
    bad: 'G21 G90 G54\nT1 M6\nS18000 M3\nT2 M6\nM30',
    good: 'G21 G90 G54\nT1 M6\nS18000 M3\nM5\nT2 M6\nM30',
  },
  word: (data) => ({
    message: `The spindle still turns ${text(data, 'turning') === 'ccw' ? 'counterclockwise' : 'clockwise'} as the tool change is called, started at line ${String(data['setAt'])}.`,
    advice: 'Write M5 on a block before the change, and let the spindle come to rest.',
  }),
  observe: (shop, report) => {
    const { toolChange, changeStopsSpindle } = shop.setup.controller;
    if (toolChange === 'ignored' || changeStopsSpindle) return {};
    const severity = toolChange === 'macro' ? 'hold' : 'stop';
    return {
      toolChanging({ turningBefore, place }, state) {
        if (turningBefore === 'off') return;
        const setAt = state.setAt('spindle')?.line ?? place.line;
        report.found(
          {
            cause: '',
            at: place,
            severity,
            unattended: 'stop',
            data: { turning: turningBefore, setAt },
          },
          state,
        );
      },
    };
  },
});
