import type { z } from 'zod';
import { toolSchema, type measurementSchema, type ToolRecord, type ValidSetup } from '#contracts';
import type { Stores } from '../db/database';
import type { Dependencies } from '../dependencies';
import { refuse } from '../http/problems';
import type { Author } from '../http/route';

/**
 * Records a measured gauge length. With `inTable` the length table gets the value that the shop's
 * controllers would hold for it; without, the entry stays as it was and the check will say they differ.
 */
export async function recordMeasurement(
  deps: Dependencies,
  actor: Author,
  id: string,
  { gaugeLength, method, inTable }: z.output<typeof measurementSchema>,
): Promise<ToolRecord> {
  return await deps.database.transaction(async (stores) => {
    const tableValue = inTable ? await tableValueOf(stores, actor.shopId, gaugeLength) : undefined;
    const record = await stores.tools.measure(actor.shopId, id, {
      gaugeLength,
      method,
      at: deps.now().toISOString(),
      madeBy: actor.id,
      tableValue,
    });
    demandPossible(record, gaugeLength);
    await stores.audit.add(actor.shopId, {
      personId: actor.id,
      action: 'tool.measure',
      subject: `T${record.tool.number} ${record.tool.name}`,
      detail: { toolId: id, gaugeLength, method, lengthOffset: record.lengthOffset },
    });
    return record;
  });
}

/** The holder keeps its length, so a length too short for it would leave the tool no stick-out. */
function demandPossible({ tool }: ToolRecord, gaugeLength: number): void {
  if (toolSchema.safeParse(tool).success) return;
  const message = `${gaugeLength} mm is too short for T${tool.number}: its holder alone is longer. Measure again.`;
  throw refuse('wrong-fields', message, {
    fields: [{ path: 'gaugeLength', message, expected: 'the length from gauge line to tip, mm' }],
  });
}

type Controller = Pick<ValidSetup['controller'], 'lengthScheme' | 'lengthReference'>;

/**
 * What a length table holds for a gauge length: the length less the controller's reference. Where the
 * machines of a shop keep their tables differently one entry cannot serve both, and where a table holds
 * touch-off values or nothing, the length does not say what it holds: then it is left alone.
 */
async function tableValueOf(
  stores: Stores,
  shopId: string,
  gaugeLength: number,
): Promise<number | undefined> {
  const values = new Set<number | undefined>();
  for (const { id } of await stores.machines.list(shopId)) {
    const details = await stores.machines.details(shopId, id);
    if (details) values.add(valueOn(details.controller, gaugeLength));
  }
  if (values.size === 0) return gaugeLength;
  return values.size === 1 ? [...values][0] : undefined;
}

function valueOn({ lengthScheme, lengthReference }: Controller, gaugeLength: number) {
  const holdsLengths = lengthScheme === 'from-nose' || lengthScheme === 'from-master';
  // To the micrometre, as lengths are entered: a difference must not show the last bits of a double.
  return holdsLengths ? Math.round((gaugeLength - lengthReference) * 1000) / 1000 : undefined;
}
