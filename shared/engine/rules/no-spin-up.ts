import { openSpan } from '../geometry/span';
import type { Motion, Place, SpindleEvent, Turning } from '../interpreter/events';
import { Material } from '../shop/material';
import { aloneSeconds, independentSeconds } from '../shop/motion-seconds';
import type { Setup } from '../shop/setup';
import { figure } from './finding-data';
import { movedWords } from './placing';
import { defineRule } from './rule';

/** The cutter meets the stock before the spindle can be at speed. */
export const noSpinUp = defineRule({
  id: 'no-spin-up',
  group: 'spindle-and-feed',
  title: 'Cuts before the spindle is at speed',
  severity: 'note',
  unattended: 'hold',
  hold: 'judge',
  protects: 'The cutter and the edge of the work from the first bite at too low a speed.',
  explanation:
    'The spindle needs its spin-up time for the whole of its greatest speed, and a share of it for a smaller change of speed (a straight ramp; common practice, no source). Dwells and the way to the stock since the start or the change of speed count towards it. It is said once a program, and not at all where the spindle holds the program until it is at speed.',
  examples: {
    setup: { machine: { spindle: { waits: false } } },
    bad: 'G21 G90 G17 G54\nT1 M6\nG43 H1\nG0 X50 Y50 Z5\nS18000 M3\nG1 Z-5 F1000\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nG43 H1\nG0 X50 Y50 Z5\nS18000 M3\nG4 P4\nG1 Z-5 F1000\nM30',
  },
  word: (data) => ({
    message: `The tip meets the stock ${seconds(figure(data, 'after'))} after the spindle was set to ${figure(data, 'speed')} rev/min in line ${figure(data, 'setAt')}; it needs ${seconds(figure(data, 'needed'))}.`,
    advice: `Wait with G4 for at least ${seconds(Math.ceil((figure(data, 'needed') - figure(data, 'after')) * 10) / 10)} more before the cut.`,
  }),
  observe: (shop, report) => {
    const { machine } = shop.setup;
    if (machine.spindle.waits) return {};
    const material = new Material(shop);
    const ramp = openRamp(shop.setup);
    const span = openSpan();
    let isSaid = false;
    return {
      spindle: (event) => ramp.set(event),
      dwell: (event) => ramp.pass(event.seconds),
      toolChanged: (_event, state) => {
        if (state.turning === 'off') ramp.stop();
      },
      quiet(quiet) {
        if (!isSaid && ramp.isWaiting()) quiet.close();
      },
      motion(motion, state) {
        if (isSaid || !ramp.isWaiting()) return;
        const lasts = secondsOf(motion, shop.setup);
        const isCut = (motion.kind === 'feed' || motion.kind === 'arc') && motion.by !== 'change';
        if (!isCut || !material.isMet(motion, state, span)) return ramp.pass(lasts);
        const late = ramp.missing(lasts * span.enter);
        ramp.pass(lasts);
        if (!late) return;
        isSaid = true;
        report.found({ cause: '', at: state.place(movedWords(motion)), data: late }, state);
      },
    };
  },
});

function secondsOf(motion: Motion, setup: Setup): number {
  return motion.kind === 'rapid' && setup.controller.rapids === 'independent'
    ? independentSeconds(motion, setup.machine)
    : aloneSeconds(motion, setup.machine);
}

function seconds(value: number): string {
  return `${Math.round(value * 10) / 10} s`;
}

/** The spindle's speed as it comes to what was asked for, in a straight ramp. */
function openRamp(setup: Setup) {
  const { spinUp, spinDown, maxRpm } = setup.machine.spindle;
  let from = 0;
  let to = 0;
  let turning: Turning = 'off';
  let needed = 0;
  let passed = 0;
  let setAt: Place = { line: 1 };
  const reached = () => (needed > passed ? from + ((to - from) * passed) / needed : to);
  return {
    set(event: SpindleEvent) {
      const isReversed = turning !== 'off' && event.turning !== 'off' && event.turning !== turning;
      from = isReversed ? -reached() : reached();
      to = event.turning === 'off' ? 0 : event.speed;
      const perTurn = Math.abs(to) >= Math.abs(from) ? spinUp : spinDown;
      needed = (perTurn * Math.abs(to - from)) / maxRpm;
      passed = 0;
      setAt = event.place;
      turning = event.turning;
    },
    stop() {
      from = to = needed = passed = 0;
      turning = 'off';
    },
    pass(by: number) {
      passed += by;
    },
    isWaiting: () => turning !== 'off' && passed < needed,
    /** What is missing if the cut begins so much later; undefined: nothing. */
    missing(later: number) {
      const after = passed + later;
      if (needed <= after) return undefined;
      return { after, needed, speed: to, setAt: setAt.line };
    },
  };
}
