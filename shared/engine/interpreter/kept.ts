import type { Value } from '../expressions/value';
import type { Machine } from './machine';

/** What the interpreter keeps beside the machine's state: scratch, and what lasts from block to block. */

/** A point of the gauge point in machine mm, A in degrees. */
export interface Target {
  x: number;
  y: number;
  z: number;
  a: number;
}

/** Centre in plane order and radius, machine mm. */
export interface Circle {
  u: number;
  v: number;
  radius: number;
}

/** Where probing ended, in program coordinates and the units then in force; A in degrees. */
export interface ProbeResult {
  x: Value;
  y: Value;
  z: Value;
  a: Value;
  /** 1 if something was touched. */
  touched: Value;
}

/** What a canned cycle keeps from one block to the next: words in program units, levels in machine mm. */
export interface CycleMemory {
  /** The cycle the kept words belong to, in tenths; NO_CYCLE for none. */
  code: number;
  depth: number;
  retract: number;
  dwell: number;
  peck: number;
  shiftU: number;
  shiftV: number;
  back: number;
  /** The motion code in force before the series. */
  motionBefore: number;
  /** Height of the depth axis where the series of holes began. */
  seriesLevel: number;
}

/** The modes that a save-state code keeps and a restore-state code brings back. */
export type SavedState = Pick<
  Machine,
  | 'unit'
  | 'planeIndex'
  | 'isAbsolute'
  | 'isArcCentreAbsolute'
  | 'feedMode'
  | 'path'
  | 'returnTo'
  | 'workOffset'
  | 'speed'
  | 'feed'
>;
