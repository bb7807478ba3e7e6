import type { Units } from '#contracts';
import type { Loading, Rack, Tool } from '#engine';
import { formatLength } from '../ui/length';
import type { RackMark } from '../ui/rack-strip/lay-out-rack';
import { wordMisfit } from './misfit-words';
import type { Misfit } from './pocket-fit';
import { findMisfits } from './pocket-fit';

export interface PocketRow {
  readonly pocket: number;
  readonly tool: number | null;
  readonly name: string;
  /** Diameter and gauge length, in the person's unit. */
  readonly size: string;
  readonly inSpindle: boolean;
  readonly warnings: readonly PocketWarning[];
  /** Whether an unsaved change touches this pocket. */
  readonly changed: boolean;
}
export interface PocketWarning {
  readonly severity: 'stop' | 'hold';
  readonly sentence: string;
  readonly mark: string;
}

const MARKS: Readonly<Record<Misfit['what'], string>> = {
  taper: 'wrong taper',
  wide: 'too wide',
  long: 'too long',
  heavy: 'too heavy',
  neighbour: 'too near',
};

interface Rows {
  readonly rack: Rack;
  readonly loading: Loading;
  readonly saved: Loading;
  readonly tools: ReadonlyMap<number, Tool>;
  readonly units: Units;
}

/** The rack pocket by pocket, in the order of their numbers, with what is wrong at each. */
export function layOutPockets(rows: Rows): readonly PocketRow[] {
  return rows.rack.pockets
    .toSorted((one, other) => one.number - other.number)
    .map(({ number }) => rowOf(number, rows));
}

export function marksOf(rows: readonly PocketRow[]): readonly RackMark[] {
  return rows.flatMap(({ pocket, warnings }) =>
    warnings.map(({ severity, mark }) => ({ pocket, severity, word: mark })),
  );
}

function rowOf(pocket: number, rows: Rows): PocketRow {
  const find = (loading: Loading) =>
    loading.pockets.find((each) => each.pocket === pocket)?.tool ?? null;
  const number = find(rows.loading);
  const tool = number === null ? undefined : rows.tools.get(number);
  return {
    pocket,
    tool: number,
    name: number === null ? 'empty' : (tool?.name ?? 'not in the tool list'),
    size: tool ? sizeOf(tool, rows.units) : '',
    inSpindle: number !== null && rows.loading.inSpindle === number,
    warnings: number === null ? [] : warningsOf(number, pocket, rows),
    changed: find(rows.saved) !== number,
  };
}

export function sizeOf(tool: Tool, units: Units): string {
  return `⌀ ${formatLength(tool.diameter, units, 3)} · length ${formatLength(tool.gaugeLength, units, 3)}`;
}

function warningsOf(number: number, pocket: number, rows: Rows): readonly PocketWarning[] {
  const tool = rows.tools.get(number);
  const place = rows.rack.pockets.find((each) => each.number === pocket);
  const twice = rows.loading.pockets.filter((each) => each.tool === number).length > 1;
  const misfits = tool && place ? findMisfits(tool, place, rows) : [];
  return [
    ...(tool ? [] : [warning('stop', `T${number} is not in the tool list.`, 'unknown')]),
    ...(twice ? [warning('stop', `T${number} stands in two pockets.`, 'in two pockets')] : []),
    ...misfits.map((each) =>
      warning(
        each.severity === 'hold' ? 'hold' : 'stop',
        wordMisfit(each, rows.units),
        MARKS[each.what],
      ),
    ),
  ];
}

function warning(severity: 'stop' | 'hold', sentence: string, mark: string): PocketWarning {
  return { severity, sentence, mark };
}
