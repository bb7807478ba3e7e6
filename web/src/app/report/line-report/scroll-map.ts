/**
 * Browsers clip an element at some tens of millions of pixels (Chromium at 33.5 million; lower
 * limits are commonly given for others), and a million lines are 24 million high. So the scrolled
 * element is never higher than this, and heights beyond are mapped onto it.
 */
export const GREATEST_HEIGHT = 8_000_000;
/** Near both ends one pixel of the scroll bar is one pixel of the report, so that ends are reached exactly. */
const TRUE_ENDS = GREATEST_HEIGHT / 8;

/** Where the report stands: `bar` is the element's scrollTop, `top` the report's own first pixel shown. */
export interface ScrollPlace {
  readonly bar: number;
  readonly top: number;
}
export interface ScrollSize {
  /** Height of all rows, px; may be far beyond GREATEST_HEIGHT. */
  readonly total: number;
  /** Height of the window on them, px. */
  readonly view: number;
}

export function barHeight(size: ScrollSize): number {
  return Math.min(size.total, GREATEST_HEIGHT);
}

/** The place after the element was scrolled to `bar`. */
export function follow(from: ScrollPlace, bar: number, size: ScrollSize): ScrollPlace {
  const moved = bar - from.bar;
  // Wheel, keys and touch move a little and must feel like any page; only a drag of the bar jumps.
  const top = Math.abs(moved) <= 2 * size.view ? from.top + moved : toTop(bar, size);
  return { bar, top: clampTop(top, size) };
}

/** Where the bar belongs for a place of the report. */
export function placeAt(top: number, size: ScrollSize): ScrollPlace {
  const clamped = clampTop(top, size);
  return { top: clamped, bar: toBar(clamped, size) };
}

/** Whether the bar ran out of room, or stands elsewhere than it belongs, after small moves. */
export function isAstray(place: ScrollPlace, size: ScrollSize): boolean {
  return Math.abs(place.bar - toBar(place.top, size)) > 1;
}
/** Whether the bar cannot go on although the report does: it must be set right at once. */
export function isStuck(place: ScrollPlace, size: ScrollSize): boolean {
  const { bar, top } = lasts(size);
  return (place.bar <= 0 && 1 < place.top) || (bar <= place.bar && place.top < top - 1);
}

function toTop(bar: number, size: ScrollSize): number {
  const last = lasts(size);
  if (last.bar === last.top || bar <= TRUE_ENDS) return bar;
  if (last.bar - TRUE_ENDS <= bar) return last.top - (last.bar - bar);
  return TRUE_ENDS + (bar - TRUE_ENDS) * stretch(size);
}
function toBar(top: number, size: ScrollSize): number {
  const last = lasts(size);
  if (last.bar === last.top || top <= TRUE_ENDS) return top;
  if (last.top - TRUE_ENDS <= top) return last.bar - (last.top - top);
  return TRUE_ENDS + (top - TRUE_ENDS) / stretch(size);
}
function stretch(size: ScrollSize): number {
  const last = lasts(size);
  return (last.top - 2 * TRUE_ENDS) / (last.bar - 2 * TRUE_ENDS);
}
function lasts(size: ScrollSize): { bar: number; top: number } {
  return {
    bar: Math.max(0, barHeight(size) - size.view),
    top: Math.max(0, size.total - size.view),
  };
}
function clampTop(top: number, size: ScrollSize): number {
  return Math.min(lasts(size).top, Math.max(0, top));
}
