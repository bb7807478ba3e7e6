import { boxPrism, cylinderPrism, meetingRegion, movePrism, type Prism } from '../geometry/prism';
import type { Body, Machine, OpenBox, Opening, Pocket, Rack, Tool, Zone } from './setup';
import type { Shop } from './shop';

/** Something solid that moves with the gauge point; its prism is relative to it. */
export interface MovingSolid {
  /** 'holder' and 'tool' of the held tool; 'body' of the machine, by its name. */
  readonly part: 'holder' | 'tool' | 'body';
  readonly name: string;
  /** The tool it belongs to. */
  readonly tool: number | null;
  readonly rides: Body['rides'];
  readonly prism: Prism;
}
/** Something solid that stands still, in machine coordinates. */
export interface StandingSolid {
  readonly thing: 'rack' | 'fork' | 'parked' | 'zone' | 'obstacle';
  readonly name: string;
  readonly pocket: number | null;
  /** The parked tool. */
  readonly tool: number | null;
  readonly prism: Prism;
}

const AXIS = { x: 0, y: 0 };

/** A held tool from the gauge line down: the holder by its steps, then shank, then flutes. */
export function toolSolids(tool: Tool): readonly MovingSolid[] {
  const face = -(tool.gaugeLength - tool.stickOut);
  const tip = -tool.gaugeLength;
  const shankEnd = Math.min(face, tip + tool.fluteLength);
  const solid = (part: 'holder' | 'tool', diameter: number, low: number, high: number) =>
    ({
      part,
      name: part,
      tool: tool.number,
      rides: 'head',
      prism: cylinderPrism(AXIS, diameter / 2, [low, high]),
    }) as const;
  const solids: MovingSolid[] = holderSteps(tool).map(({ diameter, low, high }) =>
    solid('holder', diameter, low, high),
  );
  if (shankEnd < face) solids.push(solid('tool', tool.shank, shankEnd, face));
  if (tip < shankEnd) solids.push(solid('tool', tool.diameter, tip, shankEnd));
  return solids;
}

/** The cutting part alone: what a zone that only forbids the tip is about. */
export function tipSolids(tool: Tool): readonly MovingSolid[] {
  return toolSolids(tool).filter((solid) => solid.part === 'tool');
}

function holderSteps(tool: Tool): readonly { diameter: number; low: number; high: number }[] {
  const face = -(tool.gaugeLength - tool.stickOut);
  const { steps, diameter } = tool.holder;
  if (steps.length === 0) return face < 0 ? [{ diameter, low: face, high: 0 }] : [];
  let high = 0;
  return steps.map((step) => {
    const low = high - step.length;
    const placed = { diameter: step.diameter, low, high };
    high = low;
    return placed;
  });
}

/** The machine's own bodies; a boot that lifts or docks only while it is down. */
export function bodySolids(machine: Machine, isBootDown: boolean): readonly MovingSolid[] {
  return machine.bodies
    .filter((body) => isBootDown || body.boot === undefined || body.boot === 'stays')
    .map((body) => ({
      part: 'body',
      name: body.name,
      tool: null,
      rides: body.rides,
      prism: boxPrism(body.box),
    }));
}

/** Rack bodies and the fork plate of each pocket. */
export function rackSolids(rack: Rack): readonly StandingSolid[] {
  return [
    ...rack.bodies.map((body) => ({
      thing: 'rack' as const,
      name: body.name,
      pocket: null,
      tool: null,
      prism: boxPrism(body.box),
    })),
    ...rack.pockets.map((pocket) => ({
      thing: 'fork' as const,
      name: `fork of pocket ${pocket.number}`,
      pocket: pocket.number,
      tool: null,
      prism: forkPlate(rack, pocket),
    })),
  ];
}

/**
 * The plate around a pocket's grip: `reach` out to the tine ends, and as much behind, where the
 * tines join. What carries it farther back is a rack body of its own.
 */
export function forkPlate(rack: Rack, pocket: Pocket): Prism {
  const { fork } = rack;
  const top = pocket.grip.z - fork.below;
  const half = fork.width / 2;
  const across = openingAlong(pocket.opens) === 'x' ? 'y' : 'x';
  const size = across === 'x' ? { x: half, y: fork.reach } : { x: fork.reach, y: half };
  return boxPrism({
    min: { x: pocket.grip.x - size.x, y: pocket.grip.y - size.y, z: top - fork.thickness },
    max: { x: pocket.grip.x + size.x, y: pocket.grip.y + size.y, z: top },
  });
}

export function openingAlong(opens: Opening): 'x' | 'y' {
  return opens === '+x' || opens === '-x' ? 'x' : 'y';
}

/**
 * The holders that stand in the forks while `held` is in the spindle: every listed tool but that one;
 * every listed tool while it is not known which is out (any fork may then be full).
 */
export function parkedSolids(shop: Shop, held: number | null): readonly StandingSolid[] {
  const solids: StandingSolid[] = [];
  for (const { pocket: number, tool: toolNumber } of shop.setup.loading.pockets) {
    const pocket = shop.pocketByNumber.get(number);
    if (!pocket || toolNumber === held) continue;
    const tool = shop.toolByNumber.get(toolNumber);
    for (const prism of tool ? parkedPrisms(tool) : [unknownHolder(pocket)]) {
      solids.push({
        thing: 'parked',
        name: `pocket ${number}`,
        pocket: number,
        tool: toolNumber,
        prism: movePrism(prism, pocket.grip.x, pocket.grip.y, pocket.grip.z),
      });
    }
  }
  return solids;
}

/** Taper and pull stud stand over the gauge line; they are taken as wide as the holder. */
function parkedPrisms(tool: Tool): readonly Prism[] {
  const taper = cylinderPrism(AXIS, tool.holder.diameter / 2, [0, tool.holder.above]);
  return [taper, ...toolSolids(tool).map((solid) => solid.prism)];
}

/** A listed tool that is in no tool list: the largest holder its pocket takes. */
function unknownHolder(pocket: Pocket): Prism {
  return cylinderPrism(AXIS, pocket.largestDiameter / 2, [-pocket.longest, pocket.longest / 2]);
}

/**
 * Where the gauge point may not be for these two: as meetingRegion for what rides on the head; a
 * carriage keeps its own height, and a gantry spans all X too. Undefined: they can never meet.
 */
export function regionOfMeeting(
  standing: Pick<StandingSolid, 'prism'>,
  moving: MovingSolid,
): Prism | undefined {
  const region = meetingRegion(standing.prism, moving.prism);
  if (moving.rides === 'head') return region;
  const meetsInHeight =
    moving.prism.minZ < standing.prism.maxZ && standing.prism.minZ < moving.prism.maxZ;
  if (!meetsInHeight) return undefined;
  const tall = { ...region, minZ: -Infinity, maxZ: Infinity };
  return moving.rides === 'carriage' ? tall : { ...tall, minX: -Infinity, maxX: Infinity };
}

export function zoneSolid(zone: Zone): StandingSolid {
  return { thing: 'zone', name: zone.name, pocket: null, tool: null, prism: boxPrism(zone.box) };
}

/** A clamp or pod of the job sheet, placed by the origin of its work offset. */
export function obstacleSolid(
  obstacle: { readonly name: string; readonly box: OpenBox },
  origin: { readonly x: number; readonly y: number; readonly z: number },
): StandingSolid {
  return {
    thing: 'obstacle',
    name: obstacle.name,
    pocket: null,
    tool: null,
    prism: movePrism(boxPrism(obstacle.box), origin.x, origin.y, origin.z),
  };
}
