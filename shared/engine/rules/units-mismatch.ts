import type { Place } from '../interpreter/events';
import type { Shop } from '../shop/shop';
import { figure, text, toolWords } from './finding-data';
import { isProgramMotion } from './mode-not-stated';
import { defineRule } from './rule';
import { watchToolComments, type PlacedToolComment } from './watch-tool-comments';

/** Stated units under which the figures make no sense, though they do in the other. */
export const unitsMismatch = defineRule({
  id: 'units-mismatch',
  group: 'state',
  title: 'The figures only make sense in the other unit',
  severity: 'stop',
  protects: 'The machine from moves 25.4 times too long or too short.',
  explanation:
    'Two signs, each of which has to be plain. The program spans more than this machine can travel as read, and would fit in millimetres where inches are stated. Or the tool list in its head gives, without a unit of its own, a diameter that is another tool altogether in the stated unit and exactly the tool of our list in the other. A small job on a large sheet is no sign.',
  examples: {
    bad: 'G20 G90 G54\nG0 X0 Y0\nG0 X1200 Y600\nM30',
    good: 'G21 G90 G54\nG0 X0 Y0\nG0 X1200 Y600\nM30',
  },
  word: (data, lengths) =>
    text(data, 'reason') === 'comment'
      ? {
          message: `The comment gives ${toolWords(data)} a diameter of ${figure(data, 'written')}, which fits the tool list (${lengths.length(figure(data, 'listed'))}) only if the program is in ${otherWords(text(data, 'units'))}; it says ${unitWords(text(data, 'units'))}.`,
          advice: 'Find out in which unit the program was posted, and state that one.',
        }
      : {
          message: `Read in ${unitWords(text(data, 'units'))} the program spans ${lengths.length(figure(data, 'span'))} in ${text(data, 'axis').toUpperCase()}, more than the machine’s travel of ${lengths.length(figure(data, 'travel'))}; read in ${otherWords(text(data, 'units'))} it fits.`,
          advice: 'Find out in which unit the program was posted, and state that one.',
        },
  observe: (shop, report) => {
    const spans = [emptySpan(), emptySpan()];
    let unitsAt: Place | undefined;
    const comments = watchToolComments((comment, state) => {
      const sign = commentSign(shop, comment);
      if (!sign) return;
      const { tool } = sign;
      report.found({ cause: `T${tool}`, at: comment.place, tool, data: sign }, state);
    });
    return {
      ...comments,
      quiet(quiet, state) {
        comments.quiet?.(quiet, state);
        if (!unitsAt) quiet.close();
      },
      stretch({ minX, maxX, minY, maxY }) {
        widen(spans[0]!, minX, maxX);
        widen(spans[1]!, minY, maxY);
      },
      motion(motion, state) {
        comments.motion?.(motion, state);
        if (!isProgramMotion(motion)) return;
        unitsAt ??= state.setAt('units') ?? { line: state.line };
        const isArc = motion.kind === 'arc';
        widen(spans[0]!, isArc ? motion.minX : motion.toX, isArc ? motion.maxX : motion.toX);
        widen(spans[1]!, isArc ? motion.minY : motion.toY, isArc ? motion.maxY : motion.toY);
      },
      programEnd(event, state) {
        comments.programEnd?.(event, state);
        const sign = spanSign(shop, spans, state.units);
        if (sign && unitsAt) report.found({ cause: 'span', at: unitsAt, data: sign }, state);
      },
    };
  },
});

interface Span {
  low: number;
  high: number;
}
const emptySpan = (): Span => ({ low: Infinity, high: -Infinity });

function widen(span: Span, low: number, high: number): void {
  if (low < span.low) span.low = low;
  if (high > span.high) span.high = high;
}

const MM_PER_INCH = 25.4;

/** Only the error that shows: a program in millimetres that is read in inches. */
function spanSign(shop: Shop, spans: readonly Span[], units: string) {
  if (units !== 'inch') return undefined;
  const { travel } = shop.setup.machine;
  const limits = [travel.x[1] - travel.x[0], travel.y[1] - travel.y[0]];
  const sizes = spans.map((span) => span.high - span.low);
  const fits = sizes.every((size, index) => size / MM_PER_INCH <= limits[index]!);
  const over = sizes.findIndex((size, index) => size > TWICE * limits[index]!);
  if (over < 0 || !fits) return undefined;
  const axis = over === 0 ? 'x' : 'y';
  return { reason: 'span', units, axis, span: sizes[over]!, travel: limits[over]! };
}
/** A program for a slightly larger machine also spans too much; one in the wrong unit does so by far. */
const TWICE = 2;

function commentSign(shop: Shop, comment: PlacedToolComment) {
  const { diameter, unit, programUnit } = comment;
  const tool = shop.toolByNumber.get(comment.about);
  if (diameter === undefined || unit !== undefined || !programUnit || !tool) return undefined;
  const isInch = programUnit === 'inch';
  const stated = isInch ? diameter * MM_PER_INCH : diameter;
  const other = isInch ? diameter : diameter * MM_PER_INCH;
  const isFar = stated > FAR * tool.diameter || stated * FAR < tool.diameter;
  if (!isFar || Math.abs(other - tool.diameter) > SAME_DIAMETER) return undefined;
  return {
    reason: 'comment',
    units: programUnit,
    tool: tool.number,
    name: tool.name,
    written: diameter,
    listed: tool.diameter,
  };
}
/** Diameters agree within this (mm): the same as where a comment disagrees. */
const SAME_DIAMETER = 0.05;
/** Ten times off is the wrong unit, not the wrong cutter. */
const FAR = 10;

function unitWords(units: string): string {
  return units === 'inch' ? 'inches' : 'millimetres';
}
function otherWords(units: string): string {
  return units === 'inch' ? 'millimetres' : 'inches';
}
