import { LIMIT_SLACK, NEAR_LIMIT } from '../geometry/tolerance';
import type { MachineState } from '../interpreter/events';
import { figure, text } from './finding-data';
import { unsetAxes } from './placing';
import { defineRule } from './rule';
import { oneLength, sideWord, visitReaches, type Reach } from './travel-sides';

/** A program coordinate that ends so near an end of travel that the next work zero may pass it. */
export const nearTravel = defineRule({
  id: 'near-travel',
  group: 'travel-and-clearance',
  title: 'The move comes within a millimetre of the end of travel',
  severity: 'note',
  protects: 'The run from an overtravel stop after work zero has been set afresh.',
  explanation:
    'A move in program coordinates that ends less than 1 mm inside a limit still fits, but the next touch-off may move it past. Machine coordinates and home positions are meant to be there and are left out.',
  examples: {
    bad: 'G21 G90 G17 G54\nT1 M6\nG43 H1\nG0 X1269.5 Y10\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nG43 H1\nG0 X1268 Y10\nM30',
  },
  word: (data, lengths) => ({
    message: `Comes within ${lengths.length(figure(data, 'left'))} of the ${sideWord(text(data, 'axis'), text(data, 'side'))} travel of ${text(data, 'axis').toUpperCase()} (${oneLength(lengths, figure(data, 'limit'))}).`,
    advice: 'Set work zero again with care, or move it a few millimetres inwards.',
  }),
  observe: (shop, report) => {
    const { travel } = shop.setup.machine;
    const [lowX, highX] = [travel.x[0] + NEAR_LIMIT, travel.x[1] - NEAR_LIMIT];
    const [lowY, highY] = [travel.y[0] + NEAR_LIMIT, travel.y[1] - NEAR_LIMIT];
    const [lowZ, highZ] = [travel.z[0] + NEAR_LIMIT, travel.z[1] - NEAR_LIMIT];
    const judge = (state: MachineState, { axis, side, at, limit }: Reach) => {
      if (axis === 'a') return;
      const left = side === 'low' ? at - limit : limit - at;
      if (!(-LIMIT_SLACK <= left && left < NEAR_LIMIT)) return;
      report.found(
        {
          cause: `${axis} ${side}`,
          by: NEAR_LIMIT - left,
          at: state.place({ letters: axis.toUpperCase() }),
          data: { axis, side, left: Math.max(0, left), at, limit },
        },
        state,
      );
    };
    return {
      quiet({ feed, rapid }) {
        for (const room of [feed, rapid])
          room.within({ x: [lowX, highX], y: [lowY, highY], z: [lowZ, highZ] });
      },
      motion(motion, state) {
        if (
          lowX <= motion.minX &&
          motion.maxX <= highX &&
          lowY <= motion.minY &&
          motion.maxY <= highY &&
          lowZ <= motion.minZ &&
          motion.maxZ <= highZ
        )
          return;
        if (motion.by !== 'program' && motion.by !== 'cycle') return;
        visitReaches(motion, travel, unsetAxes(motion, state), (reach) => judge(state, reach));
      },
    };
  },
});
