import type { Tool } from '../shop/setup';
import type { Shop } from '../shop/shop';

/** Two lengths of one tool agree within this (mm): what a good setter repeats, several times over. */
export const LENGTH_AGREES = 0.05;

/**
 * What the table should hold for a tool: gauge length less the reference. Undefined where the table
 * holds touch-off values, which cannot be told from the length alone.
 */
export function trueOffset(shop: Shop, tool: Tool | undefined): number | undefined {
  const { lengthScheme, lengthReference } = shop.setup.controller;
  const isTrueLength = lengthScheme === 'from-nose' || lengthScheme === 'from-master';
  return tool && isTrueLength ? tool.gaugeLength - lengthReference : undefined;
}

export function lengthInTable(shop: Shop, number: number): number | undefined {
  return shop.setup.offsets.length[String(number)];
}
