import { startTrace } from '../index';
import type { MachineState, Motion, Observer } from '../interpreter/events';
import { testSetup } from './test-shop';

/**
 * What a program makes the interpreter tell, one short line an event, in the order told:
 * `2 rapid X30 Y40 Z0 → X40 Y40 Z0`. Points are the gauge point in machine millimetres. `kinds` says which
 * events are wanted; problems are always among them, so that none goes unseen.
 */
export function eventsOf(
  program: string,
  change: object = {},
  kinds: readonly EventKind[] = ['motion'],
): string[] {
  const told: string[] = [];
  const add = (text: string, { line }: MachineState) => void told.push(`${line} ${text}`);
  const trace = startTrace(testSetup(change), undefined, {
    observers: [only(['problem', ...kinds], observer(add, told))],
  });
  do trace.push(new TextEncoder().encode(program));
  while (trace.endOfText() === 'read-again');
  return told;
}

export type EventKind = Exclude<
  keyof Observer,
  'pace' | 'quiet' | 'quietMotion' | 'stretch' | 'saysNothing'
>;
type Add = (text: string, state: MachineState) => void;

function observer(add: Add, told: string[]): Required<Pick<Observer, EventKind>> {
  return {
    block: (state) => add('block', state),
    motion: (motion, state) => add(showMotion(motion), state),
    problem: ({ problem, place, facts }) => {
      const columns = place.columns ? ` ${place.columns.join('-')}` : '';
      const reason = facts['reason'] ?? facts['what'] ?? facts['needs'] ?? facts['letter'] ?? '';
      told.push(`${place.line}${columns} ${problem} ${String(reason)}`.trim());
    },
    comment: ({ text, message }, state) => add(`${message ? 'message' : 'comment'} ${text}`, state),
    toolSelected: ({ number }, state) => add(`select T${number}`, state),
    toolChanging: ({ from, to }, state) => add(`changing ${showHeld(from)} to ${to}`, state),
    toolChanged: ({ written }, state) => add(`changed T${written}: ${showHeld(state.held)}`, state),
    spindle: ({ turning, speed, code }, state) => add(`${code} ${turning} ${speed}`, state),
    dwell: ({ seconds, by }, state) => add(`dwell ${seconds} ${by}`, state),
    stop: ({ code }, state) => add(`stop ${code}`, state),
    offsetChanged: ({ from, to }, state) => add(`${from} to ${to}`, state),
    lengthOffset: ({ code, number, before, after }, state) =>
      add(`${code} H${number} ${before} to ${after}`, state),
    compensation: ({ side, number }, state) => add(`compensation ${side} D${number}`, state),
    localShift: ({ code }, state) => {
      add(`${code} X${short(state.shiftX)} Y${short(state.shiftY)} Z${short(state.shiftZ)}`, state);
    },
    modal: ({ what, from, to }, state) => add(`${what} ${from} to ${to}`, state),
    coolant: ({ code }, state) => {
      const { mist, flood } = state.coolant;
      add(`${code} mist ${mist} flood ${flood}`, state);
    },
    deed: ({ code, does }, state) => add(`${code} ${does}`, state),
    programEnd: ({ code }, state) => add(`end ${code}`, state),
  };
}

function only(kinds: readonly EventKind[], all: Required<Pick<Observer, EventKind>>): Observer {
  return Object.fromEntries(kinds.map((kind) => [kind, all[kind]])) as Observer;
}

export function showMotion(motion: Motion): string {
  const by = motion.by === 'program' ? '' : ` by ${motion.by}`;
  const a = motion.toA === motion.fromA ? '' : ` A${short(motion.toA)}`;
  const from = `X${short(motion.fromX)} Y${short(motion.fromY)} Z${short(motion.fromZ)}`;
  const to = `X${short(motion.toX)} Y${short(motion.toY)} Z${short(motion.toZ)}${a}`;
  const feed = Number.isNaN(motion.feed) ? '' : ` F${short(motion.feed)}`;
  const arc =
    motion.kind === 'arc'
      ? ` ${motion.plane} centre ${short(motion.centreU)},${short(motion.centreV)} turn ${short((motion.turn * 180) / Math.PI)}`
      : '';
  return `${motion.kind}${by} ${from} → ${to}${feed}${arc}`;
}

const showHeld = ({ known, number }: { known: boolean; number: number | null }) =>
  known ? (number === 0 ? 'nothing' : `T${number}`) : 'unknown';

const short = (value: number): string => String(Math.round(value * 1e4) / 1e4 + 0);
