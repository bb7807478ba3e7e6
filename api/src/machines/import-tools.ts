import { isDeepStrictEqual } from 'node:util';
import type { ToolRecord, ValidSetup } from '#contracts';
import type { Stores } from '../db/database';
import { demandPermission } from '../http/mount-routes';
import { refuse } from '../http/problems';
import type { Author } from '../http/route';

type Tool = ValidSetup['tools'][number];
interface FileTool {
  readonly tool: Tool;
  readonly lengthOffset: number | null;
  readonly diameterOffset: number | null;
}

export interface ImportedTools {
  readonly added: readonly number[];
  readonly replaced: readonly number[];
  /** Table entries of the file that belong to no tool of it; they stay with the machine. */
  readonly otherOffsets: Pick<ValidSetup['offsets'], 'length' | 'diameter'>;
}

/**
 * Takes the tools of a setup file into the shop, matched by number. Tools the shop has not are added; one
 * that differs is a refusal unless replacing was asked for: other machines use it too.
 */
export async function importTools(
  stores: Stores,
  actor: Author,
  setup: ValidSetup,
  { replaceTools, reason }: { readonly replaceTools: boolean; readonly reason: string },
): Promise<ImportedTools> {
  const { tools, otherOffsets } = splitTables(setup);
  const known = new Map(
    (await stores.tools.list(actor.shopId)).map((record) => [record.tool.number, record]),
  );
  const added = tools.filter((each) => !known.has(each.tool.number));
  const differing = tools.flatMap((each) => {
    const record = known.get(each.tool.number);
    return record && differs(record, each) ? [{ record, file: each }] : [];
  });
  if (0 < differing.length && !replaceTools) throw toolsDiffer(differing.map((each) => each.file));
  if (0 < added.length + differing.length) {
    const numbers = [...added, ...differing.map((each) => each.file)].map(spelt);
    demandPermission(actor.roles, ['change-tools'], `taking ${numbers.join(', ')} from the file`);
  }
  for (const each of added) {
    await stores.tools.add(actor.shopId, { ...each, madeBy: actor.id, reason });
  }
  for (const { record, file } of differing) {
    await stores.tools.change(actor.shopId, record.id, {
      ...file,
      basedOn: record.revision.number,
      madeBy: actor.id,
      reason,
    });
  }
  return {
    added: added.map((each) => each.tool.number),
    replaced: differing.map((each) => each.file.tool.number),
    otherOffsets,
  };
}

/** A file keeps length and diameter entries in tables; the shop keeps those of a tool with the tool. */
function splitTables({ tools, offsets, controller }: ValidSetup) {
  const lengthKey = ({ number }: Tool) => String(number);
  const diameterKey = ({ number }: Tool) => String(number + controller.diameterOffsetShift);
  const fileTools = tools.map((tool): FileTool => ({
    tool,
    lengthOffset: offsets.length[lengthKey(tool)] ?? null,
    diameterOffset: offsets.diameter[diameterKey(tool)] ?? null,
  }));
  const otherOffsets = {
    length: without(offsets.length, tools.map(lengthKey)),
    diameter: without(offsets.diameter, tools.map(diameterKey)),
  };
  return { tools: fileTools, otherOffsets };
}

function without(table: Record<string, number>, keys: readonly string[]): Record<string, number> {
  return Object.fromEntries(Object.entries(table).filter(([key]) => !keys.includes(key)));
}

function differs({ tool, lengthOffset, diameterOffset }: ToolRecord, file: FileTool): boolean {
  return !isDeepStrictEqual({ tool, lengthOffset, diameterOffset }, file);
}

function toolsDiffer(tools: readonly FileTool[]): Error {
  const numbers = tools.map(spelt).join(', ');
  return refuse(
    'tools-differ',
    `The shop already has ${numbers} with other figures than the file; nothing was imported.`,
    {
      fields: tools.map((each) => ({
        path: `setup.tools (T${each.tool.number})`,
        message: `${spelt(each)} of the file differs from ${spelt(each)} of the shop.`,
      })),
    },
  );
}

function spelt({ tool }: FileTool): string {
  return `T${tool.number}`;
}
