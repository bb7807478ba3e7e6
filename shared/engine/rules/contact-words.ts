import { LIMIT_SLACK } from '../geometry/tolerance';
import type { Motion } from '../interpreter/events';
import type { FindingData } from '../report/report';
import type { Rack, Setup } from '../shop/setup';
import type { Contact } from '../shop/meetings';
import type { MovingSolid, StandingSolid } from '../shop/solids';
import { figure, has, text } from './finding-data';
import type { LengthWords } from './rule';

/** Figures and words of a meeting of two solids, shared by the rules that look for one. */
export function contactData(contact: Contact, motion: Motion, setup: Setup): FindingData {
  const { moving, standing, region } = contact.meeting;
  const { raise } = contact;
  return {
    part: moving.part,
    body: moving.name,
    ...(moving.tool === null ? {} : { heldTool: moving.tool }),
    thing: standing.thing,
    name: standing.name,
    ...(standing.pocket === null ? {} : { pocket: standing.pocket }),
    ...(standing.tool === null ? {} : { parkedTool: standing.tool }),
    ...(Number.isFinite(raise) ? { raise } : {}),
    canRaise: motion.minZ + raise <= setup.machine.travel.z[1],
    moved: motion.by,
    ...shiftAway(setup.rack.edge, motion, region),
  };
}

export function contactCause(contact: Contact): string {
  const { moving, standing } = contact.meeting;
  return `${movingKey(moving)} / ${standing.thing} ${standing.name}`;
}
function movingKey(moving: MovingSolid): string {
  return moving.part === 'body' ? moving.name : moving.part;
}

/** How far the whole move would have to lie farther from the rack's edge to clear it (mm). */
function shiftAway(
  edge: Rack['edge'],
  motion: Motion,
  region: { minX: number; minY: number; maxX: number; maxY: number; round: number },
): FindingData {
  const shift = {
    back: motion.maxY - (region.minY - region.round),
    front: region.maxY + region.round - motion.minY,
    right: motion.maxX - (region.minX - region.round),
    left: region.maxX + region.round - motion.minX,
  }[edge];
  return Number.isFinite(shift) && shift > 0 ? { shift: shift + LIMIT_SLACK, edge } : {};
}

export function wordMoving(data: FindingData): string {
  const held = has(data, 'heldTool') ? `T${figure(data, 'heldTool')}` : 'the held tool';
  if (text(data, 'part') === 'holder') return `The holder of ${held}`;
  if (text(data, 'part') === 'tool') return `The cutter of ${held}`;
  return `The ${text(data, 'body')}`;
}

export function wordStanding(data: FindingData): string {
  const thing = text(data, 'thing') as StandingSolid['thing'];
  if (thing === 'fork') return `the fork of pocket ${figure(data, 'pocket')}`;
  if (thing === 'parked')
    return `T${figure(data, 'parkedTool')} in pocket ${figure(data, 'pocket')}`;
  return `the ${text(data, 'name')}`;
}

const AWAY_FROM_EDGE: Readonly<Record<string, string>> = {
  back: 'towards the operator',
  front: 'away from the operator',
  left: 'right',
  right: 'left',
};

/** What clears it: higher where travel allows, else farther from the edge. */
export function wordClearing(data: FindingData, lengths: LengthWords): string {
  const isMachineMove = text(data, 'moved') === 'machine';
  const aside =
    has(data, 'shift') && !isMachineMove
      ? `move work zero at least ${lengths.length(figure(data, 'shift'))} ${AWAY_FROM_EDGE[text(data, 'edge')]}`
      : 'keep the move clear of it';
  if (!has(data, 'raise') || data['canRaise'] !== true) return capital(`${aside}.`);
  return `Run this move at least ${lengths.length(figure(data, 'raise'))} higher, or ${aside}.`;
}
function capital(sentence: string): string {
  return sentence.charAt(0).toUpperCase() + sentence.slice(1);
}
