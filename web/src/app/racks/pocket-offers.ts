import type { Units } from '#contracts';
import type { Loading, Rack, Tool } from '#engine';
import { applyEdits, toolIn } from './loading-edits';
import { wordTool } from './loading-words';
import { wordMisfit } from './misfit-words';
import type { PocketOffer } from './pocket-chooser';
import { findMisfits } from './pocket-fit';

interface Request {
  readonly from: number;
  readonly tool: number;
  readonly rack: Rack;
  readonly loading: Loading;
  readonly tools: ReadonlyMap<number, Tool>;
  readonly units: Units;
}

/** Every other pocket as a place for the tool of pocket `from`, judged as both would then stand. */
export function offerPockets(request: Request): readonly PocketOffer[] {
  return request.rack.pockets
    .filter((each) => each.number !== request.from)
    .toSorted((one, other) => one.number - other.number)
    .map((pocket) => {
      const there = toolIn(request.loading, pocket.number);
      const after = applyEdits(request.loading, [
        { act: 'swap', pocket: request.from, with: pocket.number },
      ]);
      const misfits = [
        ...misfitsAt(request.tool, pocket.number, after, request),
        ...(there === undefined ? [] : misfitsAt(there, request.from, after, request)),
      ];
      return {
        pocket: pocket.number,
        words:
          there === undefined ? 'empty' : `changes places with ${wordTool(there, request.tools)}`,
        against: misfits.map((each) => wordMisfit(each, request.units)),
        refused: misfits.some((each) => each.severity === 'refused'),
      };
    });
}

function misfitsAt(number: number, pocket: number, loading: Loading, request: Request) {
  const tool = request.tools.get(number);
  const place = request.rack.pockets.find((each) => each.number === pocket);
  if (!tool || !place) return [];
  return findMisfits(tool, place, { rack: request.rack, loading, tools: request.tools });
}
