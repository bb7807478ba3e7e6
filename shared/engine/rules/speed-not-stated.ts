import type { Place } from '../interpreter/events';
import { text } from './finding-data';
import { defineRule } from './rule';

/** The spindle is started and no S word ever says how fast. Common practice, no source. */
export const speedNotStated = defineRule({
  id: 'speed-not-stated',
  group: 'spindle-and-feed',
  title: 'The spindle is started and its speed is never stated',
  severity: 'stop',
  protects: 'The tool and whoever stands near from whatever speed the last program left behind.',
  explanation:
    'An S word before the start, on its block or after it and before the first feed move is enough; S keeps its value from tool to tool. A spindle with only one speed (least and greatest alike in the machine description) needs none.',
  examples: {
    bad: 'G21 G90 G54\nT1 M6\nM3\nG1 X10 F500\nM30',
    good: 'G21 G90 G54\nT1 M6\nM3\nS18000\nG1 X10 F500\nM30',
  },
  word: (data) => ({
    message: `${text(data, 'code')} starts the spindle, and the program has not said how fast.`,
    advice: 'Write the S word with the start.',
  }),
  observe: (shop, report) => {
    const { minRpm, maxRpm } = shop.setup.machine.spindle;
    if (minRpm === maxRpm) return {};
    let started: { at: Place; code: string } | undefined;
    return {
      spindle({ turning, code, place }, state) {
        started = undefined;
        if (turning !== 'off' && state.setAt('speed') === undefined) started = { at: place, code };
      },
      quiet({ feed }) {
        if (started) feed.close();
      },
      motion(motion, state) {
        if (!started || motion.kind === 'rapid') return;
        report.found({ cause: '', at: started.at, data: { code: started.code } }, state);
        started = undefined;
      },
      programEnd(_event, state) {
        if (!started) return;
        report.found({ cause: '', at: started.at, data: { code: started.code } }, state);
      },
    };
  },
});
