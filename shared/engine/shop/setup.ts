/**
 * The setup as the engine trusts it: the output of the setup contract, every default filled in.
 *
 * Lengths are millimetres, times seconds, feeds mm/min, accelerations mm/s². All fixed geometry is
 * in machine coordinates of the gauge point (spindle nose centre), axes per ISO 841: X right, Y away
 * from the operator, Z up. A tool of gauge length L held at machine z has its tip at z − L.
 */
export interface Setup {
  readonly format: 'nightlatch-setup';
  readonly version: 1;
  readonly asOf?: string | undefined;
  readonly machine: Machine;
  readonly controller: Controller;
  readonly rack: Rack;
  readonly loading: Loading;
  readonly tools: readonly Tool[];
  readonly offsets: Offsets;
  readonly job?: JobSheet | undefined;
  readonly changeMacro?: ProgramText | undefined;
  readonly subprograms: readonly ProgramText[];
  readonly policy: Policy;
}

export type Axis = 'x' | 'y' | 'z';
export type Interval = readonly [number, number];
export interface Point {
  readonly x: number;
  readonly y: number;
  readonly z: number;
}
/** A box whose missing sides are open: no bound there. */
export interface OpenBox {
  readonly min: { readonly x?: number; readonly y?: number; readonly z?: number };
  readonly max: { readonly x?: number; readonly y?: number; readonly z?: number };
}
export interface PerAxis {
  readonly x: number;
  readonly y: number;
  readonly z: number;
}
export interface NamedBox {
  readonly name: string;
  readonly box: OpenBox;
}
export interface ProgramText {
  readonly name: string;
  readonly text: string;
}

export interface Machine {
  readonly name: string;
  /** What the controller enforces, per axis; `a` in degrees when there is a fourth axis. */
  readonly travel: {
    readonly x: Interval;
    readonly y: Interval;
    readonly z: Interval;
    readonly a?: Interval | undefined;
  };
  /** Wider limits that only a tool change may use, on the axes named. */
  readonly changeTravel: {
    readonly x?: Interval | undefined;
    readonly y?: Interval | undefined;
    readonly z?: Interval | undefined;
  };
  /** Where the gauge point stands before the program; default least x and y, greatest z. */
  readonly start?: Point | undefined;
  readonly references: { readonly g28?: Point | undefined; readonly g30?: Point | undefined };
  readonly rapid: PerAxis;
  readonly maxFeed: PerAxis;
  readonly acceleration: PerAxis;
  readonly spindle: Spindle;
  readonly drawbar?:
    { readonly open: number; readonly close: number; readonly ejects: number } | undefined;
  readonly spoilboard?:
    | {
        readonly top: number;
        readonly allowance: number;
        readonly area?:
          | {
              readonly min: { readonly x: number; readonly y: number };
              readonly max: { readonly x: number; readonly y: number };
            }
          | undefined;
      }
    | undefined;
  /** Where M6 takes the head if the controller changes by itself or by hand; null: it stays. */
  readonly changePoint: Point | null;
  readonly changeSeconds: number;
  readonly bodies: readonly Body[];
  readonly zones: readonly Zone[];
}
export interface Spindle {
  readonly minRpm: number;
  readonly maxRpm: number;
  readonly spinUp: number;
  readonly spinDown: number;
  readonly turns: readonly ('cw' | 'ccw')[];
  /** Whether M3 holds the program until the spindle is at speed. */
  readonly waits: boolean;
}
export interface Body extends NamedBox {
  /** head: x, y, z follow. carriage: x, y follow, z absolute. gantry: y follows, x spans all, z absolute. */
  readonly rides: 'head' | 'carriage' | 'gantry';
  /** A lifted or docked boot is no obstacle. */
  readonly boot?: 'stays' | 'lifts' | 'docks' | undefined;
  /** Length of the bristles below the box; they bend and are drawn only. */
  readonly bristles?: number | undefined;
}
export interface Zone extends NamedBox {
  readonly forbids: 'everything' | 'tip' | 'rapid' | 'all-but-change';
}

