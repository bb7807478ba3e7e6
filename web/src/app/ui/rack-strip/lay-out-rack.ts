import type { Loading, Opening, Pocket, Rack, Tool } from '#engine';
import { drawTool } from './draw-tool';
import type { Mouth, RackMark, RackSlot, SlotState } from './rack-slot';
import { capital, remarksOf, sentenceOf, viewSentence } from './rack-words';

export type { RackMark } from './rack-slot';

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
  /** The two tines beside a mouth, measured from the place's centre and the gauge line. */
  readonly tines: {
    readonly left: number;
    readonly right: number;
    readonly width: number;
    readonly top: number;
    readonly height: number;
  };
  /** The band that carries the forks. */
  readonly rail: {
    readonly x: number;
    readonly y: number;
    readonly width: number;
    readonly height: number;
  };
  /** What lights up behind a place, measured from its centre. */
  readonly ground: { readonly x: number; readonly width: number; readonly height: number };
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
  const width = slotWidth * Math.max(1, places.length);
  const labels = gaugeLine + deepest + 26;
  const height = labels + LABEL_ROOM + WORD_ROOM * mostWords(slots);
  const tines = tinesOf(rack, scale, slotWidth);
  return {
    heading: `${capital(rack.edge)} edge, as it stands`,
    view: viewSentence(rack, slots),
    ...ends(rack),
    slots,
    slotWidth,
    width,
    height,
    gaugeLine,
    labels,
    tines,
    rail: { x: 6, y: gaugeLine + tines.top + tines.height * 0.6, width: width - 12, height: 8 },
    ground: { x: 3 - slotWidth / 2, width: slotWidth - 6, height: height - 2 },
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

/** The plate of a fork seen along its mouth; the mouth itself is drawn, the setup does not give it. */
function tinesOf(rack: Rack, scale: number, slotWidth: number): RackDrawing['tines'] {
  const half = Math.min((rack.fork.width * scale) / 2 + 8, slotWidth / 2 - 3);
  const gap = half * 0.55;
  return {
    left: -half,
    right: gap,
    width: half - gap,
    top: rack.fork.below * scale,
    height: Math.max(4, rack.fork.thickness * scale * 0.7),
  };
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

function clamp(value: number, least: number, greatest: number): number {
  return Math.min(greatest, Math.max(least, value));
}
