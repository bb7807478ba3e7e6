import { LIMIT_SLACK } from '../geometry/tolerance';
import type { MachineState, Motion } from '../interpreter/events';
import type { FindingData } from '../report/report';
import { figure, text } from './finding-data';
import { unsetAxes } from './placing';
import { defineRule, type LengthWords } from './rule';
import { awayWord, oneLength, sideWord, visitReaches, type Reach } from './travel-sides';

/** The gauge point would be driven past an end of travel. */
export const beyondTravel = defineRule({
  id: 'beyond-travel',
  group: 'travel-and-clearance',
  title: 'The move goes past the end of travel',
  severity: 'stop',
  protects: 'The machine from an overtravel stop in mid-cut, and the work it was cutting.',
  explanation:
    'Every motion of the gauge point is held against the travel that the controller enforces, arcs by the quadrant points they pass, cycles by every part. More than 0.001 mm past a limit counts; exactly at it is inside. Tool changes have travel of their own. A is taken as written: no turn is shortened, so A370 is past a limit of 360 degrees. An axis whose work offset has no value yet is not judged; the work-zero window says what the value may be.',
  examples: {
    bad: 'G21 G90 G17 G54\nT1 M6\nG43 H1\nG0 X1300 Y10\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nG43 H1\nG0 X1270 Y10\nM30',
  },
  word: (data, lengths) => ({
    message: wordMessage(data, lengths),
    advice: wordAdvice(data, lengths),
  }),
  observe: (shop, report) => {
    const { travel } = shop.setup.machine;
    const [lowX, highX] = [travel.x[0] - LIMIT_SLACK, travel.x[1] + LIMIT_SLACK];
    const [lowY, highY] = [travel.y[0] - LIMIT_SLACK, travel.y[1] + LIMIT_SLACK];
    const [lowZ, highZ] = [travel.z[0] - LIMIT_SLACK, travel.z[1] + LIMIT_SLACK];
    const judge = (motion: Motion, state: MachineState, reach: Reach) => {
      const { axis, side, at, limit } = reach;
      const by = side === 'low' ? limit - at : at - limit;
      if (by <= LIMIT_SLACK) return;
      report.found(
        {
          cause: `${axis} ${side}`,
          by: Number.isNaN(by) ? Infinity : by,
          at: state.place({ letters: axis.toUpperCase() }),
          data: { axis, side, by, at, limit, moved: motion.by },
        },
        state,
      );
    };
    return {
      quiet(quiet) {
        quiet.feed.within(travel);
        quiet.rapid.within(travel);
      },
      motion(motion, state) {
        if (
          lowX <= motion.minX &&
          motion.maxX <= highX &&
          lowY <= motion.minY &&
          motion.maxY <= highY &&
          lowZ <= motion.minZ &&
          motion.maxZ <= highZ &&
          (travel.a === undefined || motion.fromA === motion.toA)
        )
          return;
        if (motion.by === 'change') return;
        visitReaches(motion, travel, unsetAxes(motion, state), (reach) =>
          judge(motion, state, reach),
        );
      },
    };
  },
});

function wordMessage(data: FindingData, lengths: LengthWords): string {
  const axis = text(data, 'axis');
  const end = sideWord(axis, text(data, 'side'));
  if (axis === 'a')
    return `Turns A ${figure(data, 'by')} degrees past the ${end} end of its travel (${figure(data, 'limit')} degrees).`;
  const by = lengths.length(figure(data, 'by'));
  return `Drives ${axis.toUpperCase()} ${by} past the ${end} travel (${oneLength(lengths, figure(data, 'limit'))}).`;
}

function wordAdvice(data: FindingData, lengths: LengthWords): string {
  const axis = text(data, 'axis');
  const by = lengths.length(figure(data, 'by'));
  if (axis === 'a') return 'Turn A back within its travel, or post the program with a rewind.';
  if (text(data, 'moved') === 'machine')
    return `Write a machine coordinate inside the travel; moving work zero does not change this move.`;
  if (axis === 'z' && text(data, 'side') === 'high')
    return `Retract at least ${by} lower, or move work zero at least ${by} down if the work-zero window allows it.`;
  return `Move work zero at least ${by} ${awayWord(axis, text(data, 'side'))}, if the work-zero window of this report allows it.`;
}
