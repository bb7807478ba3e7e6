import { LIMIT_SLACK } from '../geometry/tolerance';
import { figure } from './finding-data';
import { defineRule } from './rule';

/** The rotary axis does not stand where it began. */
export const rotaryLeftTurned = defineRule({
  id: 'rotary-left-turned',
  group: 'state',
  title: 'The rotary axis is left turned',
  severity: 'hold',
  hold: 'judge',
  protects: 'The next part from being cut on the wrong side.',
  explanation:
    'A program that turns the fourth axis usually brings it back before it ends. Whole turns count as back. Where the axis is turned on purpose for the next program, a person says so.',
  examples: {
    setup: { machine: { travel: { a: [-3600, 3600] } }, offsets: { work: { G54: { a: 0 } } } },
    bad: 'G21 G90 G54\nG0 A90\nM30',
    good: 'G21 G90 G54\nG0 A90\nG0 A0\nM30',
  },
  word: (data) => ({
    message: `The rotary axis stands at ${figure(data, 'at')}° as the program ends, not at ${figure(data, 'from')}° where it began.`,
    advice: 'Turn it back before the end, or say that the next program expects it so.',
  }),
  observe: (_shop, report) => {
    let from: number | undefined;
    return {
      quiet(quiet) {
        if (from === undefined) quiet.close();
      },
      motion(motion) {
        from ??= motion.fromA;
      },
      programEnd(event, state) {
        if (from === undefined) return;
        const turned = Math.abs(state.a - from) % FULL_TURN;
        if (Math.min(turned, FULL_TURN - turned) <= LIMIT_SLACK) return;
        report.found({ cause: 'a', at: event.place, data: { at: state.a, from } }, state);
      },
    };
  },
});

const FULL_TURN = 360;
