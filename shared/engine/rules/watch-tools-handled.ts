import type { MachineState, Observer, Place } from '../interpreter/events';
import type { Tool } from '../shop/setup';
import type { Shop } from '../shop/shop';

/** A tool that a change fetches or puts away, the first time it is handled. */
export interface HandledTool {
  readonly tool: Tool;
  readonly place: Place;
  /** Pockets it belongs in. */
  readonly pockets: readonly number[];
}

/**
 * For the rules that hold a tool against its pocket: each tool once, at the first change that fetches
 * it or puts it away, which is the first block that relies on what the setup says of it.
 */
export function watchToolsHandled(
  shop: Shop,
  judge: (handled: HandledTool, state: MachineState) => void,
): Observer {
  const seen = new Set<number>();
  return {
    toolChanging(event, state) {
      for (const tool of [event.tool, event.from.tool]) {
        if (!tool || seen.has(tool.number)) continue;
        seen.add(tool.number);
        const pockets = shop.pocketsOfTool.get(tool.number) ?? [];
        judge({ tool, place: event.place, pockets }, state);
      }
    },
  };
}
