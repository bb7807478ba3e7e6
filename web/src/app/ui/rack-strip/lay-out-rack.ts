import type { Loading, Opening, Pocket, Rack, Tool } from '#engine';
import { drawTool, type ToolDrawing } from './draw-tool';

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

export interface RackDrawing {
  readonly heading: string;
  /** From where it is seen and where the forks open. */
  readonly view: string;
  readonly leftEnd: string;
  readonly rightEnd: string;
  readonly slots: readonly RackSlot[];
  readonly slotWidth: number;
  readonly width: number;
  readonly height: number;
  /** y of the gauge line; every tool hangs from it. */
  readonly gaugeLine: number;
  /** y of the labels' first baseline. */
  readonly labels: number;
  readonly fork: {
    readonly top: number;
    readonly height: number;
    readonly half: number;
    readonly gap: number;
  };
  /** Whether the rail stands before the forks (they open away from the person looking). */
  readonly railInFront: boolean;
  /** What the drawing cannot show: what the spindle holds, tools fitted by hand. */
  readonly remarks: readonly string[];
}

export interface RackToDraw {
  readonly rack: Rack;
  readonly loading: Loading;
  readonly tools: readonly Tool[];
  /** Tool numbers in the order in which the program first calls them. */
  readonly callOrder: readonly number[];
  readonly marks: readonly RackMark[];
  /** Room across, px. */
  readonly available: number;
}

/** Marks written at one place; more would run into the next row, and the sentence has them all. */
export const MARKS_SHOWN = 2;
/** The longest words of a mark still stand side by side (px). */
const LEAST_SLOT = 92;
const GREATEST_SLOT = 150;
const GREATEST_SCALE = 1.05;
/** Room for the longest assembly with its taper, px. */
const TALLEST = 200;
const BADGE_ROOM = 40;
/** Room under the labels' first baseline: place and mouth, then a line for each word. */
const LABEL_ROOM = 46;
export const WORD_ROOM = 15;

/** Lays out a rack as a person sees it who stands before it. */
export function layOutRack(input: RackToDraw): RackDrawing {
  const { rack, loading } = input;
  const places = [...orderPockets(rack), ...homeless(input)];
  const slotWidth = clamp(input.available / Math.max(1, places.length), LEAST_SLOT, GREATEST_SLOT);
  const scale = scaleFor(input, slotWidth);
  const tallest = Math.max(30, ...input.tools.map((tool) => tool.holder.above * scale));
  const deepest = Math.max(40, ...drawn(input).map((tool) => tool.gaugeLength * scale));
  const gaugeLine = BADGE_ROOM + Math.min(tallest, TALLEST / 2);
  const slots = places.map((place, index) =>
    slotOf(input, place, { x: (index + 0.5) * slotWidth, scale }),
  );
  const half = Math.min((rack.fork.width * scale) / 2 + 8, slotWidth / 2 - 3);
  const labels = gaugeLine + deepest + 26;
  return {
    heading: `${capital(rack.edge)} edge, as it stands`,
    view: viewSentence(rack, slots),
    ...ends(rack),
    slots,
    slotWidth,
    width: slotWidth * Math.max(1, places.length),
    height: labels + LABEL_ROOM + WORD_ROOM * mostWords(slots),
    gaugeLine,
    labels,
    fork: {
      top: rack.fork.below * scale,
      height: Math.max(4, rack.fork.thickness * scale * 0.7),
      half,
      gap: half * 0.55,
    },
    railInFront: isRailInFront(slots),
    remarks: remarksOf(loading),
  };
}

/**
 * Pockets from left to right as seen: front and back racks from the front of the machine, a side
 * rack from that side of the machine, where the person who loads it stands.
 */
export function orderPockets(rack: Rack): readonly Pocket[] {
  const along = (pocket: Pocket): number => {
    if (rack.edge === 'left') return -pocket.grip.y;
    return rack.edge === 'right' ? pocket.grip.y : pocket.grip.x;
  };
  return [...rack.pockets].sort((a, b) => along(a) - along(b) || a.number - b.number);
}

