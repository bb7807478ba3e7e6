import {
  policySchema,
  type LoadingHistory,
  type MachineDetails,
  type MachineList,
  type Revision,
  type ValidSetup,
} from '#contracts';
import {
  refusingTwins,
  select,
  selectOne,
  together,
  type BoundContext,
  type StoreContext,
} from '../store-context';
import { missing, taken } from '../store-refusal';
import { buildSetup } from './build-setup';
import {
  writeDescription,
  writeLoading,
  writeMacro,
  writeOffsets,
  writeRack,
  type NewRevision,
} from './machine-revisions';
import {
  asDetails,
  readStanding,
  wholeLoading,
  type LoadingColumns,
  type MachineStanding,
} from './machine-standing';
import { asRevision, nextNumber, revisionRows, type RevisionTable } from './revision-rows';
import { openShopStore } from './shop-store';
import { openToolStore } from './tool-store';

/** Every change says what it was based on, who made it and why. */
export interface MachineChange {
  readonly basedOn: number;
  readonly madeBy: string | null;
  readonly reason?: string | undefined;
}
export type MachineParts = Pick<
  ValidSetup,
  'machine' | 'controller' | 'rack' | 'loading' | 'offsets' | 'changeMacro' | 'subprograms'
> & { readonly madeBy: string | null; readonly reason?: string | undefined };
export type RevisedPart = 'description' | 'rack' | 'loading' | 'offsets' | 'macro';
type Change<Parts> = MachineChange & Parts;
type Making = (shopId: string, machineId: string) => Promise<MachineDetails>;

export interface MachineStore {
  list(shopId: string): Promise<MachineList['machines']>;
  details(shopId: string, machineId: string): Promise<MachineDetails | undefined>;
  /** With the keys of its revisions and the parts the contract does not show. */
  standing(shopId: string, machineId: string): Promise<MachineStanding | undefined>;
  /** A new machine at revision 1 of everything; length and diameter entries that belong to no tool only. */
  create(shopId: string, parts: MachineParts): Promise<MachineDetails>;
  addDescription(
    shopId: string,
    machineId: string,
    change: Change<Pick<ValidSetup, 'machine' | 'controller'>>,
  ): ReturnType<Making>;
  addRack(
    shopId: string,
    machineId: string,
    change: Change<Pick<ValidSetup, 'rack'>>,
  ): ReturnType<Making>;
  addLoading(
    shopId: string,
    machineId: string,
    change: Change<Pick<ValidSetup, 'loading'>>,
  ): ReturnType<Making>;
  /** Table entries left out stay as they are. */
  addOffsets(
    shopId: string,
    machineId: string,
    change: Change<
      Pick<ValidSetup['offsets'], 'work'> &
        Partial<Pick<ValidSetup['offsets'], 'length' | 'diameter'>>
    >,
  ): ReturnType<Making>;
  /** Subprograms left out stay as they are. */
  addMacro(
    shopId: string,
    machineId: string,
    change: Change<{
      readonly macro: { readonly name: string; readonly text: string } | null;
      readonly subprograms?: ValidSetup['subprograms'] | undefined;
    }>,
  ): ReturnType<Making>;
  /** Newest first; undefined when the shop has no such machine. */
  revisions(shopId: string, machineId: string, part: RevisedPart): Promise<Revision[] | undefined>;
  loadingHistory(shopId: string, machineId: string): Promise<LoadingHistory | undefined>;
  /** The machine's setup document, all tools of the shop in it. */
  setup(
    shopId: string,
    machineId: string,
    options?: { readonly asOf?: string; readonly job?: ValidSetup['job'] },
  ): Promise<ValidSetup | undefined>;
}

const TABLE: Readonly<Record<RevisedPart, RevisionTable>> = {
  description: 'machine_revision',
  rack: 'rack_revision',
  loading: 'loading_revision',
  offsets: 'offset_revision',
  macro: 'macro_revision',
};

export function openMachineStore(ctx: StoreContext): MachineStore {
  return {
    list: (shopId) => listMachines(ctx, shopId),
    async details(shopId, machineId) {
      const standing = await readStanding(ctx, shopId, machineId);
      return standing && asDetails(standing);
    },
    standing: (shopId, machineId) => readStanding(ctx, shopId, machineId),
    create: (shopId, parts) => together(ctx, (bound) => createMachine(bound, shopId, parts)),
    addDescription: (shopId, machineId, change) =>
      revise(ctx, 'description', shopId, machineId, change, (bound, revision) =>
        writeDescription(bound, revision, change),
      ),
    addRack: (shopId, machineId, change) =>
      revise(ctx, 'rack', shopId, machineId, change, (bound, revision) =>
        writeRack(bound, revision, change.rack),
      ),
    addLoading: (shopId, machineId, change) =>
      revise(ctx, 'loading', shopId, machineId, change, (bound, revision) =>
        writeLoading(bound, revision, change.loading),
      ),
    addOffsets: (shopId, machineId, change) =>
      revise(ctx, 'offsets', shopId, machineId, change, (bound, revision, before) =>
        writeOffsets(bound, revision, {
          work: change.work,
          length: { ...(change.length ?? before.length) },
          diameter: { ...(change.diameter ?? before.diameter) },
        }),
      ),
    addMacro: (shopId, machineId, change) =>
      revise(ctx, 'macro', shopId, machineId, change, (bound, revision, before) =>
        writeMacro(bound, revision, change.macro, change.subprograms ?? before.subprograms),
      ),
    async revisions(shopId, machineId, part) {
      if (!(await exists(ctx, shopId, machineId))) return undefined;
      return (await revisionRows(ctx, TABLE[part], shopId, machineId)).map(asRevision);
    },
    loadingHistory: (shopId, machineId) => readLoadingHistory(ctx, shopId, machineId),
    setup: (shopId, machineId, options = {}) => readSetup(ctx, shopId, machineId, options),
  };
}

