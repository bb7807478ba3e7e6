import type { z } from 'zod';
import type { newToolSchema, toolChangeSchema, ToolRecord } from '#contracts';
import type { Dependencies } from '../dependencies';
import { refuse } from '../http/problems';
import type { Author } from '../http/route';

export async function addTool(
  deps: Dependencies,
  actor: Author,
  parts: z.output<typeof newToolSchema>,
): Promise<ToolRecord> {
  return await deps.database.transaction(async (stores) => {
    const record = await stores.tools.add(actor.shopId, { ...parts, madeBy: actor.id });
    await stores.audit.add(actor.shopId, {
      personId: actor.id,
      action: 'tool.add',
      subject: spelt(record),
      detail: { toolId: record.id, reason: parts.reason },
    });
    return record;
  });
}

/** A new revision of a tool. While it sits in a pocket its number stays: the loading names it by that. */
export async function changeTool(
  deps: Dependencies,
  actor: Author,
  id: string,
  change: z.output<typeof toolChangeSchema>,
): Promise<ToolRecord> {
  return await deps.database.transaction(async (stores) => {
    const before = await stores.tools.find(actor.shopId, id);
    if (before && before.tool.number !== change.tool.number) keepNumberOfLoaded(before);
    const record = await stores.tools.change(actor.shopId, id, { ...change, madeBy: actor.id });
    await stores.audit.add(actor.shopId, {
      personId: actor.id,
      action: 'tool.change',
      subject: spelt(record),
      detail: { toolId: id, revision: record.revision.number, reason: change.reason },
    });
    return record;
  });
}

function keepNumberOfLoaded({ tool, places }: ToolRecord): void {
  const [place] = places;
  if (!place) return;
  throw refuse(
    'not-possible-now',
    `T${tool.number} sits in pocket ${place.pocket} of ${place.machine}, so it cannot get another number.`,
    { next: 'Take it out of the pocket first, then renumber it.' },
  );
}

function spelt({ tool }: ToolRecord): string {
  return `T${tool.number} ${tool.name}`;
}