function isRailInFront(slots: readonly RackSlot[]): boolean {
  const inRack = slots.filter((slot) => slot.pocket !== null);
  return inRack.length > 0 && inRack.every((slot) => slot.mouth === 'away');
}

function mostWords(slots: readonly RackSlot[]): number {
  const words = slots.map(
    (slot) =>
      Math.min(MARKS_SHOWN, slot.marks.length) +
      (slot.state === 'in-spindle' && slot.pocket !== null ? 1 : 0),
  );
  return Math.max(0, ...words);
}

const MOUTHS: Readonly<Record<'front' | 'left' | 'right', Readonly<Record<Opening, Mouth>>>> = {
  front: { '+x': 'right', '-x': 'left', '+y': 'away', '-y': 'toward' },
  right: { '+x': 'toward', '-x': 'away', '+y': 'right', '-y': 'left' },
  left: { '+x': 'away', '-x': 'toward', '+y': 'left', '-y': 'right' },
};
export function mouthOf(rack: Rack, pocket: Pocket): Mouth {
  const seenFrom = rack.edge === 'left' || rack.edge === 'right' ? rack.edge : 'front';
  return MOUTHS[seenFrom][pocket.opens];
}

function ends(rack: Rack): { leftEnd: string; rightEnd: string } {
  if (rack.edge === 'left') return { leftEnd: 'back', rightEnd: 'front' };
  if (rack.edge === 'right') return { leftEnd: 'front', rightEnd: 'back' };
  return { leftEnd: 'left', rightEnd: 'right' };
}

const OPEN_WORDS: Readonly<Record<Mouth, string>> = {
  toward: 'forks open toward you',
  away: 'forks open away from you',
  left: 'forks open to the left',
  right: 'forks open to the right',
};
function viewSentence(rack: Rack, slots: readonly RackSlot[]): string {
  const from = {
    front: 'seen from the front',
    back: 'seen from the front',
    left: 'seen from the left of the machine, its back on your left',
    right: 'seen from the right of the machine, its front on your left',
  }[rack.edge];
  const mouths = new Set(slots.filter((slot) => slot.pocket !== null).map((slot) => slot.mouth));
  const [only] = mouths;
  const open = mouths.size === 1 && only ? OPEN_WORDS[only] : 'forks open as drawn';
  const called = slots.some((slot) => slot.order !== null);
  return [from, ...(mouths.size > 0 ? [open] : [])]
    .concat(called ? ['numbers in brass: order of call'] : [])
    .join(' · ');
}

type Place = Pocket | { readonly homeless: number };

/** Called tools that sit in no pocket: drawn after the last one, so that none goes unseen. */
function homeless(input: RackToDraw): readonly Place[] {
  const placed = new Set(input.loading.pockets.map((each) => each.tool));
  return input.callOrder
    .filter((tool) => tool > 0 && !placed.has(tool))
    .map((tool) => ({ homeless: tool }));
}

function slotOf(input: RackToDraw, place: Place, at: { x: number; scale: number }): RackSlot {
  const { loading, callOrder } = input;
  const pocket = 'homeless' in place ? null : place;
  const number =
    'homeless' in place
      ? place.homeless
      : (loading.pockets.find((each) => each.pocket === place.number)?.tool ?? null);
  const toolNumber = number === 0 ? null : number;
  const tool = input.tools.find((each) => each.number === toolNumber);
  const order = toolNumber === null ? -1 : callOrder.indexOf(toolNumber);
  const state = stateOf(loading, pocket, toolNumber);
  const marks = input.marks.filter((mark) =>
    mark.pocket === undefined
      ? mark.tool !== undefined && mark.tool === toolNumber
      : mark.pocket === pocket?.number,
  );
  const slot = {
    key: pocket ? `P${pocket.number}` : `T${toolNumber}`,
    pocket: pocket?.number ?? null,
    tool: toolNumber,
    state,
    mouth: pocket ? mouthOf(input.rack, pocket) : ('toward' as const),
    x: at.x,
    order: order < 0 ? null : order + 1,
    dimmed: callOrder.length > 0 && order < 0 && marks.length === 0,
    marks,
    drawing: tool ? drawTool(tool, at.scale) : null,
    label: toolNumber === null ? 'empty' : `T${toolNumber}`,
    place: placeOf(pocket, state),
    toolName: tool?.name ?? (toolNumber === null ? '' : 'not in the tool list'),
    diameter: tool?.diameter ?? null,
    gaugeLength: tool?.gaugeLength ?? null,
  };
  return { ...slot, sentence: sentenceOf(slot) };
}

