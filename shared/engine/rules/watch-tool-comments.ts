import type { MachineState, Observer, Place } from '../interpreter/events';
import { isProgramMotion } from './mode-not-stated';
import { readToolComment, type ToolComment } from './tool-comment';

/** A comment that says something of a tool, with what is needed to judge it. */
export interface PlacedToolComment extends ToolComment {
  readonly place: Place;
  /** The tool it is about: the one it names, or the one called in its block. */
  readonly about: number;
  /** The tool called in the same block, where there is one. */
  readonly called: number | undefined;
  /** The unit the program states; undefined where it states none before it moves. */
  readonly programUnit: 'mm' | 'inch' | undefined;
}

/** Comments kept until the unit is known; a head longer than this is no tool list. */
const MOST_WAITING = 1000;

interface Waiting {
  readonly read: ToolComment;
  readonly place: Place;
  called: number | undefined;
}

/**
 * Hands on each comment about a tool once it can be judged. The tool list in the head of a program
 * mostly stands above the unit word, so comments wait for the first move in program coordinates.
 */
export function watchToolComments(
  judge: (comment: PlacedToolComment, state: MachineState) => void,
): Observer {
  let waiting: Waiting[] = [];
  let isMoving = false;
  const settle = (state: MachineState) => {
    const programUnit = state.setAt('units') === undefined ? undefined : state.units;
    const settled = waiting;
    waiting = [];
    for (const { read, place, called } of settled) {
      const about = read.tool ?? called;
      if (about !== undefined) judge({ ...read, place, about, called, programUnit }, state);
    }
  };
  return {
    saysNothing: (text) => readToolComment(text) === undefined,
    comment({ text, place }) {
      if (waiting.length >= MOST_WAITING) return;
      const read = readToolComment(text);
      if (read) waiting.push({ read, place, called: undefined });
    },
    toolSelected({ number, place }) {
      for (const each of waiting) if (each.place.line === place.line) each.called = number;
    },
    block(state) {
      if (isMoving && waiting.length > 0) settle(state);
    },
    quiet(quiet) {
      if (!isMoving) quiet.close();
    },
    motion(motion) {
      if (!isMoving && isProgramMotion(motion)) isMoving = true;
    },
    programEnd(_event, state) {
      settle(state);
    },
  };
}

const MM_PER_INCH = 25.4;

/** What a written diameter may mean in millimetres: one value, or both where no unit is stated. */
export function meaningsInMm(comment: PlacedToolComment): readonly number[] {
  const { diameter, unit, programUnit } = comment;
  if (diameter === undefined) return [];
  const meant = unit ?? programUnit;
  if (meant === 'mm') return [diameter];
  return meant === 'inch' ? [diameter * MM_PER_INCH] : [diameter, diameter * MM_PER_INCH];
}
