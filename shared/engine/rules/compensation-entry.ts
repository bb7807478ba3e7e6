import { LIMIT_SLACK } from '../geometry/tolerance';
import type { CompensationEvent, MachineState, Motion } from '../interpreter/events';
import type { FindingData } from '../report/report';
import type { Shop } from '../shop/shop';
import { figure, text } from './finding-data';
import { defineRule } from './rule';

/** Cutter compensation that cannot be started, ended or followed as written. */
export const compensationEntry = defineRule({
  id: 'compensation-entry',
  group: 'state',
  title: 'Cutter compensation starts, ends or turns where it cannot',
  severity: 'stop',
  protects: 'The work from a gouge at the lead-in, and the run from an alarm.',
  explanation:
    'Compensation is switched on and off by a straight move, and switched on by one longer than the compensation value; an arc turned on its inside must be wider than it (NISTIR 6556, appendix B). The value taken is half the diameter in the offset table. Inside corners between straight lines are not judged: many controllers round them.',
  examples: {
    bad: 'G21 G90 G54 G17\nT2 M6\nG0 X0 Y0\nG41 D2\nG1 X1 F1000\nX50\nG40\nM30',
    good: 'G21 G90 G54 G17\nT2 M6\nG0 X0 Y0\nG41 D2\nG1 X10 F1000\nX50\nG40\nM30',
  },
  word: (data, lengths) => ({
    message: describe(data, lengths.length),
    advice:
      text(data, 'reason') === 'plane'
        ? 'Select G17 before cutter compensation is switched on.'
        : 'Lead in and out on a straight line longer than the compensation, or use a smaller cutter.',
  }),
  observe: (shop, report) => {
    let side: CompensationEvent['side'] = 'off';
    let isSwitching = false;
    let radius = NaN;
    return {
      problem({ problem, place, facts }, state) {
        if (problem !== 'compensation-entry') return;
        report.found({ cause: String(facts['reason']), at: place, data: { ...facts } }, state);
      },
      compensation(event, state) {
        isSwitching = event.side !== side;
        side = event.side;
        if (side !== 'off') radius = compensationRadius(shop, event.number, state);
      },
      motion(motion, state) {
        if (side === 'off' && !isSwitching) return;
        if (motion.fromX === motion.toX && motion.fromY === motion.toY && motion.kind !== 'arc')
          return;
        const fault = judgeMove(motion, side, isSwitching, radius);
        isSwitching = false;
        if (!fault) return;
        const at = state.place({ letters: 'XYIJR' });
        const cause = `${String(fault['reason'])} ${side}`;
        report.found({ cause, by: radius, at, data: fault }, state);
      },
    };
  },
});

/** Half the diameter of the offset named, or of the held tool's own; NaN where it is not known. */
function compensationRadius(shop: Shop, number: number | null, state: MachineState): number {
  const { controller, offsets } = shop.setup;
  if (number === 0) return 0;
  const own = (state.held.number ?? NaN) + controller.diameterOffsetShift;
  return Math.abs(offsets.diameter[String(number ?? own)] ?? NaN) / 2;
}

function judgeMove(
  motion: Motion,
  side: CompensationEvent['side'],
  isSwitching: boolean,
  radius: number,
): FindingData | undefined {
  const isArc = motion.kind === 'arc';
  if (isSwitching && isArc) return { reason: 'arc', side };
  if (side === 'off') return undefined;
  if (isSwitching) {
    const length = Math.hypot(motion.toX - motion.fromX, motion.toY - motion.fromY);
    return length <= radius + LIMIT_SLACK ? { reason: 'short', length, radius } : undefined;
  }
  const isInside = isArc && motion.plane === 'xy' && motion.turn > 0 === (side === 'left');
  return isInside && motion.radius <= radius + LIMIT_SLACK
    ? { reason: 'tight', arc: motion.radius, radius }
    : undefined;
}

function describe(data: FindingData, length: (mm: number) => string): string {
  const by = length(figure(data, 'radius'));
  switch (text(data, 'reason')) {
    case 'arc':
      return `Cutter compensation is switched ${text(data, 'side') === 'off' ? 'off' : 'on'} on an arc.`;
    case 'short':
      return `The move that switches compensation on is ${length(figure(data, 'length'))} long, no longer than the compensation of ${by}.`;
    case 'tight':
      return `An inside arc of radius ${length(figure(data, 'arc'))} is no wider than the compensation of ${by}.`;
    default:
      return 'Cutter compensation is switched on outside the XY plane.';
  }
}
