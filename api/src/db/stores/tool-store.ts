import type { Revision, ToolRecord, ValidSetup } from '#contracts';
import {
  refusingTwins,
  select,
  together,
  type BoundContext,
  type StoreContext,
} from '../store-context';
import { missing, taken } from '../store-refusal';
import type { StandingTool } from './build-setup';
import {
  asRevision,
  lockNewest,
  newestRevision,
  nextNumber,
  revisionRows,
  type RevisionRow,
} from './revision-rows';

type Tool = ValidSetup['tools'][number];
interface ToolParts {
  readonly tool: Tool;
  readonly lengthOffset: number | null;
  readonly diameterOffset: number | null;
  readonly madeBy: string | null;
  readonly reason?: string | undefined;
}
export interface Measured {
  /** Gauge line to tip, mm. */
  readonly gaugeLength: number;
  readonly method: string;
  /** When it was measured, ISO 8601. */
  readonly at: string;
  /** What the length table holds for it now; left out: the table was not touched. */
  readonly tableValue?: number | null | undefined;
  readonly madeBy: string | null;
}
export interface ToolStore {
  /** By tool number. */
  list(shopId: string): Promise<ToolRecord[]>;
  find(shopId: string, id: string): Promise<ToolRecord | undefined>;
  add(shopId: string, parts: ToolParts): Promise<ToolRecord>;
  change(
    shopId: string,
    id: string,
    parts: ToolParts & { readonly basedOn: number },
  ): Promise<ToolRecord>;
  /** Records a measured length: the holder keeps its length, so the stick-out takes the difference. */
  measure(shopId: string, id: string, measured: Measured): Promise<ToolRecord>;
  /** Newest first; undefined when the shop has no such tool. */
  revisions(shopId: string, id: string): Promise<Revision[] | undefined>;
  /** All tools of the shop at their newest revision, as a setup needs them. */
  standing(shopId: string): Promise<StandingTool[]>;
}

export function openToolStore(ctx: StoreContext): ToolStore {
  const read = async (within: StoreContext, shopId: string, id: string) => {
    const found = (await readTools(within, shopId)).find((each) => each.id === id);
    if (!found) throw missing('tool');
    return found;
  };
  return {
    list: (shopId) => readTools(ctx, shopId),
    async find(shopId, id) {
      return (await readTools(ctx, shopId)).find((each) => each.id === id);
    },
    add: (shopId, parts) =>
      together(ctx, async (bound) => {
        const { transaction } = bound;
        const { number } = parts.tool;
        const row = await refusingTwins(
          () => ctx.models.tool.create({ shopId, number }, { transaction }),
          () => taken('tool', `T${number}`),
        );
        await writeTool(bound, shopId, row.id, 1, parts);
        return await read(bound, shopId, row.id);
      }),
    change: (shopId, id, { basedOn, ...parts }) =>
      together(ctx, async (bound) => {
        const number = await nextNumber(bound, 'tool_revision', shopId, id, basedOn);
        await writeTool(bound, shopId, id, number, parts);
        return await read(bound, shopId, id);
      }),
    measure: (shopId, id, measured) =>
      together(ctx, async (bound) => {
        await measureTool(bound, shopId, id, measured);
        return await read(bound, shopId, id);
      }),
    async revisions(shopId, id) {
      const rows = await revisionRows(ctx, 'tool_revision', shopId, id);
      return rows.length === 0 ? undefined : rows.map(asRevision);
    },
    async standing(shopId) {
      return (await newestTools(ctx, shopId)).map((row) => ({
        revisionId: row.id,
        tool: row.body,
        lengthOffset: row.length_offset,
        diameterOffset: row.diameter_offset,
      }));
    },
  };
}

interface ToolColumns {
  readonly tool_id: string;
  readonly body: Tool;
  readonly length_offset: number | null;
  readonly diameter_offset: number | null;
}

/** The newest revision of every tool. Served by unique (tool_id, number). */
async function newestTools(
  ctx: StoreContext,
  shopId: string,
): Promise<(ToolColumns & RevisionRow)[]> {
  return await select<ToolColumns & RevisionRow>(
    ctx,
    `select newest.*, person.name as made_by_name
     from tool
     cross join lateral (
       select * from tool_revision where tool_id = tool.id order by number desc limit 1
     ) newest
     left join person on person.id = newest.made_by
     where tool.shop_id = :shopId
     order by tool.number`,
    { shopId },
  );
}

async function readTools(ctx: StoreContext, shopId: string): Promise<ToolRecord[]> {
  const rows = await newestTools(ctx, shopId);
  const places = await select<{ machineId: string; machine: string; pocket: number; tool: number }>(
    ctx,
    `select machine.id as "machineId", machine.name as machine, pocket, tool
     from machine
     cross join lateral (
       select id from loading_revision where machine_id = machine.id order by number desc limit 1
     ) newest
     join loading_pocket on loading_revision_id = newest.id
     where machine.shop_id = :shopId
     order by machine.name, pocket`,
    { shopId },
  );
  return rows.map((row) => ({
    id: row.tool_id,
    tool: row.body,
    lengthOffset: row.length_offset,
    diameterOffset: row.diameter_offset,
    revision: asRevision(row),
    places: places
      .filter((place) => place.tool === row.body.number)
      .map(({ machineId, machine, pocket }) => ({ machineId, machine, pocket })),
  }));
}

async function writeTool(
  { models, transaction }: BoundContext,
  shopId: string,
  toolId: string,
  number: number,
  { tool, lengthOffset, diameterOffset, madeBy, reason = '' }: ToolParts,
): Promise<void> {
  await refusingTwins(
    () =>
      models.tool.update({ number: tool.number }, { where: { shopId, id: toolId }, transaction }),
    () => taken('tool', `T${tool.number}`),
  );
  await models.toolRevision.create(
    { shopId, toolId, number, body: tool, lengthOffset, diameterOffset, madeBy, reason },
    { transaction },
  );
}

async function measureTool(
  ctx: BoundContext,
  shopId: string,
  id: string,
  { gaugeLength, method, at, tableValue, madeBy }: Measured,
): Promise<void> {
  const newest = await lockNewest(ctx, 'tool_revision', shopId, id);
  const row = await newestRevision<ToolColumns>(ctx, 'tool_revision', shopId, id);
  if (!row) throw missing('tool');
  const tool: Tool = {
    ...row.body,
    gaugeLength,
    stickOut: toThousandth(row.body.stickOut + gaugeLength - row.body.gaugeLength),
    measured: { at, method },
  };
  await writeTool(ctx, shopId, id, newest + 1, {
    tool,
    lengthOffset: tableValue === undefined ? row.length_offset : tableValue,
    diameterOffset: row.diameter_offset,
    madeBy,
    reason: `Measured ${gaugeLength} mm (${method})`,
  });
}

/** Lengths are entered to the micrometre; a sum of two must not show the last bits of a double. */
function toThousandth(millimetres: number): number {
  return Math.round(millimetres * 1000) / 1000;
}
