import { codeName } from '../blocks/code-groups';
import type { Block } from '../blocks/block';
import type { Tool } from '../shop/setup';
import { columnsOf } from './columns';
import type { HeldTool, MachineState, Place, Plane, SettableState, Turning, Words } from './events';

/** Settable states in the order in which their places are kept. */
const SETTABLE: readonly SettableState[] = [
  'units',
  'plane',
  'distance',
  'feedMode',
  'path',
  'motionMode',
  'compensation',
  'workOffset',
  'localShift',
  'lengthOffset',
  'spindle',
  'speed',
  'feed',
  'selectedTool',
  'coolant',
  'return',
];
const KEPT = 3;
export const SETTING = Object.fromEntries(SETTABLE.map((name, index) => [name, index])) as Readonly<
  Record<SettableState, number>
>;

export class Held implements HeldTool {
  known = false;
  number: number | null = null;
  tool: Tool | undefined = undefined;
}

export const PLANES: readonly Plane[] = ['xy', 'zx', 'yz'];
export const NO_MOTION = 800;

/**
 * The machine as the interpreter knows it. Positions are machine millimetres of the gauge point. Every
 * figure starts as a fraction so that the engine's host keeps it as a double from the first block on.
 */
export class Machine implements MachineState {
  line = 1;
  /** The place within a text of the setup that is read now; `line` is then the block that called it. */
  within: { readonly text: string; readonly line: number } | undefined = undefined;
  unit = 0.5;
  planeIndex = 0;
  isAbsolute = true;
  isArcCentreAbsolute = false;
  feedMode: MachineState['feedMode'] = 'per-minute';
  path = 'G64';
  returnTo: 'G98' | 'G99' = 'G98';
  motionCode = NO_MOTION;
  compensation: MachineState['compensation'] = 'off';
  /** Whether the next XY move is not simply the one programmed: the cutter runs beside the path, or comes back to it. */
  isOffset = false;
  workOffset = 'G54';
  originX: number | undefined = undefined;
  originY: number | undefined = undefined;
  originZ: number | undefined = undefined;
  shiftX = 0.5;
  shiftY = 0.5;
  shiftZ = 0.5;
  /** Machine position of program zero: origin and shift, and on Z the length offset. */
  baseX = 0.5;
  baseY = 0.5;
  baseZ = 0.5;
  baseA = 0.5;
  /** Bits (1 X, 2 Y, 4 Z) of axes whose active origin has no value. */
  unsetAxes = 0;
  selectedTool: number | null = null;
  readonly held = new Held();
  changed = false;
  lengthOffset = 0.5;
  lengthFrom: number | null = null;
  lengthAppliedFor: number | null = null;
  turning: Turning = 'off';
  speed = 0.5;
  feed = 0.5;
  readonly coolant = { mist: false, flood: false };
  x = 0.5;
  y = 0.5;
  z = 0.5;
  a = 0.5;
  private readonly settings = new Int32Array(SETTABLE.length * KEPT);

  constructor(private readonly block: Block) {}

  get units(): 'mm' | 'inch' {
    return this.unit === 1 ? 'mm' : 'inch';
  }
  get plane(): Plane {
    return PLANES[this.planeIndex]!;
  }
  get distance(): 'absolute' | 'incremental' {
    return this.isAbsolute ? 'absolute' : 'incremental';
  }
  get motionMode(): string {
    return codeName('G', this.motionCode);
  }

  /** Notes that the word (its index) of the block now read set this state. */
  noteSet(setting: number, word: number): void {
    const { words } = this.block;
    const { settings } = this;
    const at = setting * KEPT;
    settings[at] = this.line;
    if (word < 0 || this.within) {
      settings[at + 1] = 0;
      return;
    }
    settings[at + 1] = words.starts[word]! - words.start + 1;
    settings[at + 2] = words.ends[word]! - words.start + 1;
    if (words.hasWide) this.noteWide(at, word);
  }

  /** As noteSet, for bytes of a line that is not in the block: first and one past the last, counted from its start. */
  noteSetAt(setting: number, line: number, from: number, to: number): void {
    const at = setting * KEPT;
    this.settings[at] = line;
    this.settings[at + 1] = from + 1;
    this.settings[at + 2] = to + 1;
  }

  private noteWide(at: number, word: number): void {
    const { words } = this.block;
    const [from, to] = columnsOf(words, words.starts[word]!, words.ends[word]!);
    this.settings[at + 1] = from;
    this.settings[at + 2] = to;
  }

  /** Whether any word has set this state yet. */
  isSet(setting: number): boolean {
    return this.settings[setting * KEPT] !== 0;
  }

  setAt(what: SettableState): Place | undefined {
    const at = SETTING[what] * KEPT;
    const line = this.settings[at]!;
    if (line === 0) return undefined;
    const from = this.settings[at + 1]!;
    return from === 0 ? { line } : { line, columns: [from, this.settings[at + 2]!] };
  }

  place(words?: Words): Place {
    const range = this.rangeOf(words);
    const { line, within } = this;
    const columns = range && columnsOf(this.block.words, range[0], range[1]);
    if (within) return { line, within: columns ? { ...within, columns } : within };
    return columns ? { line, columns } : { line };
  }

  private rangeOf(asked: Words | undefined): readonly [number, number] | undefined {
    const { words } = this.block;
    if (asked?.bytes) return [words.start + asked.bytes[0], words.start + asked.bytes[1]];
    if (asked?.letters === 'none') return undefined;
    let from = -1;
    let to = -1;
    const isWhole = !asked || asked.letters === 'block' || (!asked.letters && !asked.code);
    for (let word = 0; word < words.count; word++) {
      if (!isWhole && !matches(asked, words.letters[word]!, words.values[word]!)) continue;
      if (from < 0) from = words.starts[word]!;
      to = words.ends[word]!;
    }
    if (from >= 0) return [from, to];
    return isWhole ? undefined : this.rangeOf(undefined);
  }
}

function matches(asked: Words, letter: number, value: number): boolean {
  const name = String.fromCharCode(65 + letter);
  if (asked.code !== undefined) {
    if (
      asked.code[0] !== name ||
      codeName(name as 'G' | 'M', Math.round(value * 10)) !== asked.code
    )
      return asked.letters?.includes(name) ?? false;
    return true;
  }
  return asked.letters?.includes(name) ?? false;
}
