import { boundsOfAll } from '../geometry/prism';
import type { HeldTool } from '../interpreter/events';
import { pairUp, worstContact, type Meetings, keepApart, pairUpWhenNear } from '../shop/meetings';
import type { Tool } from '../shop/setup';
import type { Shop } from '../shop/shop';
import { bodySolids, parkedSolids, rackSolids, toolSolids } from '../shop/solids';
import { bootAfter } from './boot-state';
import { contactCause, contactData, wordClearing, wordMoving, wordStanding } from './contact-words';
import { figure, has } from './finding-data';
import { isPlaced, movedWords } from './placing';
import { defineRule } from './rule';

/** The head or the held tool runs into the rack, outside a change. */
export const entersRack = defineRule({
  id: 'enters-rack',
  group: 'travel-and-clearance',
  title: 'The head runs into the rack',
  severity: 'stop',
  protects: 'The rack, the holders parked in it, the spindle and the tool.',
  explanation:
    'Every part that moves with the head (its bodies, a boot that is down, the holder by its steps, the cutter) is swept along every motion against the rack bodies, the fork plates and the parked holders with their tools, by the real gauge length of the held tool. While it is not known which tool is in the spindle, every listed pocket counts as full and the longest listed tool as held, and what only that tool would touch is a hold. Where rapids are not promised straight, the whole box between their ends counts. Tool changes are judged apart.',
  examples: {
    bad: 'G21 G90 G17 G54\nT1 M6\nG53 G0 X400 Y2500 Z-100\nG53 G0 Y2560\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nG53 G0 X400 Y2300 Z0\nM30',
  },
  word: (data, lengths) => ({
    message: has(data, 'assumed')
      ? `It is not known what the spindle holds; if it is T${figure(data, 'heldTool')}, it runs into ${wordStanding(data)}.`
      : `${wordMoving(data)} runs into ${wordStanding(data)}.`,
    advice: has(data, 'assumed')
      ? 'Look what is in the spindle and enter it in the loading, or keep the move clear of the rack.'
      : wordClearing(data, lengths),
  }),
  observe: (shop, report) => {
    const reach = openRackReach(shop);
    const isBoxed = shop.setup.controller.rapids === 'independent';
    return {
      deed: (event) => reach.setBoot(bootAfter(event, reach.isBootDown())),
      quiet(quiet, state) {
        keepApart(quiet.rooms, reach.meetings(state.held), state);
      },
      motion(motion, state) {
        if (motion.by === 'change') return;
        const meetings = reach.meetings(state.held);
        const isBox = isBoxed && motion.kind === 'rapid';
        const contact = worstContact(motion, meetings, isBox);
        if (!contact || !isPlaced(motion, state)) return;
        const isAssumed = !state.held.known && contact.meeting.moving.part !== 'body';
        report.found(
          {
            cause: contactCause(contact),
            by: contact.raise,
            at: state.place(movedWords(motion)),
            ...(isAssumed ? { severity: 'hold' } : {}),
            data: {
              ...contactData(contact, motion, shop.setup),
              ...(isAssumed ? { assumed: true } : {}),
            },
          },
          state,
        );
      },
    };
  },
});

/** What can meet what, worked out again only when the held tool or the boot changes. */
function openRackReach(shop: Shop) {
  const rack = rackSolids(shop.setup.rack);
  const around = boundsOfAll([...rack, ...parkedSolids(shop, null)].map(({ prism }) => prism));
  const longest = longestListed(shop);
  let isBootDown = true;
  let tool: Tool | undefined;
  let number: number | null = NaN;
  let isKnown = false;
  let meetings: Meetings = pairUp([], []);
  const work = () => {
    const assumed = isKnown ? tool : longest;
    const moving = [
      ...bodySolids(shop.setup.machine, isBootDown).filter((solid) => solid.rides === 'head'),
      ...(assumed ? toolSolids(assumed) : []),
    ];
    const held = isKnown ? number : null;
    meetings = pairUpWhenNear(moving, around, () => [...rack, ...parkedSolids(shop, held)]);
  };
  return {
    isBootDown: () => isBootDown,
    setBoot(isDown: boolean) {
      if (isDown === isBootDown) return;
      isBootDown = isDown;
      work();
    },
    meetings(held: HeldTool): Meetings {
      if (held.number === number && held.tool === tool && held.known === isKnown) return meetings;
      tool = held.tool;
      number = held.number;
      isKnown = held.known;
      work();
      return meetings;
    },
  };
}

function longestListed(shop: Shop): Tool | undefined {
  const listed = [...shop.pocketsOfTool.keys(), ...shop.fittedByHand]
    .map((number) => shop.toolByNumber.get(number))
    .filter((tool) => tool !== undefined);
  return listed.reduce<Tool | undefined>(
    (longest, tool) => (longest && tool.gaugeLength <= longest.gaugeLength ? longest : tool),
    undefined,
  );
}
