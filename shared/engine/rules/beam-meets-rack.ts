import { boundsOfAll } from '../geometry/prism';
import type { MachineState } from '../interpreter/events';
import { pairUpWhenNear, worstContact, type Meetings, keepApart } from '../shop/meetings';
import { bodySolids, parkedSolids, rackSolids } from '../shop/solids';
import { contactCause, contactData, wordClearing, wordMoving, wordStanding } from './contact-words';
import { isPlaced, movedWords } from './placing';
import { defineRule } from './rule';

/** The gantry or carriage passes over the rack lower than what stands in it. */
export const beamMeetsRack = defineRule({
  id: 'beam-meets-rack',
  group: 'travel-and-clearance',
  title: 'The gantry meets the rack',
  severity: 'stop',
  protects: 'The parked holders, the rack and the gantry.',
  explanation:
    'Bodies that ride on the gantry or the carriage keep their own height whatever Z does, so no retract clears them. They are held against the rack bodies, the fork plates and the parked holders on every motion outside a change; while it is not known which tool is in the spindle, every listed pocket counts as full.',
  examples: {
    setup: {
      machine: {
        bodies: [
          {
            name: 'beam',
            rides: 'gantry',
            box: { min: { y: 80, z: -60 }, max: { y: 240, z: 160 } },
          },
        ],
      },
    },
    bad: 'G21 G90 G17 G54\nT1 M6\nG53 G0 Z0\nG53 G0 Y2460\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nG53 G0 Z0\nG53 G0 Y2280\nM30',
  },
  word: (data, lengths) => ({
    message: `${wordMoving(data)} runs into ${wordStanding(data)}.`,
    advice: wordClearing(data, lengths),
  }),
  observe: (shop, report) => {
    const moving = bodySolids(shop.setup.machine, true).filter((solid) => solid.rides !== 'head');
    if (moving.length === 0) return {};
    const rack = rackSolids(shop.setup.rack);
    const around = boundsOfAll([...rack, ...parkedSolids(shop, null)].map(({ prism }) => prism));
    const pairWith = (held: number | null): Meetings =>
      pairUpWhenNear(moving, around, () => [...rack, ...parkedSolids(shop, held)]);
    let held: number | null = null;
    let meetings = pairWith(held);
    const meetingsWith = (state: MachineState) => {
      if (state.held.number !== held) {
        held = state.held.number;
        meetings = pairWith(held);
      }
      return meetings;
    };
    return {
      quiet(quiet, state) {
        keepApart(quiet.rooms, meetingsWith(state), state);
      },
      motion(motion, state) {
        if (motion.by === 'change') return;
        const contact = worstContact(motion, meetingsWith(state), false);
        if (!contact || !isPlaced(motion, state)) return;
        report.found(
          {
            cause: contactCause(contact),
            at: state.place(movedWords(motion)),
            data: contactData(contact, motion, shop.setup),
          },
          state,
        );
      },
    };
  },
});
