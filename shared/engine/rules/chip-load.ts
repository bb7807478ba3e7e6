import { openSpan } from '../geometry/span';
import type { MachineState } from '../interpreter/events';
import { Material } from '../shop/material';
import type { Shop } from '../shop/shop';
import { figure, toolWords } from './finding-data';
import { defineRule } from './rule';

/** Feed per tooth outside the band that the shop allows for this kind of tool. */
export const chipLoad = defineRule({
  id: 'chip-load',
  group: 'spindle-and-feed',
  title: 'Feed per tooth outside the shop’s band',
  severity: 'note',
  protects: 'The cutter from breaking above the band, and the work from burning below it.',
  explanation:
    'Feed per tooth is feed over speed times flutes. The bands are the shop’s own, by kind of tool and, where stated, material; without one nothing is judged. Only level feed moves in the stock count: plunges, ramps and arcs, which controllers slow, are left out.',
  examples: {
    setup: { policy: { chipLoad: [{ kind: 'end-mill', from: 0.05, to: 0.3 }] } },
    bad: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5\nG1 Z-5 F1000\nG1 X100\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5\nG1 Z-5 F1000\nG1 X100 F3600\nM30',
  },
  word: (data, lengths) => ({
    message: `${toolWords(data)} cuts with ${lengths.length(figure(data, 'load'))} a tooth; the shop’s band is ${lengths.length(figure(data, 'from'))} to ${lengths.length(figure(data, 'to'))}.`,
    advice:
      figure(data, 'load') < figure(data, 'from')
        ? 'Feed faster or turn slower, within what tool and spindle allow.'
        : 'Feed slower or turn faster, within what tool and spindle allow.',
  }),
  observe: (shop, report) => {
    if (shop.setup.policy.chipLoad.length === 0) return {};
    const material = new Material(shop);
    const span = openSpan();
    return {
      // What is asked of every motion here is its feed, so none in the stock is quiet.
      quiet({ feed }, state) {
        material.keepClear(feed, state);
      },
      motion(motion, state) {
        const { tool } = state.held;
        if (motion.kind !== 'feed' || !tool?.flutes || motion.fromZ !== motion.toZ) return;
        if (state.turning === 'off' || !(state.speed > 0) || !motion.moves) return;
        // Work that turns under the tool runs past it faster than F says.
        if (motion.fromA !== motion.toA) return;
        const band = bandFor(shop, state);
        const load = motion.feed / (state.speed * tool.flutes);
        if (!band || (band.from <= load && load <= band.to)) return;
        if (!material.isMet(motion, state, span)) return;
        const isLow = load < band.from;
        report.found(
          {
            cause: isLow ? 'low' : 'high',
            by: isLow ? band.from - load : load - band.to,
            at: state.place({ letters: 'F' }),
            data: { tool: tool.number, name: tool.name, load, from: band.from, to: band.to },
          },
          state,
        );
      },
    };
  },
});

/** The band for this material before the one for any. */
function bandFor(shop: Shop, state: MachineState) {
  const kind = state.held.tool?.kind;
  const material = shop.setup.job?.stock?.material;
  const bands = shop.setup.policy.chipLoad.filter((band) => band.kind === kind);
  return (
    bands.find((band) => band.material !== undefined && band.material === material) ??
    bands.find((band) => band.material === undefined)
  );
}
