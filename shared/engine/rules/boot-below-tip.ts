import { LIMIT_SLACK } from '../geometry/tolerance';
import { openSpan } from '../geometry/span';
import { Material } from '../shop/material';
import { bootAfter } from './boot-state';
import { figure, text, toolWords } from './finding-data';
import { defineRule } from './rule';

/** The rigid boot hangs lower than the tip of the tool that cuts. */
export const bootBelowTip = defineRule({
  id: 'boot-below-tip',
  group: 'travel-and-clearance',
  title: 'The boot hangs lower than the tip',
  severity: 'hold',
  hold: 'look',
  protects: 'The boot, the clamps and the work from a boot that touches before the cutter does.',
  explanation:
    'With a tool shorter than the rigid boot is deep, the boot meets the stock before the tip can cut. It is said once for each tool, at its first cut, while the boot is down; bristles bend and do not count.',
  examples: {
    setup: {
      machine: {
        bodies: [
          {
            name: 'boot',
            rides: 'head',
            boot: 'stays',
            box: { min: { x: -70, y: -70, z: -96 }, max: { x: 70, y: 70, z: -60 } },
          },
        ],
      },
    },
    bad: 'G21 G90 G17 G54\nT1 M6\nS18000 M3\nG43 H1\nG0 X50 Y50 Z5\nG1 Z-5 F1000\nM30',
    good: 'G21 G90 G17 G54\nT6 M6\nS18000 M3\nG43 H6\nG0 X50 Y50 Z5\nG1 Z-5 F1000\nM30',
  },
  word: (data, lengths) => ({
    message: `The ${text(data, 'boot')} hangs ${lengths.length(figure(data, 'by'))} lower than the tip of ${toolWords(data)}.`,
    advice: 'Lift or dock the boot for this tool, or hold the tool longer and measure it again.',
  }),
  observe: (shop, report) => {
    const boots = shop.setup.machine.bodies.filter((body) => body.boot && body.rides === 'head');
    if (boots.length === 0) return {};
    const material = new Material(shop);
    const span = openSpan();
    let isDown = true;
    let judged: number | null = null;
    return {
      deed(event) {
        isDown = bootAfter(event, isDown);
      },
      toolChanged() {
        judged = null;
      },
      quiet({ feed }, state) {
        const { tool } = state.held;
        if (tool && judged !== tool.number && state.turning !== 'off')
          material.keepClear(feed, state);
      },
      motion(motion, state) {
        const { tool } = state.held;
        if (!tool || judged === tool.number || state.turning === 'off') return;
        if (motion.kind !== 'feed' && motion.kind !== 'arc') return;
        if (!material.isMet(motion, state, span)) return;
        judged = tool.number;
        for (const boot of boots) {
          if (boot.boot !== 'stays' && !isDown) continue;
          const by = -(boot.box.min.z ?? -Infinity) - tool.gaugeLength;
          if (by <= LIMIT_SLACK || !Number.isFinite(by)) continue;
          const data = { boot: boot.name, by, tool: tool.number, name: tool.name };
          report.found({ cause: boot.name, by, at: state.place({ letters: 'Z' }), data }, state);
        }
      },
    };
  },
});
