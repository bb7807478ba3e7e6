import type { Pace } from './quiet/pace';
import type { Quiet } from './quiet/quiet';
import type { Stretch } from './quiet/stretch';
import type { Columns, Within } from '../report/report';
import type { Tool } from '../shop/setup';

/**
 * What the interpreter tells the rules. Rules never see program text: they see these events and the
 * machine's state, each tied to a place. Event objects are reused from one call to the next, so a rule
 * copies the figures it wants to keep and never keeps the object itself.
 */

/** Where something stands: a line of the program, and for macro text the line within it. */
export interface Place {
  readonly line: number;
  readonly columns?: Columns | undefined;
  readonly within?: Within | undefined;
}

/**
 * Which words to underline: letters of the block now read ('X', 'XY', 'G' for the G word that matters
 * as `code`), or 'block' for all of it, or 'none' where nothing written can be underlined.
 */
export interface Words {
  readonly letters?: string;
  /** One exact word, such as 'G43' or 'M6', when a letter alone would be ambiguous. */
  readonly code?: string;
  /** A byte range of the line, first and one past the last, when the lexer knows better. */
  readonly bytes?: readonly [number, number];
}

/** Machine millimetres of the gauge point throughout; `a` in degrees. One object, reused. */
export interface Motion {
  kind: 'rapid' | 'feed' | 'arc' | 'probe';
  /** What asked for it: a program coordinate, a machine coordinate (G53), G28/G30, or a canned cycle. */
  by: 'program' | 'machine' | 'home' | 'cycle' | 'change';
  fromX: number;
  fromY: number;
  fromZ: number;
  fromA: number;
  toX: number;
  toY: number;
  toZ: number;
  toA: number;
  /** The true extremes of the path, arcs by their quadrant points. */
  minX: number;
  minY: number;
  minZ: number;
  maxX: number;
  maxY: number;
  maxZ: number;
  /** Arcs only: plane, centre in machine mm (both coordinates of the plane, in plane order), radius, turn in radians (> 0 is G3 seen from the positive depth axis). */
  plane: Plane;
  centreU: number;
  centreV: number;
  radius: number;
  turn: number;
  /** mm/min along the path; NaN when no feed is known; rapids carry NaN. */
  feed: number;
  /** Path length in mm (rotary-only moves: degrees). */
  length: number;
  /** Whether X, Y or Z is moved by it at all. */
  moves: boolean;
  /** Whether this is a cycle's own rapid inside the hole it is drilling. */
  inHole: boolean;
  /** Which axes the block names: bit 1 X, 2 Y, 4 Z, 8 A. */
  named: number;
  /** Set where the end is only known within bounds (a probe that may stop early). */
  endUnknown: boolean;
  /**
   * Whether this is another reading of the motion told before it, at the other end of what is not known: it
   * may happen instead of that one, so it is judged, but neither timed nor counted.
   */
  isAlternative: boolean;
}

export type Plane = 'xy' | 'zx' | 'yz';
export type Turning = 'off' | 'cw' | 'ccw';

export interface HeldTool {
  /** Whether it is known what the spindle holds. */
  readonly known: boolean;
  /** Tool number held; 0 when it is known that nothing is; null when unknown. */
  readonly number: number | null;
  /** From the tool list; undefined when unknown, nothing, or not in the list. */
  readonly tool: Tool | undefined;
}

/** State that any rule may read at any event. The interpreter alone writes it. */
export interface MachineState {
  readonly line: number;
  readonly units: 'mm' | 'inch';
  readonly plane: Plane;
  readonly distance: 'absolute' | 'incremental';
  readonly feedMode: 'per-minute' | 'inverse-time' | 'per-revolution';
  readonly path: string;
  /** The modal motion word now in force: G0, G1, G2, G3, G38.2, G73, G81 …, or G80 for none. */
  readonly motionMode: string;
  readonly compensation: 'off' | 'left' | 'right';
  readonly workOffset: string;
  /** Origin of the active work offset in machine mm, without local shifts; undefined when it has no value yet. */
  readonly originX: number | undefined;
  readonly originY: number | undefined;
  readonly originZ: number | undefined;
  /** G52/G92 shift now in force, mm. */
  readonly shiftX: number;
  readonly shiftY: number;
  readonly shiftZ: number;
  readonly selectedTool: number | null;
  readonly held: HeldTool;
  /** Whether a tool change has been made in this program yet. */
  readonly changed: boolean;
  /** Length offset in force, mm, and how it came. */
  readonly lengthOffset: number;
  /** H number in force; 0 or null when none is. */
  readonly lengthFrom: number | null;
  /** Tool number for which the length offset was applied (what the spindle held then). */
  readonly lengthAppliedFor: number | null;
  readonly turning: Turning;
  readonly speed: number;
  readonly feed: number;
  readonly coolant: { readonly mist: boolean; readonly flood: boolean };
  readonly x: number;
  readonly y: number;
  readonly z: number;
  readonly a: number;
  /** The place that last set a modal state, or undefined when it stands as the controller starts. */
  setAt(what: SettableState): Place | undefined;
  /** The place now read, with the columns of the given words. */
  place(words?: Words): Place;
}
export type SettableState =
  | 'units'
  | 'plane'
  | 'distance'
  | 'feedMode'
  | 'path'
  | 'motionMode'
  | 'compensation'
  | 'workOffset'
  | 'localShift'
  | 'lengthOffset'
  | 'spindle'
  | 'speed'
  | 'feed'
  | 'selectedTool'
  | 'coolant'
  | 'return';

