import type { ToolDrawing } from './draw-tool';

/** A word set at a pocket or a tool: what is missing or wrong there. */
export interface RackMark {
  /** The pocket meant; without it, every place of `tool`. */
  readonly pocket?: number;
  readonly tool?: number;
  readonly severity: 'stop' | 'hold';
  /** Two or three words, such as "not loaded". */
  readonly word: string;
}

/** Which way a fork's mouth points for the person looking at the strip. */
export type Mouth = 'toward' | 'away' | 'left' | 'right';
export type SlotState = 'loaded' | 'empty' | 'in-spindle' | 'not-in-rack' | 'by-hand';

export interface RackSlot {
  /** Stable while the rack stays: `P4` for pocket 4, `T7` for a called tool that has no pocket. */
  readonly key: string;
  readonly pocket: number | null;
  readonly tool: number | null;
  readonly state: SlotState;
  readonly mouth: Mouth;
  /** Centre, px from the left. */
  readonly x: number;
  /** Place in the order of call, counted from 1; null: not called. */
  readonly order: number | null;
  /** Whether the program leaves this one alone. */
  readonly dimmed: boolean;
  readonly marks: readonly RackMark[];
  readonly drawing: ToolDrawing | null;
  readonly label: string;
  readonly place: string;
  /** The slot in one sentence, for those who do not see the drawing. */
  readonly sentence: string;
  readonly toolName: string;
  readonly diameter: number | null;
  readonly gaugeLength: number | null;
}
