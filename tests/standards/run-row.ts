import {
  startCheck,
  startTrace,
  type Finding,
  type MachineState,
  type Motion,
  type Observer,
  type Setup,
} from '#engine';
import type { Row } from './row';

export interface Ran {
  readonly motions: readonly (Motion & { readonly line: number })[];
  readonly events: readonly RanEvent[];
  readonly findings: readonly Finding[];
  readonly problems: readonly { readonly problem: string; readonly line: number }[];
  readonly end: { readonly x: number; readonly y: number; readonly z: number };
  readonly lengthOffset: number;
}
export interface RanEvent {
  readonly line: number;
  readonly ev: string;
  readonly value: string | number;
}

/** Runs a row's program and keeps every motion, the events the sheet tells, and the findings. */
export function runRow(row: Row, setup: Setup): Ran {
  const motions: (Motion & { line: number })[] = [];
  const events: RanEvent[] = [];
  const problems: { problem: string; line: number }[] = [];
  let state: MachineState | undefined;
  const add = (ev: string, value: string | number, { line }: MachineState) =>
    events.push({ line, ev, value });
  const observer: Observer = {
    block: (now) => (state = now),
    motion: (motion, { line }) => {
      if (!motion.isAlternative) motions.push({ ...motion, line });
    },
    problem: ({ problem, place }) => problems.push({ problem, line: place.line }),
    comment: ({ text, message }, now) => add(message ? 'message' : 'comment', text, now),
    toolSelected: ({ number }, now) => add('select_tool', number, now),
    toolChanged: ({ written }, now) => add('change_tool', written, now),
    spindle: ({ turning, code }, now) => {
      if (code !== 'S') add('spindle', turning === 'off' ? 'stop' : turning, now);
    },
    dwell: ({ seconds }, now) => add('dwell', seconds, now),
    stop: ({ code }, now) => add(code === 'M1' ? 'optional_stop' : 'stop', code, now),
    lengthOffset: ({ after }, now) => add('tlo', after, now),
  };
  const observe = () => {
    motions.length = events.length = problems.length = 0;
    return [observer];
  };
  const bytes = new TextEncoder().encode(row.program);
  if (row.setup.blockDelete) observeSkipping(bytes, setup, observer);
  const check = startCheck(setup, row.setup.blockDelete ? {} : { observe });
  do check.push(bytes);
  while (check.endOfText() === 'read-again');
  const { findings } = check.report({ name: row.id });
  return {
    motions,
    events,
    findings,
    problems,
    end: { x: state?.x ?? 0, y: state?.y ?? 0, z: state?.z ?? 0 },
    lengthOffset: state?.lengthOffset ?? 0,
  };
}

function observeSkipping(bytes: Uint8Array, setup: Setup, observer: Observer): void {
  const trace = startTrace(setup, () => undefined, { blockDelete: 'on', observers: [observer] });
  do trace.push(bytes);
  while (trace.endOfText() === 'read-again');
}