export interface Controller {
  readonly language: 'rs274ngc' | 'custom-macro';
  readonly defaults: ControllerDefaults;
  /** |start radius − end radius| up to this passes, mm in both unit modes. */
  readonly arcTolerance: number;
  readonly dwell: 'seconds' | 'milliseconds';
  readonly numbers: 'decimal' | 'least-increment';
  readonly longestBlock: number;
  readonly toolWord: 'tool' | 'pocket';
  readonly toolZero: 'put-away' | 'ignored' | 'by-hand' | 'refused';
  readonly changeOn: 'M6' | 'T';
  readonly toolChange: 'macro' | 'controller' | 'manual' | 'ignored';
  readonly changeStopsSpindle: boolean;
  readonly rapids: 'coordinated' | 'independent';
  readonly lengthOffset: 'program' | 'macro' | 'automatic';
  readonly lengthScheme: 'from-nose' | 'from-master' | 'touch-off' | 'none' | 'measured-in-macro';
  /** Offset in the table = gauge length − this. */
  readonly lengthReference: number;
  /** D number = T number + this. */
  readonly diameterOffsetShift: number;
  readonly currentTool?: string | undefined;
  readonly selectedTool?: string | undefined;
  readonly currentPocket?: string | undefined;
  readonly selectedPocket?: string | undefined;
  readonly pocketContents: Readonly<Record<string, string>>;
  readonly codes: readonly DeclaredCode[];
  readonly inputs: readonly DeclaredInput[];
  /** Starting values of parameters, read in `defaults.units`. */
  readonly parameters: Readonly<Record<string, number>>;
  readonly switches: Switches;
}
export interface ControllerDefaults {
  readonly units: 'mm' | 'inch';
  readonly plane: 'xy' | 'zx' | 'yz';
  readonly distance: 'absolute' | 'incremental';
  readonly arcCentre: 'incremental' | 'absolute';
  readonly feed: 'per-minute' | 'inverse-time' | 'per-revolution';
  readonly workOffset: string;
  readonly return: 'G98' | 'G99';
  readonly path: 'G61' | 'G61.1' | 'G64';
}
export const CODE_DEEDS = [
  'drawbar-open',
  'drawbar-close',
  'boot-up',
  'boot-down',
  'boot-dock',
  'boot-fetch',
  'rack-out',
  'rack-in',
  'cover-open',
  'cover-shut',
  'read-input',
  'wait-input',
  'set-current-tool',
  'air-blast',
  'air-off',
  'coolant-on',
  'coolant-off',
  'extraction-on',
  'extraction-off',
  'vacuum-on',
  'vacuum-off',
  'alarm',
  'save-state',
  'restore-state',
  'nothing',
] as const;
export type CodeDeed = (typeof CODE_DEEDS)[number];
export const INPUT_MEANINGS = [
  'holder-clamped',
  'clamped-on-nothing',
  'drawbar-open',
  'tool-present',
  'spindle-still',
  'boot-up',
  'boot-docked',
  'rack-out',
  'cover-open',
  'air-ok',
  'homed',
  'pocket-occupied',
] as const;
export type InputMeaning = (typeof INPUT_MEANINGS)[number];
/** What an M or G code does on this machine; it overrides the built-in meaning. */
export interface DeclaredCode {
  readonly code: string;
  readonly where?: Readonly<Record<string, number>> | undefined;
  readonly does: CodeDeed;
  readonly input?: InputMeaning | undefined;
  readonly pocket?: number | undefined;
  readonly when?: number | undefined;
  readonly seconds?: number | string | undefined;
  readonly into?: string | undefined;
  readonly timeout?: number | undefined;
  readonly from?: string | undefined;
}
export interface DeclaredInput {
  readonly parameter: string;
  readonly means: InputMeaning;
  readonly pocket?: number | undefined;
  /** The value that says so. */
  readonly when: number;
}
export interface Switches {
  readonly homeAxes: 'all' | 'named';
  readonly cycleReturn: 'line' | 'series';
  readonly startMotion: 'none' | 'rapid' | 'feed';
  readonly lengthWithoutH: 'refused' | 'held-tool';
  readonly leastIncrement: number;
  readonly peckBackOff: number;
  readonly packedM98: boolean;
  readonly incrementalMachineMove: 'obeyed' | 'refused' | 'ignored';
  readonly strict: boolean;
}

