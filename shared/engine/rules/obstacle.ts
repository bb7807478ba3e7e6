import type { MachineState } from '../interpreter/events';
import { pairUp, worstContact, type Meetings, keepApart } from '../shop/meetings';
import type { Tool } from '../shop/setup';
import type { Shop } from '../shop/shop';
import { bodySolids, obstacleSolid, toolSolids } from '../shop/solids';
import { openWorkFrames } from '../shop/work-frames';
import { bootAfter } from './boot-state';
import { contactCause, contactData, wordMoving } from './contact-words';
import { figure, has, text } from './finding-data';
import { isPlaced, movedWords } from './placing';
import { defineRule } from './rule';

/** The head runs into a clamp or pod of the job sheet. */
export const obstacle = defineRule({
  id: 'obstacle',
  group: 'travel-and-clearance',
  title: 'The head runs into an obstacle of the job sheet',
  severity: 'stop',
  protects: 'The clamp, the cutter, and the work that the clamp holds.',
  explanation:
    'Clamps, pods and stops of the job sheet stand where their work offset puts them. Every part that moves with the head is swept against them along every motion, by the tool’s real length. What the job sheet does not list is not seen.',
  examples: {
    setup: {
      job: {
        obstacles: [
          {
            name: 'front clamp',
            in: 'G54',
            box: { min: { x: 200, y: -20, z: -18 }, max: { x: 260, y: 40, z: 25 } },
          },
        ],
      },
    },
    bad: 'G21 G90 G17 G54\nT1 M6\nG43 H1\nG0 X100 Y20 Z10\nG0 X400\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nG43 H1\nG0 X100 Y20 Z30\nG0 X400\nM30',
  },
  word: (data, lengths) => ({
    message: `${wordMoving(data)} runs into the obstacle ${text(data, 'name')}.`,
    advice:
      has(data, 'raise') && data['canRaise'] === true
        ? `Run this move at least ${lengths.length(figure(data, 'raise'))} higher, or set the obstacle out of the way and change the job sheet.`
        : 'Lead the move around it, or set the obstacle out of the way and change the job sheet.',
  }),
  observe: (shop, report) => {
    if (!shop.setup.job || shop.setup.job.obstacles.length === 0) return {};
    const placed = openObstacles(shop);
    const isBoxed = shop.setup.controller.rapids === 'independent';
    return {
      deed: (event) => placed.setBoot(bootAfter(event, placed.isBootDown())),
      quiet(quiet, state) {
        keepApart(quiet.rooms, placed.meetings(state), state);
      },
      motion(motion, state) {
        if (motion.by === 'change') return;
        const contact = worstContact(
          motion,
          placed.meetings(state),
          isBoxed && motion.kind === 'rapid',
        );
        if (!contact || !isPlaced(motion, state)) return;
        report.found(
          {
            cause: contactCause(contact),
            by: contact.raise,
            at: state.place(movedWords(motion)),
            data: contactData(contact, motion, shop.setup),
          },
          state,
        );
      },
    };
  },
});

/** The obstacles against the head, placed again when tool, boot or work offset change. */
function openObstacles(shop: Shop) {
  const frames = openWorkFrames(shop);
  const obstacles = shop.setup.job?.obstacles ?? [];
  let isBootDown = true;
  let isStale = true;
  let tool: Tool | undefined;
  let originX: number | undefined;
  let originY: number | undefined;
  let originZ: number | undefined;
  let workOffset = '';
  let meetings: Meetings = pairUp([], []);
  const hasMoved = (state: MachineState) =>
    isStale ||
    state.held.tool !== tool ||
    state.originX !== originX ||
    state.originY !== originY ||
    state.originZ !== originZ ||
    state.workOffset !== workOffset;
  return {
    isBootDown: () => isBootDown,
    setBoot(isDown: boolean) {
      isStale ||= isDown !== isBootDown;
      isBootDown = isDown;
    },
    meetings(state: MachineState): Meetings {
      if (!hasMoved(state)) return meetings;
      isStale = false;
      ({ originX, originY, originZ, workOffset } = state);
      tool = state.held.tool;
      const moving = [
        ...bodySolids(shop.setup.machine, isBootDown).filter((solid) => solid.rides === 'head'),
        ...(tool ? toolSolids(tool) : []),
      ];
      const standing = obstacles.map((each) => obstacleSolid(each, frames.origin(each.in, state)));
      meetings = pairUp(moving, standing);
      return meetings;
    },
  };
}
