import type { ToolRecord, Units } from '#contracts';
import { formatLength } from '../ui/length';
import { formatDuration, formatMoment } from '../ui/time';

export const TOOL_COLUMNS = [
  'number',
  'name',
  'kind',
  'diameter',
  'gaugeLength',
  'holder',
  'measured',
  'life',
  'places',
] as const;
export type ToolColumn = (typeof TOOL_COLUMNS)[number];

export interface ToolRow {
  readonly id: string;
  readonly number: number;
  readonly name: string;
  readonly kind: string;
  readonly diameter: string;
  readonly gaugeLength: string;
  readonly holder: string;
  readonly measured: string;
  /** Why the length does not count: never measured, or re-clamped since. */
  readonly lengthDoubt: 'none' | 'never' | 'touched-since';
  readonly life: string;
  /** Share of its life still left, 0 to 1; null where no life is kept. */
  readonly left: number | null;
  readonly places: string;
}

export function rowOfTool({ id, tool, places }: ToolRecord, units: Units, now: Date): ToolRow {
  return {
    id,
    number: tool.number,
    name: tool.name,
    kind: tool.kind,
    diameter: formatLength(tool.diameter, units, 3),
    gaugeLength: formatLength(tool.gaugeLength, units, 3),
    holder: tool.holder.taper,
    measured: tool.measured
      ? `${formatMoment(tool.measured.at, now)}, ${tool.measured.method}`
      : 'never',
    lengthDoubt: doubtOf(tool),
    life: wordLife(tool.used, tool.life),
    left: tool.life === undefined ? null : Math.max(0, 1 - tool.used / tool.life),
    places:
      places.map(({ machine, pocket }) => `${machine}, pocket ${pocket}`).join('; ') ||
      'in no pocket',
  };
}

export interface ToolQuery {
  readonly search: string;
  /** '' for all; else only tools of this kind. */
  readonly kind: string;
  readonly where: '' | 'loaded' | 'not-loaded';
  readonly sortBy: ToolColumn;
  readonly direction: 'asc' | 'desc';
}

export function queryTools(
  records: readonly ToolRecord[],
  query: ToolQuery,
): readonly ToolRecord[] {
  const words = query.search.toLowerCase().split(/\s+/).filter(Boolean);
  const found = records.filter((record) => {
    const { tool, places } = record;
    if (query.kind !== '' && tool.kind !== query.kind) return false;
    if (query.where === 'loaded' && places.length === 0) return false;
    if (query.where === 'not-loaded' && 0 < places.length) return false;
    const text = `t${tool.number} ${tool.name} ${tool.kind} ${tool.holder.taper}`.toLowerCase();
    return words.every((word) => text.includes(word));
  });
  const sign = query.direction === 'asc' ? 1 : -1;
  return found.toSorted(
    (one, other) => sign * compare(one, other, query.sortBy) || one.tool.number - other.tool.number,
  );
}

function compare(one: ToolRecord, other: ToolRecord, by: ToolColumn): number {
  const [a, b] = [keyOf(one, by), keyOf(other, by)];
  if (typeof a === 'number' && typeof b === 'number') return a - b;
  return String(a).localeCompare(String(b), 'en', { numeric: true });
}

function keyOf({ tool, places }: ToolRecord, by: ToolColumn): string | number {
  switch (by) {
    case 'number':
      return tool.number;
    case 'name':
    case 'kind':
      return tool[by];
    case 'diameter':
    case 'gaugeLength':
      return tool[by];
    case 'holder':
      return tool.holder.taper;
    case 'measured':
      // Never measured counts as the oldest.
      return tool.measured?.at ?? '';
    case 'life':
      // Least life left first; without a life kept, last.
      return tool.life === undefined ? 2 : 1 - tool.used / tool.life;
    case 'places':
      return places.length === 0 ? '~' : `${places[0]?.machine} ${places[0]?.pocket}`;
  }
}

function doubtOf(tool: ToolRecord['tool']): ToolRow['lengthDoubt'] {
  if (tool.measured === null) return 'never';
  const isStale = tool.touched !== null && Date.parse(tool.measured.at) < Date.parse(tool.touched);
  return isStale ? 'touched-since' : 'none';
}

function wordLife(used: number, life: number | undefined): string {
  if (life === undefined) return used > 0 ? `${formatDuration(used)} used` : 'not kept';
  const left = life - used;
  return left < 0
    ? `over by ${formatDuration(-left)}`
    : `${formatDuration(left)} of ${formatDuration(life)} left`;
}
