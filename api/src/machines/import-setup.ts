import { isDeepStrictEqual } from 'node:util';
import type { z } from 'zod';
import type { MachineDetails, Permission, setupImportSchema, ValidSetup } from '#contracts';
import type { Stores } from '../db/database';
import type { MachineStanding } from '../db/stores/machine-standing';
import type { RevisedPart } from '../db/stores/machine-store';
import type { Dependencies } from '../dependencies';
import { demandPermission } from '../http/mount-routes';
import { notFound } from '../http/problems';
import type { Author } from '../http/route';
import { importTools, type ImportedTools } from './import-tools';

type SetupImported = z.output<typeof setupImportSchema>;

/**
 * A new machine from a setup file, at revision 1 of everything. The file's policy and job sheet are not
 * taken: the policy is the shop's, a job sheet belongs to a program.
 */
export async function importNewMachine(
  deps: Pick<Dependencies, 'database'>,
  actor: Author,
  { setup, reason, replaceTools }: SetupImported,
): Promise<MachineDetails> {
  return await deps.database.transaction(async (stores) => {
    const tools = await importTools(stores, actor, setup, { replaceTools, reason });
    const details = await stores.machines.create(actor.shopId, {
      ...setup,
      offsets: { ...setup.offsets, ...tools.otherOffsets },
      madeBy: actor.id,
      reason,
    });
    await noteImport(stores, actor, 'machine.add', details, { reason, tools, parts: [] });
    return details;
  });
}

/** New revisions of whatever the file says differently; the rest stays at its revision. */
export async function importSetup(
  deps: Pick<Dependencies, 'database'>,
  actor: Author,
  machineId: string,
  { setup, reason, replaceTools }: SetupImported,
): Promise<MachineDetails> {
  return await deps.database.transaction(async (stores) => {
    const standing = await stores.machines.standing(actor.shopId, machineId);
    if (!standing) throw notFound('machine');
    const tools = await importTools(stores, actor, setup, { replaceTools, reason });
    const parts = changesOf(standing, setup, tools.otherOffsets);
    for (const { part, needs } of parts) {
      demandPermission(actor.roles, [needs], `changing ${SPOKEN[part]}`);
    }
    for (const { write, basedOn } of parts) {
      await write(stores, actor.shopId, machineId, { basedOn, madeBy: actor.id, reason });
    }
    if (parts.some(({ part }) => part === 'loading')) {
      await stores.checks.askAgainOn(actor.shopId, machineId, { askedBy: actor.id });
    }
    const details = await stores.machines.details(actor.shopId, machineId);
    if (!details) throw notFound('machine');
    const names = parts.map(({ part }) => part);
    await noteImport(stores, actor, 'machine.import', details, { reason, tools, parts: names });
    return details;
  });
}

const SPOKEN: Record<RevisedPart, string> = {
  description: 'the machine description',
  rack: 'the rack',
  loading: 'the loading',
  offsets: 'the offsets',
  macro: 'the change macro',
};

interface By {
  readonly basedOn: number;
  readonly madeBy: string;
  readonly reason: string;
}
interface PartChange {
  readonly part: RevisedPart;
  readonly needs: Permission;
  readonly basedOn: number;
  write(stores: Stores, shopId: string, machineId: string, by: By): Promise<MachineDetails>;
}
interface PossibleChange extends PartChange {
  readonly differs: boolean;
}

/** The parts that differ, in an order in which each leaves a valid machine. */
function changesOf(
  standing: MachineStanding,
  setup: ValidSetup,
  { length, diameter }: ImportedTools['otherOffsets'],
): PartChange[] {
  const { machine, controller, rack, loading } = setup;
  const macro = setup.changeMacro ?? null;
  const { subprograms } = setup;
  const { work } = setup.offsets;
  const changes: PossibleChange[] = [
    {
      part: 'description',
      needs: 'change-machine',
      differs: !isDeepStrictEqual(
        { machine, controller },
        { machine: standing.machine, controller: standing.controller },
      ),
      basedOn: standing.revision.number,
      write: (stores, shopId, id, by) =>
        stores.machines.addDescription(shopId, id, { ...by, machine, controller }),
    },
    ...rackAndLoading(standing, rack, loading),
    {
      part: 'offsets',
      needs: 'change-work-offsets',
      differs: !isDeepStrictEqual(
        { work, length, diameter },
        { work: standing.work, length: standing.length, diameter: standing.diameter },
      ),
      basedOn: standing.offsetRevision.number,
      write: (stores, shopId, id, by) =>
        stores.machines.addOffsets(shopId, id, { ...by, work, length, diameter }),
    },
    {
      part: 'macro',
      needs: 'change-macro',
      differs: !isDeepStrictEqual(
        { macro, subprograms },
        { macro: standing.macro, subprograms: standing.subprograms },
      ),
      basedOn: standing.macroRevision?.number ?? 0,
      write: (stores, shopId, id, by) =>
        stores.machines.addMacro(shopId, id, { ...by, macro, subprograms }),
    },
  ];
  return changes.filter((change) => change.differs);
}

/**
 * A rack that loses a pocket cannot come before the loading that empties it, nor a loading before the
 * rack that brings its pocket. So what of the new loading the old rack can hold comes first, then the
 * rack, then the whole new loading if the old rack could not hold all of it.
 */
function rackAndLoading(
  standing: MachineStanding,
  rack: ValidSetup['rack'],
  loading: ValidSetup['loading'],
): PossibleChange[] {
  const pockets = new Set(standing.rack.pockets.map((pocket) => pocket.number));
  const held = loading.pockets.filter((each) => pockets.has(each.pocket));
  const first = { ...loading, pockets: held };
  const firstDiffers = !isDeepStrictEqual(first, standing.loading);
  const { number } = standing.loadingRevision;
  return [
    loadingChange(first, number, firstDiffers),
    {
      part: 'rack',
      needs: 'change-rack',
      differs: !isDeepStrictEqual(rack, standing.rack),
      basedOn: standing.rackRevision.number,
      write: (stores, shopId, id, by) => stores.machines.addRack(shopId, id, { ...by, rack }),
    },
    loadingChange(
      loading,
      firstDiffers ? number + 1 : number,
      held.length !== loading.pockets.length,
    ),
  ];
}

function loadingChange(
  loading: ValidSetup['loading'],
  basedOn: number,
  differs: boolean,
): PossibleChange {
  return {
    part: 'loading',
    needs: 'change-loading',
    differs,
    basedOn,
    write: (stores, shopId, id, by) => stores.machines.addLoading(shopId, id, { ...by, loading }),
  };
}

async function noteImport(
  stores: Stores,
  actor: Author,
  action: string,
  { id, name }: MachineDetails,
  detail: {
    readonly reason: string;
    readonly tools: ImportedTools;
    readonly parts: readonly RevisedPart[];
  },
): Promise<void> {
  await stores.audit.add(actor.shopId, {
    personId: actor.id,
    action,
    subject: name,
    detail: {
      machineId: id,
      reason: detail.reason,
      changed: [...new Set(detail.parts)],
      toolsAdded: detail.tools.added,
      toolsReplaced: detail.tools.replaced,
    },
  });
}
