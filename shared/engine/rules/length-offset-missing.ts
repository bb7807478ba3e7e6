import type { Observer, Motion, MachineState } from '../interpreter/events';
import type { Shop } from '../shop/shop';
import { figure, text, toolWords } from './finding-data';
import { isProgramMotion } from './mode-not-stated';
import { defineRule, type Reporter } from './rule';
import { hasLength, usesLengthTable, watchProgramZ, type LengthSinceChange } from './watch-length';

/** Z moves in program coordinates with no length applied for the new tool. */
export const lengthOffsetMissing = defineRule({
  id: 'length-offset-missing',
  group: 'length',
  title: 'Z moves with no length offset for the new tool',
  severity: 'stop',
  hold: 'look',
  protects:
    'The spindle, the stock and the table from a head that comes down by the whole length of the tool.',
  explanation:
    'A change does not apply a length (NISTIR 6556, 3.6.3); the program has to, by G43, before Z moves in program coordinates. X and Y moves, G53 and G28 before it are ordinary. An H that the table does not hold counts as no length. Where each zero is set with its tool in the spindle, a second tool without a new zero is meant instead; a stop in between, at which a person may set it, makes that a matter to look at. Where the controller or the macro applies the length, this is silent.',
  examples: {
    bad: 'G21 G90 G54\nT1 M6\nG0 X0 Y0\nG0 Z5\nM30',
    good: 'G21 G90 G54\nT1 M6\nG53 G0 Z0\nG0 X0 Y0\nG43 H1 Z5\nM30',
  },
  word: (data) => {
    const tool = figure(data, 'tool');
    switch (text(data, 'reason')) {
      case 'not-in-table':
        return {
          message: `H${figure(data, 'number')} has no length in the offset table, so nothing is applied.`,
          advice: `Measure the tool and enter its length as H${figure(data, 'number')}, or call the H that is meant.`,
        };
      case 'second-tool':
        return {
          message: `Z moves with ${toolWords(data)}, but zero was last set with T${figure(data, 'zeroTool')}, and here each tool needs its own.`,
          advice: `Set a new zero with T${tool} in the spindle before Z moves.`,
        };
      default:
        return {
          message: `Z moves in program coordinates with ${toolWords(data)}, but no length offset has been applied since the change.`,
          advice: `Write G43 H${tool} in or before the first block that moves Z.`,
        };
    }
  },
  observe: (shop, report) => {
    const { controller } = shop.setup;
    if (controller.lengthScheme === 'none') return watchZeroPerTool(shop, report);
    if (!usesLengthTable(shop)) return {};
    const missing =
      controller.lengthOffset === 'program' ? watchMissing(shop, report) : ({} satisfies Observer);
    return {
      ...missing,
      problem({ problem, place, facts }, state) {
        if (problem !== 'length-offset-missing') return;
        report.found({ cause: `H${facts['number']}`, at: place, data: { ...facts } }, state);
      },
    };
  },
});

function watchMissing(shop: Shop, report: Reporter): Observer {
  const isRight = (state: MachineState, since: LengthSinceChange) =>
    since.cancelled || hasLength(state) || isToldAsNotInTable(state.lengthFrom);
  const judge = (_motion: Motion, state: MachineState, since: LengthSinceChange) => {
    if (isRight(state, since)) return;
    const { number, tool } = state.held;
    const data = { tool: number, name: tool?.name ?? '' };
    report.found({ cause: 'none', at: state.place({ letters: 'Z' }), data }, state);
  };
  return watchProgramZ(shop, judge, isRight);
}

/** An H other than 0 was applied: if the table does not hold it, its own block has said so. */
function isToldAsNotInTable(number: number | null): boolean {
  return number !== null && number !== 0;
}

/** Scheme `none`: zero belongs to the tool it was set with. */
function watchZeroPerTool(_shop: Shop, report: Reporter): Observer {
  let zeroTool: number | undefined;
  let hasStopped = false;
  const setZero = (number: number | null) => {
    if (number !== null) zeroTool = number;
  };
  return {
    toolChanged() {
      hasStopped = false;
    },
    stop() {
      hasStopped = true;
    },
    localShift(event, state) {
      if (event.withAxes) setZero(state.held.number);
    },
    offsetChanged(_event, state) {
      setZero(state.held.number);
    },
    quiet(quiet, state) {
      const { number } = state.held;
      if (number && number !== zeroTool) quiet.close();
    },
    motion(motion, state) {
      if (!isProgramMotion(motion) || motion.fromZ === motion.toZ) return;
      const { number, tool } = state.held;
      if (!number) return;
      zeroTool ||= number;
      if (zeroTool === number) return;
      const data = { reason: 'second-tool', tool: number, name: tool?.name ?? '', zeroTool };
      const severity = hasStopped ? 'hold' : 'stop';
      const at = state.place({ letters: 'Z' });
      report.found({ cause: 'second-tool', at, severity, data }, state);
    },
  };
}
