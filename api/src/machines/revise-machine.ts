import type { z } from 'zod';
import type {
  descriptionChangeSchema,
  loadingChangeSchema,
  MachineDetails,
  macroChangeSchema,
  offsetChangeSchema,
  rackChangeSchema,
} from '#contracts';
import type { Stores } from '../db/database';
import type { RevisedPart } from '../db/stores/machine-store';
import type { Dependencies } from '../dependencies';
import type { Author } from '../http/route';

export async function changeDescription(
  deps: Dependencies,
  actor: Author,
  machineId: string,
  change: z.output<typeof descriptionChangeSchema>,
): Promise<MachineDetails> {
  return await revise(deps, actor, machineId, 'description', change, (stores) =>
    stores.machines.addDescription(actor.shopId, machineId, { ...change, madeBy: actor.id }),
  );
}

export async function changeRack(
  deps: Dependencies,
  actor: Author,
  machineId: string,
  change: z.output<typeof rackChangeSchema>,
): Promise<MachineDetails> {
  return await revise(deps, actor, machineId, 'rack', change, (stores) =>
    stores.machines.addRack(actor.shopId, machineId, { ...change, madeBy: actor.id }),
  );
}

/** Programs were checked against the tools as they sat: the newest check of each is asked for again. */
export async function changeLoading(
  deps: Dependencies,
  actor: Author,
  machineId: string,
  change: z.output<typeof loadingChangeSchema>,
): Promise<MachineDetails> {
  return await revise(deps, actor, machineId, 'loading', change, async (stores) => {
    const details = await stores.machines.addLoading(actor.shopId, machineId, {
      ...change,
      madeBy: actor.id,
    });
    await stores.checks.askAgainOn(actor.shopId, machineId, { askedBy: actor.id });
    return details;
  });
}

export async function changeOffsets(
  deps: Dependencies,
  actor: Author,
  machineId: string,
  change: z.output<typeof offsetChangeSchema>,
): Promise<MachineDetails> {
  return await revise(deps, actor, machineId, 'offsets', change, (stores) =>
    stores.machines.addOffsets(actor.shopId, machineId, { ...change, madeBy: actor.id }),
  );
}

export async function changeMacro(
  deps: Dependencies,
  actor: Author,
  machineId: string,
  change: z.output<typeof macroChangeSchema>,
): Promise<MachineDetails> {
  return await revise(deps, actor, machineId, 'macro', change, (stores) =>
    stores.machines.addMacro(actor.shopId, machineId, { ...change, madeBy: actor.id }),
  );
}

async function revise(
  deps: Dependencies,
  actor: Author,
  machineId: string,
  part: RevisedPart,
  { basedOn, reason }: { readonly basedOn: number; readonly reason: string },
  write: (stores: Stores) => Promise<MachineDetails>,
): Promise<MachineDetails> {
  return await deps.database.transaction(async (stores) => {
    const details = await write(stores);
    await stores.audit.add(actor.shopId, {
      personId: actor.id,
      action: `machine.change-${part}`,
      subject: details.name,
      detail: { machineId, revision: basedOn + 1, reason },
    });
    return details;
  });
}