/** Ids of what the reading stages find; each is a rule of the same id. */
export type Problem =
  | 'unreadable-block'
  | 'not-modelled'
  | 'repeated-word'
  | 'missing-word'
  | 'out-of-range-word'
  | 'nested-comment'
  | 'modal-conflict'
  | 'long-block'
  | 'odd-characters'
  | 'no-decimal-point'
  | 'empty-program'
  | 'text-after-end'
  | 'missing-end'
  | 'cut-short'
  | 'letter-for-digit'
  | 'machine-move-in-incremental'
  | 'split-machine-move'
  | 'number-order'
  | 'change-without-tool'
  | 'arc-radius-mismatch'
  | 'arc-centre-missing'
  | 'arc-impossible'
  | 'cycle-words-missing'
  | 'cycle-plane'
  | 'cut-no-feed'
  | 'work-offset-unset'
  | 'length-offset-missing'
  | 'compensation-entry'
  | 'subprogram-missing'
  | 'subprogram-loop'
  | 'never-ends';

export interface ProblemEvent {
  readonly problem: Problem;
  readonly place: Place;
  /** Figures and texts for the rule's sentence; `what` is the code or word as written. */
  readonly facts: Readonly<Record<string, string | number | boolean | null>>;
}
export interface CommentEvent {
  readonly text: string;
  /** Whether the controller shows it to the operator (`MSG,`). */
  readonly message: boolean;
  readonly place: Place;
}
export interface ToolSelectedEvent {
  readonly number: number;
  readonly place: Place;
}
export interface ToolChangedEvent {
  /** What the spindle held before. */
  readonly from: HeldTool;
  /** Tool number asked for (0: put away), resolved from a pocket where T names pockets. */
  readonly to: number | null;
  readonly tool: Tool | undefined;
  /** The T value as written. */
  readonly written: number;
  /** Whether the T stood on the change block itself. */
  readonly selectedHere: boolean;
  readonly place: Place;
  /** Spindle state as the change block is read, before its own resets. */
  readonly turningBefore: Turning;
}
export interface SpindleEvent {
  readonly turning: Turning;
  readonly speed: number;
  readonly code: string;
  readonly place: Place;
}
export interface DwellEvent {
  readonly seconds: number;
  readonly by: 'program' | 'cycle';
}
export interface StopEvent {
  /** The code as written; #3006 is how a macro dialect stops with a message. */
  readonly code: 'M0' | 'M1' | 'M60' | '#3006';
  readonly place: Place;
}
export interface OffsetChangedEvent {
  readonly from: string;
  readonly to: string;
  readonly place: Place;
}
export interface LengthOffsetEvent {
  readonly code: 'G43' | 'G43.1' | 'G49';
  readonly number: number | null;
  readonly before: number;
  readonly after: number;
  readonly place: Place;
}
export interface CompensationEvent {
  readonly side: 'off' | 'left' | 'right';
  readonly number: number | null;
  readonly place: Place;
}
export interface LocalShiftEvent {
  readonly code: string;
  readonly withAxes: boolean;
  readonly place: Place;
}
export interface ModalEvent {
  readonly what: SettableState;
  readonly from: string;
  readonly to: string;
  readonly place: Place;
}
export interface CoolantEvent {
  readonly code: string;
  readonly place: Place;
}
/** A code the setup declares, and what it does. */
export interface DeedEvent {
  readonly code: string;
  readonly does: string;
  readonly place: Place;
}
export interface ProgramEndEvent {
  /** The end code as written, or how the text ended without one. */
  readonly code: 'M2' | 'M30' | 'M99' | '%' | 'end-of-text';
  readonly place: Place;
}

/** What a rule may listen to. A rule that names `motion` is called for every motion: keep it cheap. */
export interface Observer {
  /** Every block that held at least one word, after it was carried out. */
  block?(state: MachineState): void;
  motion?(motion: Motion, state: MachineState): void;
  /**
   * Narrows down the motion that `motion` need not be called for, for the state the machine is in now. An
   * observer of motions without it is called for every one, and then none is quiet for the others either.
   */
  quiet?(quiet: Quiet, state: MachineState): void;
  /** Every quiet motion all the same, for those who draw: it takes the place of `motion` there. */
  quietMotion?(motion: Motion, state: MachineState): void;
  /** Times feed motion and rapids; quiet ones it is told by the reader itself. */
  readonly pace?: Pace;
  /** Quiet motion that was not told one by one, for those who add up or gather where it goes. */
  stretch?(stretch: Stretch, state: MachineState): void;
  problem?(event: ProblemEvent, state: MachineState): void;
  comment?(event: CommentEvent, state: MachineState): void;
  /**
   * Whether `comment` takes nothing from a comment of this text that is no message, whatever the state; if
   * absent, it may from any.
   */
  saysNothing?(text: string): boolean;
  toolSelected?(event: ToolSelectedEvent, state: MachineState): void;
  /** Before the change is carried out: state is as the change block found it. */
  toolChanging?(event: ToolChangedEvent, state: MachineState): void;
  /** After it: the new tool is held. */
  toolChanged?(event: ToolChangedEvent, state: MachineState): void;
  spindle?(event: SpindleEvent, state: MachineState): void;
  dwell?(event: DwellEvent, state: MachineState): void;
  stop?(event: StopEvent, state: MachineState): void;
  offsetChanged?(event: OffsetChangedEvent, state: MachineState): void;
  lengthOffset?(event: LengthOffsetEvent, state: MachineState): void;
  compensation?(event: CompensationEvent, state: MachineState): void;
  localShift?(event: LocalShiftEvent, state: MachineState): void;
  modal?(event: ModalEvent, state: MachineState): void;
  coolant?(event: CoolantEvent, state: MachineState): void;
  deed?(event: DeedEvent, state: MachineState): void;
  /** Before the end code resets anything. */
  programEnd?(event: ProgramEndEvent, state: MachineState): void;
}