function stateOf(loading: Loading, pocket: Pocket | null, tool: number | null): SlotState {
  if (tool === null) return 'empty';
  if (loading.inSpindle === tool) return 'in-spindle';
  if (pocket) return 'loaded';
  return loading.byHand.includes(tool) ? 'by-hand' : 'not-in-rack';
}

function placeOf(pocket: Pocket | null, state: SlotState): string {
  if (pocket) return `pocket ${pocket.number}`;
  if (state === 'in-spindle') return 'in the spindle';
  return state === 'by-hand' ? 'fitted by hand' : 'in no pocket';
}

const STATE_WORDS: Readonly<Record<SlotState, string>> = {
  loaded: '',
  empty: '',
  'in-spindle': 'it is in the spindle, so this fork stands empty',
  'not-in-rack': 'it is in no pocket of this rack',
  'by-hand': 'it is fitted by hand',
};
function sentenceOf(slot: Omit<RackSlot, 'sentence'>): string {
  const what =
    slot.tool === null ? 'empty' : `${slot.label}${slot.toolName ? `, ${slot.toolName}` : ''}`;
  const parts = [
    slot.pocket === null ? what : `${capital(slot.place)}: ${what}`,
    slot.pocket === null && slot.state === 'in-spindle'
      ? 'it is in the spindle and has no pocket'
      : STATE_WORDS[slot.state],
    slot.order === null ? '' : `called ${ordinal(slot.order)}`,
    ...slot.marks.map((mark) => mark.word),
  ];
  return `${parts.filter((part) => part !== '').join('; ')}.`;
}

function remarksOf(loading: Loading): readonly string[] {
  const remarks: string[] = [];
  if (loading.inSpindle === 'unknown') {
    remarks.push('What the spindle holds is not known: any fork may be full. Look before the run.');
  } else if (loading.inSpindle === null) {
    remarks.push('The spindle holds nothing.');
  } else if (!loading.pockets.some((each) => each.tool === loading.inSpindle)) {
    remarks.push(`T${loading.inSpindle} is in the spindle and has no pocket.`);
  } else {
    remarks.push(`T${loading.inSpindle} is in the spindle; its fork stands empty now.`);
  }
  if (loading.byHand.length > 0) {
    remarks.push(
      `Fitted by hand when called: ${loading.byHand.map((each) => `T${each}`).join(', ')}.`,
    );
  }
  return remarks;
}

function drawn(input: RackToDraw): readonly Tool[] {
  const shown = new Set([...input.loading.pockets.map((each) => each.tool), ...input.callOrder]);
  return input.tools.filter((tool) => shown.has(tool.number));
}

function scaleFor(input: RackToDraw, slotWidth: number): number {
  const tools = drawn(input);
  const widest = Math.max(
    input.rack.fork.width,
    ...tools.map((tool) => Math.max(tool.diameter, tool.holder.diameter)),
  );
  const tallest = Math.max(120, ...tools.map((tool) => tool.gaugeLength + tool.holder.above));
  return Math.min(GREATEST_SCALE, (slotWidth - 14) / widest, TALLEST / tallest);
}

export function ordinal(count: number): string {
  const words = ['first', 'second', 'third', 'fourth', 'fifth', 'sixth', 'seventh', 'eighth'];
  return words[count - 1] ?? `as number ${count}`;
}
function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
function clamp(value: number, least: number, greatest: number): number {
  return Math.min(greatest, Math.max(least, value));
}
