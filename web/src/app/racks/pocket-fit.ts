import type { Loading, Pocket, Rack, Tool } from '#engine';

/**
 * Whether a tool fits a pocket, as the rules of a check judge it: `refused` cannot stand there,
 * `stop` would stop every program that rests on this pocket, `hold` wants a look.
 */
export interface Misfit {
  readonly severity: 'refused' | 'stop' | 'hold';
  readonly what: 'taper' | 'wide' | 'long' | 'heavy' | 'neighbour';
  readonly data: { readonly is: number; readonly limit: number; readonly other?: number };
  readonly words?: string;
}
export interface Standing {
  readonly rack: Rack;
  readonly loading: Loading;
  readonly tools: ReadonlyMap<number, Tool>;
}

export function findMisfits(tool: Tool, pocket: Pocket, standing: Standing): readonly Misfit[] {
  const misfits: Misfit[] = [];
  if (!isSameTaper(tool.holder.taper, pocket.taper)) {
    misfits.push({
      severity: 'refused',
      what: 'taper',
      data: { is: 0, limit: 0 },
      words: `Its holder is ${tool.holder.taper}, pocket ${pocket.number} is cut for ${pocket.taper}.`,
    });
  }
  const width = widthOf(tool);
  if (!(width <= pocket.largestDiameter)) {
    misfits.push(misfit('stop', 'wide', width, pocket.largestDiameter));
  }
  if (!(tool.gaugeLength <= pocket.longest)) {
    misfits.push(misfit('stop', 'long', tool.gaugeLength, pocket.longest));
  }
  if (tool.mass !== undefined && pocket.heaviest !== undefined && pocket.heaviest < tool.mass) {
    misfits.push(misfit('hold', 'heavy', tool.mass, pocket.heaviest));
  }
  return [...misfits, ...findCrowding(tool, pocket, standing)];
}

/** Written differently, meant the same: "HSK-F63" and "hsk f63". */
export function isSameTaper(one: string, other: string): boolean {
  const plain = (taper: string) => taper.toLowerCase().replace(/[\s-]/g, '');
  return plain(one) === plain(other);
}

export function widthOf(tool: Tool): number {
  const steps = tool.holder.steps.map((step) => step.diameter);
  return Math.max(tool.diameter, tool.shank, tool.holder.diameter, ...steps);
}

/** Parked side by side, two tools need the sum of their radii between their axes. */
function findCrowding(tool: Tool, pocket: Pocket, standing: Standing): readonly Misfit[] {
  return standing.loading.pockets.flatMap((each) => {
    if (each.pocket === pocket.number || each.tool === tool.number) return [];
    const other = standing.tools.get(each.tool);
    const place = standing.rack.pockets.find((one) => one.number === each.pocket);
    if (!other || !place) return [];
    const apart = Math.hypot(place.grip.x - pocket.grip.x, place.grip.y - pocket.grip.y);
    const needed = (widthOf(tool) + widthOf(other)) / 2;
    if (needed <= apart) return [];
    return [
      {
        severity: 'stop' as const,
        what: 'neighbour' as const,
        data: { is: needed, limit: apart, other: each.tool },
      },
    ];
  });
}

function misfit(
  severity: Misfit['severity'],
  what: Misfit['what'],
  is: number,
  limit: number,
): Misfit {
  return { severity, what, data: { is, limit } };
}
