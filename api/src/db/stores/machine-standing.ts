import type { MachineDetails, Revision, ValidSetup } from '#contracts';
import { select, selectOne, type StoreContext } from '../store-context';
import { asRevision, newestRevision, type RevisionRow } from './revision-rows';

/** A revision together with the key of its row, which a check keeps. */
export type KeyedRevision = Revision & { readonly id: string };

/** A machine with everything that stands on it now, each at its newest revision. */
export interface MachineStanding {
  readonly id: string;
  readonly name: string;
  readonly machine: ValidSetup['machine'];
  readonly controller: ValidSetup['controller'];
  readonly revision: KeyedRevision;
  readonly rack: ValidSetup['rack'];
  readonly rackRevision: KeyedRevision;
  readonly loading: ValidSetup['loading'];
  readonly loadingRevision: KeyedRevision;
  readonly work: ValidSetup['offsets']['work'];
  /** Offset table entries that belong to no tool of the shop. */
  readonly length: Readonly<Record<string, number>>;
  readonly diameter: Readonly<Record<string, number>>;
  readonly offsetRevision: KeyedRevision;
  readonly macro: { readonly name: string; readonly text: string } | null;
  readonly subprograms: ValidSetup['subprograms'];
  readonly macroRevision: KeyedRevision | null;
}

/** Reads what stands on a machine; undefined when the shop has no such machine. */
export async function readStanding(
  ctx: StoreContext,
  shopId: string,
  machineId: string,
): Promise<MachineStanding | undefined> {
  const row = await selectOne<{ id: string; name: string }>(
    ctx,
    'select id, name from machine where shop_id = :shopId and id = :machineId',
    { shopId, machineId },
  );
  if (!row) return undefined;
  const described = await newestRevision<DescriptionColumns>(
    ctx,
    'machine_revision',
    shopId,
    machineId,
  );
  const rack = await newestRevision<RackColumns>(ctx, 'rack_revision', shopId, machineId);
  const loading = await newestRevision<LoadingColumns>(ctx, 'loading_revision', shopId, machineId);
  const offsets = await newestRevision<OffsetColumns>(ctx, 'offset_revision', shopId, machineId);
  const macro = await newestRevision<MacroColumns>(ctx, 'macro_revision', shopId, machineId);
  if (!described || !rack || !loading || !offsets) {
    throw new Error(`Machine ${machineId} lacks one of its first revisions.`);
  }
  return {
    ...row,
    machine: described.machine,
    controller: described.controller,
    revision: keyed(described),
    rack: await wholeRack(ctx, rack),
    rackRevision: keyed(rack),
    loading: await wholeLoading(ctx, loading),
    loadingRevision: keyed(loading),
    work: offsets.work,
    length: offsets.length,
    diameter: offsets.diameter,
    offsetRevision: keyed(offsets),
    ...macroParts(macro),
  };
}

/** What the contract shows of it: revisions without their keys. */
export function asDetails(standing: MachineStanding): MachineDetails {
  const { id, name, machine, controller, rack, loading, work, macro } = standing;
  return {
    id,
    name,
    machine,
    controller,
    revision: withoutKey(standing.revision),
    rack,
    rackRevision: withoutKey(standing.rackRevision),
    loading,
    loadingRevision: withoutKey(standing.loadingRevision),
    work,
    offsetRevision: withoutKey(standing.offsetRevision),
    macro: macro && { ...macro },
    macroRevision: standing.macroRevision && withoutKey(standing.macroRevision),
  };
}

interface DescriptionColumns {
  readonly machine: ValidSetup['machine'];
  readonly controller: ValidSetup['controller'];
}
interface RackColumns {
  readonly name: string;
  readonly edge: ValidSetup['rack']['edge'];
  readonly body: Omit<ValidSetup['rack'], 'name' | 'edge' | 'pockets'>;
}
export interface LoadingColumns {
  readonly spindle: 'tool' | 'empty' | 'unknown';
  readonly spindle_tool: number | null;
  readonly by_hand: number[];
}
interface OffsetColumns {
  readonly work: ValidSetup['offsets']['work'];
  readonly length: Record<string, number>;
  readonly diameter: Record<string, number>;
}
interface MacroColumns {
  readonly name: string | null;
  readonly text: string | null;
  readonly subprograms: ValidSetup['subprograms'];
}
type Pocket = ValidSetup['rack']['pockets'][number];
interface PocketColumns {
  readonly number: number;
  readonly grip_x: number;
  readonly grip_y: number;
  readonly grip_z: number;
  readonly opens: Pocket['opens'];
  readonly largest_diameter: number;
  readonly longest: number;
  readonly taper: string;
  readonly kind: Pocket['kind'];
  readonly heaviest: number | null;
  readonly taught: Pocket['taught'] | null;
}

async function wholeRack(
  ctx: StoreContext,
  { id, name, edge, body }: RackColumns & RevisionRow,
): Promise<ValidSetup['rack']> {
  const pockets = await select<PocketColumns>(
    ctx,
    'select * from pocket where rack_revision_id = :id order by position',
    { id },
  );
  return { name, edge, ...body, pockets: pockets.map(asPocket) };
}

function asPocket(row: PocketColumns): Pocket {
  return {
    number: row.number,
    grip: { x: row.grip_x, y: row.grip_y, z: row.grip_z },
    opens: row.opens,
    largestDiameter: row.largest_diameter,
    longest: row.longest,
    taper: row.taper,
    kind: row.kind,
    ...(row.heaviest === null ? {} : { heaviest: row.heaviest }),
    ...(row.taught ? { taught: row.taught } : {}),
  };
}

/** A loading revision with its pockets, as the setup says it. */
export async function wholeLoading(
  ctx: StoreContext,
  { id, spindle, spindle_tool, by_hand }: LoadingColumns & { readonly id: string },
): Promise<ValidSetup['loading']> {
  const pockets = await select<{ pocket: number; tool: number }>(
    ctx,
    `select pocket, tool from loading_pocket where loading_revision_id = :id order by position`,
    { id },
  );
  const inSpindle = { tool: spindle_tool, empty: null, unknown: 'unknown' as const }[spindle];
  return { pockets, inSpindle, byHand: by_hand };
}

function macroParts(
  row: (MacroColumns & RevisionRow) | undefined,
): Pick<MachineStanding, 'macro' | 'subprograms' | 'macroRevision'> {
  if (!row) return { macro: null, subprograms: [], macroRevision: null };
  const macro = row.name === null || row.text === null ? null : { name: row.name, text: row.text };
  return { macro, subprograms: row.subprograms, macroRevision: keyed(row) };
}

function keyed(row: RevisionRow): KeyedRevision {
  return { id: row.id, ...asRevision(row) };
}

function withoutKey({ number, madeBy, madeAt, reason }: KeyedRevision): Revision {
  return { number, madeBy, madeAt, reason };
}
