import type { HeldTool, Motion } from '../interpreter/events';
import { pairUp, worstContact, type Meetings, keepApart } from '../shop/meetings';
import type { Tool, Zone } from '../shop/setup';
import type { Shop } from '../shop/shop';
import { bodySolids, tipSolids, toolSolids, zoneSolid, type MovingSolid } from '../shop/solids';
import { bootAfter } from './boot-state';
import { contactCause, contactData, wordMoving } from './contact-words';
import { figure, has, text } from './finding-data';
import { isPlaced, movedWords } from './placing';
import { defineRule } from './rule';

/** A part of the machine enters a zone that the machine's description keeps it out of. */
export const entersZone = defineRule({
  id: 'enters-zone',
  group: 'travel-and-clearance',
  title: 'The head enters a forbidden zone',
  severity: 'stop',
  protects: 'What stands in the zone: a tool setter, a vice, a pod, a person’s reach.',
  explanation:
    'Zones forbid everything, everything but tool changes, rapids, or the tip alone (the cutter below its holder). All parts that move are swept along every motion, by the real gauge length of the held tool; while the spindle’s tool is not known, the machine’s bodies alone.',
  examples: {
    setup: {
      machine: {
        zones: [
          {
            name: 'tool setter',
            box: { min: { x: 1240, y: 0, z: -330 }, max: { x: 1300, y: 60, z: -150 } },
            forbids: 'everything',
          },
        ],
      },
    },
    bad: 'G21 G90 G17 G54\nT1 M6\nG53 G0 X1260 Y30 Z0\nG53 G0 Z-80\nM30',
    good: 'G21 G90 G17 G54\nT1 M6\nG53 G0 X1260 Y30 Z0\nG53 G0 Z-50\nM30',
  },
  word: (data, lengths) => ({
    message:
      text(data, 'forbids') === 'rapid'
        ? `${wordMoving(data)} crosses the zone ${text(data, 'name')} at rapid, which forbids it.`
        : `${wordMoving(data)} enters the zone ${text(data, 'name')}, which forbids ${FORBIDS[text(data, 'forbids')] ?? 'it'}.`,
    advice:
      has(data, 'raise') && data['canRaise'] === true
        ? `Run this move at least ${lengths.length(figure(data, 'raise'))} higher, or around the zone.`
        : 'Lead the move around the zone.',
  }),
  observe: (shop, report) => {
    if (shop.setup.machine.zones.length === 0) return {};
    const guarded = openGuardedZones(shop);
    const isBoxed = shop.setup.controller.rapids === 'independent';
    return {
      deed: (event) => guarded.setBoot(bootAfter(event, guarded.isBootDown())),
      quiet(quiet, state) {
        for (const { meetings } of guarded.zones(state.held))
          keepApart(quiet.rooms, meetings, state);
      },
      motion(motion, state) {
        for (const { zone, meetings } of guarded.zones(state.held)) {
          if (!isForbidden(zone, motion)) continue;
          const contact = worstContact(motion, meetings, isBoxed && motion.kind === 'rapid');
          if (!contact || !isPlaced(motion, state)) continue;
          const data = {
            ...contactData(contact, motion, shop.setup),
            forbids: zone.forbids,
          };
          report.found(
            {
              cause: contactCause(contact),
              by: contact.raise,
              at: state.place(movedWords(motion)),
              data,
            },
            state,
          );
        }
      },
    };
  },
});

const FORBIDS: Readonly<Record<string, string>> = {
  everything: 'everything',
  tip: 'the tip',
  'all-but-change': 'everything but a tool change',
};

function isForbidden(zone: Zone, motion: Motion): boolean {
  if (zone.forbids === 'rapid') return motion.kind === 'rapid';
  return motion.by !== 'change' || zone.forbids === 'everything';
}

function openGuardedZones(shop: Shop) {
  const { machine } = shop.setup;
  let isBootDown = true;
  let tool: Tool | undefined;
  let zones = pairZones(undefined, true);
  function pairZones(held: Tool | undefined, isDown: boolean) {
    const all = [...bodySolids(machine, isDown), ...(held ? toolSolids(held) : [])];
    const tip: readonly MovingSolid[] = held ? tipSolids(held) : [];
    return machine.zones.map((zone): { zone: Zone; meetings: Meetings } => ({
      zone,
      meetings: pairUp(zone.forbids === 'tip' ? tip : all, [zoneSolid(zone)]),
    }));
  }
  return {
    isBootDown: () => isBootDown,
    setBoot(isDown: boolean) {
      if (isDown === isBootDown) return;
      isBootDown = isDown;
      zones = pairZones(tool, isBootDown);
    },
    zones(held: HeldTool) {
      if (held.tool !== tool) {
        tool = held.tool;
        zones = pairZones(tool, isBootDown);
      }
      return zones;
    },
  };
}
