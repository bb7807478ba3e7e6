import { boundsOfAll, boxPrism, cylinderPrism, meetingRegion, type Prism } from '../geometry/prism';
import { openSpan } from '../geometry/span';
import { findBoxSpan, findSpan, isApart } from '../geometry/sweep';
import type { Observer } from '../interpreter/events';
import type { Body, Pocket } from '../shop/setup';
import type { Shop } from '../shop/shop';
import type { Report } from './report';

/**
 * What the result rests on: the tools used, their pockets and the ones beside them, every pocket that a
 * moving body passes over or near, the work offsets in force for program coordinates, and the changes
 * asked for, each pair once, 0 standing for nothing or not known.
 */
export function watchDependsOn(shop: Shop): Observer & { result(): Report['dependsOn'] } {
  const tools = new Set<number>();
  const offsets = new Set<string>();
  const pairs = new Map<string, readonly [number, number]>();
  const passed = new Set<number>();
  const span = openSpan();
  const isBoxed = shop.setup.controller.rapids === 'independent';
  let near = areasNear(shop);
  let all = boundsOfAll(near.map((each) => each.area));
  let workOffset = '';
  return {
    toolChanged(event) {
      const from = event.from.number ?? 0;
      const to = event.to ?? 0;
      if (to > 0) tools.add(to);
      pairs.set(`${from} ${to}`, [from, to]);
    },
    quiet({ feed, rapid }, state) {
      const isNew = workOffset !== state.workOffset || (tools.size === 0 && state.held.number);
      if (isNew) feed.close();
      if (isNew) rapid.close();
      feed.apartFrom(all, state.x, state.y, state.z);
      rapid.apartFrom(all, state.x, state.y, state.z);
    },
    motion(motion, state) {
      if (!motion.moves) return;
      if (workOffset !== state.workOffset && motion.by === 'program') {
        workOffset = state.workOffset;
        offsets.add(workOffset);
      }
      if (tools.size === 0 && state.held.number) tools.add(state.held.number);
      if (isApart(motion, all)) return;
      const isBox = isBoxed && motion.kind === 'rapid';
      for (const { pocket, area } of near) {
        if (isBox ? findBoxSpan(motion, area, span) : findSpan(motion, area, span))
          passed.add(pocket);
      }
      near = near.filter((each) => !passed.has(each.pocket));
      all = boundsOfAll(near.map((each) => each.area));
    },
    result() {
      const used = [...tools].flatMap((tool) => shop.pocketsOfTool.get(tool) ?? []);
      const beside = used.flatMap((pocket) => neighbours(shop, pocket));
      return {
        tools: inOrder(tools),
        pockets: inOrder(new Set([...used, ...beside, ...passed])),
        offsets: [...offsets].sort(),
        pairs: [...pairs.values()],
      };
    },
  };
}

function inOrder(numbers: ReadonlySet<number>): readonly number[] {
  return [...numbers].sort((one, other) => one - other);
}

/** The pockets next to one along the rack. */
function neighbours(shop: Shop, number: number): readonly number[] {
  const { edge, pockets } = shop.setup.rack;
  const along = edge === 'front' || edge === 'back' ? 'x' : 'y';
  const row = [...pockets].sort((one, other) => one.grip[along] - other.grip[along]);
  const at = row.findIndex((pocket) => pocket.number === number);
  return [row[at - 1], row[at + 1]]
    .filter((pocket) => pocket !== undefined)
    .map((each) => each.number);
}

/** For each pocket, where the gauge point brings a part of the machine over it or its channel. */
function areasNear(shop: Shop): readonly { readonly pocket: number; readonly area: Prism }[] {
  const { machine, rack, tools } = shop.setup;
  const widest = Math.max(0, ...tools.map((tool) => Math.max(tool.diameter, tool.holder.diameter)));
  const held = cylinderPrism({ x: 0, y: 0 }, widest / 2, [-Infinity, Infinity]);
  const bodies = [...machine.bodies.map(anyHeight), held];
  return rack.pockets.flatMap((pocket) =>
    bodies.map((body) => ({
      pocket: pocket.number,
      area: meetingRegion(pocketArea(pocket, rack.slideOut), body),
    })),
  );
}

function pocketArea({ grip, largestDiameter }: Pocket, slideOut: number): Prism {
  const reach = largestDiameter / 2 + slideOut;
  return boxPrism({
    min: { x: grip.x - reach, y: grip.y - reach },
    max: { x: grip.x + reach, y: grip.y + reach },
  });
}

/** A body at whatever height; a gantry spans all X. */
function anyHeight({ box: { min, max }, rides }: Body): Prism {
  const spansX = rides === 'gantry';
  return boxPrism({
    min: { x: spansX ? undefined : min.x, y: min.y },
    max: { x: spansX ? undefined : max.x, y: max.y },
  });
}
