import type { ToolRecord, Units } from '#contracts';
import type { Loading, Pocket, Rack } from '#engine';
import { pocketOf } from './loading-edits';
import { wordMisfit } from './misfit-words';
import { findMisfits } from './pocket-fit';
import { sizeOf } from './pocket-rows';

/** A tool as it is offered for a pocket. */
export interface ToolOffer {
  readonly number: number;
  readonly name: string;
  readonly kind: string;
  readonly size: string;
  /** Where it is now, in words. */
  readonly place: string;
  readonly refused: boolean;
  /** What is against it; empty: it fits. */
  readonly against: readonly { readonly severity: 'stop' | 'hold'; readonly sentence: string }[];
}

export interface OfferRequest {
  readonly records: readonly ToolRecord[];
  readonly loading: Loading;
  readonly rack: Rack;
  readonly machineId: string;
  /** The pocket to fill; null: a tool fitted by hand, which any is. */
  readonly pocket: Pocket | null;
  readonly units: Units;
}

/** All tools but the one that stands there, those that fit first, then by number. */
export function offerTools(request: OfferRequest): readonly ToolOffer[] {
  const { pocket, loading } = request;
  const there = loading.pockets.find((each) => each.pocket === pocket?.number)?.tool;
  return request.records
    .filter(({ tool }) => tool.number !== there)
    .filter(({ tool }) => pocket !== null || !loading.byHand.includes(tool.number))
    .map((record) => offer(record, request))
    .toSorted(
      (one, other) =>
        Number(one.refused) - Number(other.refused) ||
        Math.sign(one.against.length) - Math.sign(other.against.length) ||
        one.number - other.number,
    );
}

/**
 * Offers in which every word of the search stands: "T4", "6 mm", "comp". The tool whose number was
 * typed comes first.
 */
export function searchOffers(offers: readonly ToolOffer[], search: string): readonly ToolOffer[] {
  const words = search.toLowerCase().split(/\s+/).filter(Boolean);
  const found = offers.filter((each) => {
    const { number, name, kind, size, place } = each;
    const text = `t${number} ${name} ${kind} ${size} ${place}`.toLowerCase();
    return words.every((word) => text.includes(word));
  });
  const typed = Number(/^t?(\d+)$/.exec(words.join(''))?.[1]);
  const isTyped = (each: ToolOffer) => Number(each.number === typed);
  return found.toSorted((one, other) => isTyped(other) - isTyped(one));
}

function offer(record: ToolRecord, request: OfferRequest): ToolOffer {
  const { tool } = record;
  const standing = {
    rack: request.rack,
    loading: withoutPocket(request.loading, request.pocket?.number),
    tools: new Map(request.records.map((each) => [each.tool.number, each.tool])),
  };
  const misfits = request.pocket ? findMisfits(tool, request.pocket, standing) : [];
  return {
    number: tool.number,
    name: tool.name,
    kind: tool.kind,
    size: sizeOf(tool, request.units),
    place: wordPlace(record, request),
    refused: misfits.some((each) => each.severity === 'refused'),
    against: misfits.map((each) => ({
      severity: each.severity === 'hold' ? ('hold' as const) : ('stop' as const),
      sentence: wordMisfit(each, request.units),
    })),
  };
}

/** The tool that makes room does not crowd the one that comes. */
function withoutPocket(loading: Loading, pocket: number | undefined): Loading {
  return { ...loading, pockets: loading.pockets.filter((each) => each.pocket !== pocket) };
}

function wordPlace(record: ToolRecord, request: OfferRequest): string {
  const { number } = record.tool;
  const here = pocketOf(request.loading, number);
  const elsewhere = record.places
    .filter((place) => place.machineId !== request.machineId)
    .map((place) => `pocket ${place.pocket} of ${place.machine}`);
  const words = [
    ...(here === undefined ? [] : [`pocket ${here} here`]),
    ...(request.loading.inSpindle === number ? ['in the spindle'] : []),
    ...(request.loading.byHand.includes(number) ? ['fitted by hand'] : []),
    ...elsewhere,
  ];
  return words.length === 0 ? 'in no pocket' : words.join(', ');
}