export type Opening = '+x' | '-x' | '+y' | '-y';
export interface Rack {
  readonly name: string;
  readonly edge: 'front' | 'back' | 'left' | 'right';
  readonly slideOut: number;
  readonly gripTolerance: { readonly xy: number; readonly z: number };
  /** The plate at each pocket: across the mouth, from grip to tine ends, its height, its top under the gauge line. */
  readonly fork: {
    readonly width: number;
    readonly reach: number;
    readonly thickness: number;
    readonly below: number;
  };
  readonly bodies: readonly NamedBox[];
  readonly pockets: readonly Pocket[];
}
export interface Pocket {
  readonly number: number;
  readonly grip: Point;
  /** The direction in which a holder slides out. */
  readonly opens: Opening;
  readonly largestDiameter: number;
  readonly longest: number;
  readonly taper: string;
  readonly kind: 'fork' | 'cup';
  /** Heaviest tool with its holder, kg. */
  readonly heaviest?: number | undefined;
  readonly taught?: { readonly at: string; readonly by: string } | undefined;
}
export interface Loading {
  /** Where each tool belongs. */
  readonly pockets: readonly { readonly pocket: number; readonly tool: number }[];
  /** A tool number (its fork stands empty now), null (nothing held), or unknown. */
  readonly inSpindle: number | null | 'unknown';
  /** Tools fitted by hand when called. */
  readonly byHand: readonly number[];
}

export interface Tool {
  readonly number: number;
  readonly name: string;
  /** Free text; known: compression end-mill upcut downcut ball drill v-bit surfacing saw probe knife other. */
  readonly kind: string;
  readonly diameter: number;
  readonly asGround?: number | undefined;
  readonly shank: number;
  readonly stickOut: number;
  readonly fluteLength: number;
  readonly gaugeLength: number;
  readonly holder: Holder;
  readonly flutes?: number | undefined;
  readonly maxRpm: number;
  readonly turns: 'cw' | 'ccw' | 'never';
  /** Cutting seconds of its life, and of it used. */
  readonly life?: number | undefined;
  readonly used: number;
  /** Mass with holder, kg. */
  readonly mass?: number | undefined;
  readonly measured: { readonly at: string; readonly method: string } | null;
  readonly touched: string | null;
  readonly sisterOf: number | null;
}
export interface Holder {
  readonly taper: string;
  readonly diameter: number;
  /** Taper and pull stud over the gauge line when parked. */
  readonly above: number;
  readonly steps: readonly { readonly diameter: number; readonly length: number }[];
  /** Clamping range of the collet, mm, when there is one. */
  readonly collet?:
    { readonly min: number; readonly max: number; readonly grips?: number | undefined } | undefined;
  /** Length of shank inside the collet, mm. */
  readonly gripped?: number | undefined;
}
export interface Offsets {
  readonly length: Readonly<Record<string, number>>;
  readonly diameter: Readonly<Record<string, number>>;
  readonly work: Readonly<Record<string, Partial<Record<'x' | 'y' | 'z' | 'a', number>>>>;
}
export interface JobSheet {
  readonly stock?:
    | {
        readonly in: string;
        readonly min: Point;
        readonly max: Point;
        readonly material?: string | undefined;
      }
    | undefined;
  readonly zeroOn: 'top' | 'board';
  readonly obstacles: readonly {
    readonly name: string;
    readonly in: string;
    readonly box: OpenBox;
  }[];
}
export interface Policy {
  readonly unattended: {
    readonly allowPauses: boolean;
    readonly lifeMargin: number;
    readonly measuredWithinDays: number;
  };
  /** Rule ids whose severity the shop raises. */
  readonly raise: Readonly<Record<string, 'hold' | 'stop'>>;
  readonly material: { readonly upToBlocks: number };
  readonly chipLoad: readonly {
    readonly kind: string;
    readonly material?: string | undefined;
    readonly from: number;
    readonly to: number;
  }[];
}
