import type { Pocket, Setup, Tool } from './setup';

/** A setup with the look-ups every rule needs, worked out once. Nothing here changes during a check. */
export interface Shop {
  readonly setup: Setup;
  readonly toolByNumber: ReadonlyMap<number, Tool>;
  readonly pocketByNumber: ReadonlyMap<number, Pocket>;
  /** The pockets a tool belongs in; more than one is itself a finding. */
  readonly pocketsOfTool: ReadonlyMap<number, readonly number[]>;
  readonly toolOfPocket: ReadonlyMap<number, number>;
  readonly fittedByHand: ReadonlySet<number>;
}

export function openShop(setup: Setup): Shop {
  const pocketsOfTool = new Map<number, number[]>();
  for (const { pocket, tool } of setup.loading.pockets) {
    const pockets = pocketsOfTool.get(tool);
    if (pockets) pockets.push(pocket);
    else pocketsOfTool.set(tool, [pocket]);
  }
  return {
    setup,
    toolByNumber: new Map(setup.tools.map((tool) => [tool.number, tool])),
    pocketByNumber: new Map(setup.rack.pockets.map((pocket) => [pocket.number, pocket])),
    pocketsOfTool,
    toolOfPocket: new Map(setup.loading.pockets.map(({ pocket, tool }) => [pocket, tool])),
    fittedByHand: new Set(setup.loading.byHand),
  };
}
