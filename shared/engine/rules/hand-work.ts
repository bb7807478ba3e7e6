import { text } from './finding-data';
import { defineRule } from './rule';
import type { CommentEvent, Place } from '../interpreter/events';

/** A message beside a stop that asks a person to do something. Common practice, no source. */
export const handWork = defineRule({
  id: 'hand-work',
  group: 'unattended',
  title: 'The program asks a person to do something',
  severity: 'note',
  unattended: 'hold',
  hold: 'judge',
  protects: 'The work from going on without what the programmer counted on a person to do.',
  explanation:
    'A comment on the block of a stop (M0, M1, M60), or on one of the two lines before it, that asks for an action in words such as turn, move, clamp, change, check or clean; and any text there that the controller shows to the operator. The names of operations, which many posts print above their stops, ask for nothing and are silent. Words in other languages are not understood.',
  examples: {
    bad: 'G21 G90 G54\nM0 (TURN THE PART OVER)\nM30',
    good: 'G21 G90 G54\n(TURN THE PART OVER AFTER THIS RUN)\nG4 P1\nM30',
  },
  word: (data) => ({
    message: `At this stop the program says: “${text(data, 'says')}”.`,
    advice: 'Have a person there to do it, or split the program at this place.',
  }),
  observe: (_shop, report) => {
    let said = '';
    let saidAt: Place | undefined;
    return {
      saysNothing: (words) => !ACTION.test(words),
      comment({ text: words, message, place }: CommentEvent) {
        if (!(message ? /\p{L}{2}/u : ACTION).test(words)) return;
        said = words.trim();
        saidAt = place;
      },
      stop({ place }, state) {
        if (!saidAt || place.line - saidAt.line > LINES_BEFORE) return;
        report.found({ cause: said, at: saidAt, data: { says: said } }, state);
        saidAt = undefined;
      },
    };
  },
});

/** A post prints the message at most this many lines above its stop. */
const LINES_BEFORE = 2;

/** What a person is asked to do at a router; whole words, so that SETUP 2 is no setting. */
const ACTION =
  /\b(?:turn|flip|rotate|move|shift|remove|take|put|place|load|unload|clamp|unclamp|fit|insert|change|replace|swap|check|verify|inspect|measure|clean|brush|blow|vacuum|set|mount|install|attach|screw|bolt|tighten|loosen|open|close|wait|press|confirm|adjust|reposition|operator|manual|manually|by hand)\b/i;