async function listMachines(ctx: StoreContext, shopId: string): Promise<MachineList['machines']> {
  // Each lateral part is served by the unique index of its revision table on (machine_id, number).
  return await select(
    ctx,
    `select machine.id, machine.name, rack.edge, described.number as revision,
       loading.number as "loadingRevision",
       (select count(*)::int from pocket where rack_revision_id = rack.id) as pockets,
       (select count(*)::int from loading_pocket where loading_revision_id = loading.id) as loaded
     from machine
     cross join lateral (select number from machine_revision where machine_id = machine.id
       order by number desc limit 1) described
     cross join lateral (select id, edge from rack_revision where machine_id = machine.id
       order by number desc limit 1) rack
     cross join lateral (select id, number from loading_revision where machine_id = machine.id
       order by number desc limit 1) loading
     where machine.shop_id = :shopId
     order by machine.name`,
    { shopId },
  );
}

async function createMachine(
  ctx: BoundContext,
  shopId: string,
  parts: MachineParts,
): Promise<MachineDetails> {
  const { name } = parts.machine;
  const { id } = await refusingTwins(
    () => ctx.models.machine.create({ shopId, name }, { transaction: ctx.transaction }),
    () => taken('machine', name),
  );
  const { madeBy, reason = '' } = parts;
  const revision: NewRevision = { shopId, machineId: id, number: 1, madeBy, reason };
  await writeDescription(ctx, revision, parts);
  await writeRack(ctx, revision, parts.rack);
  await writeLoading(ctx, revision, parts.loading);
  await writeOffsets(ctx, revision, parts.offsets);
  if (parts.changeMacro || 0 < parts.subprograms.length) {
    await writeMacro(ctx, revision, parts.changeMacro ?? null, parts.subprograms);
  }
  return asDetails(await fitting(ctx, shopId, id));
}

/** One more revision of a part, after which the machine's setup must still be a valid one. */
async function revise(
  ctx: StoreContext,
  part: RevisedPart,
  shopId: string,
  machineId: string,
  { basedOn, madeBy, reason = '' }: MachineChange,
  write: (ctx: BoundContext, revision: NewRevision, before: MachineStanding) => Promise<void>,
): Promise<MachineDetails> {
  return await together(ctx, async (bound) => {
    const number = await nextNumber(bound, TABLE[part], shopId, machineId, basedOn);
    const before = await readStanding(bound, shopId, machineId);
    if (!before) throw missing('machine');
    await write(bound, { shopId, machineId, number, madeBy, reason }, before);
    return asDetails(await fitting(bound, shopId, machineId));
  });
}

/** Refuses a machine whose parts contradict each other, such as a loaded pocket the rack lacks. */
async function fitting(
  ctx: BoundContext,
  shopId: string,
  machineId: string,
): Promise<MachineStanding> {
  const standing = await readStanding(ctx, shopId, machineId);
  if (!standing) throw missing('machine');
  buildSetup({ standing, tools: [], policy: policySchema.parse({}) });
  return standing;
}

async function readLoadingHistory(
  ctx: StoreContext,
  shopId: string,
  machineId: string,
): Promise<LoadingHistory | undefined> {
  if (!(await exists(ctx, shopId, machineId))) return undefined;
  const rows = await revisionRows<LoadingColumns>(ctx, 'loading_revision', shopId, machineId);
  const revisions = [];
  for (const row of rows) {
    revisions.push({ ...asRevision(row), loading: await wholeLoading(ctx, row) });
  }
  return { revisions };
}

async function readSetup(
  ctx: StoreContext,
  shopId: string,
  machineId: string,
  options: { readonly asOf?: string; readonly job?: ValidSetup['job'] },
): Promise<ValidSetup | undefined> {
  const standing = await readStanding(ctx, shopId, machineId);
  if (!standing) return undefined;
  const tools = await openToolStore(ctx).standing(shopId);
  const policy = await openShopStore(ctx).policy(shopId);
  return buildSetup({ standing, tools, policy, ...options });
}

async function exists(ctx: StoreContext, shopId: string, machineId: string): Promise<boolean> {
  const row = await selectOne(
    ctx,
    'select id from machine where shop_id = :shopId and id = :machineId',
    { shopId, machineId },
  );
  return row !== undefined;
}
