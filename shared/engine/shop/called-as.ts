import type { Shop } from './shop';

/** The T value by which a program calls a tool: its number, or its pocket where T names pockets. */
export function calledAs({ setup, pocketsOfTool }: Shop, tool: number): number | undefined {
  if (setup.controller.toolWord === 'tool') return tool;
  return pocketsOfTool.get(tool)?.[0];
}

/** The D number that is a tool's own. */
export function ownDiameterNumber(shop: Shop, tool: number): number | undefined {
  const called = calledAs(shop, tool);
  return called === undefined ? undefined : called + shop.setup.controller.diameterOffsetShift;
}
