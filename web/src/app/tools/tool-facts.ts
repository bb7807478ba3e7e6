import * as z from 'zod';
import type { ToolRecord } from '#contracts';
import { toolSchema } from '#contracts';
import type { Held } from '../ui/facts/revised-facts';

type Facts = Readonly<Record<string, unknown>>;

/** What a new tool starts from: only what is the same for nearly every tool; every figure is asked. */
export const NEW_TOOL: Facts = {
  turns: 'cw',
  used: 0,
  measured: null,
  touched: null,
  sisterOf: null,
  holder: { steps: [] },
  lengthOffset: null,
  diameterOffset: null,
};

/** Tool and table entries side by side, as one page shows them. */
export function factsOf({ tool, lengthOffset, diameterOffset }: ToolRecord): Facts {
  return { ...tool, lengthOffset, diameterOffset };
}

export function toolPartOf(facts: Facts): Facts {
  const entries = Object.entries(facts).filter(([key]) => !(key in tableSchema.shape));
  return Object.fromEntries(entries);
}

const tableSchema = z.object({
  lengthOffset: z.number().nullable(),
  diameterOffset: z.number().nullable(),
});

/** The facts held against the contract and parted again into what the server takes. */
export function validateFacts(facts: Facts): Held<{
  tool: z.output<typeof toolSchema>;
  lengthOffset: number | null;
  diameterOffset: number | null;
}> {
  const tool = toolSchema.safeParse(toolPartOf(facts));
  if (!tool.success) return tool;
  const tables = tableSchema.safeParse(facts);
  if (!tables.success) return tables;
  return { success: true, data: { tool: tool.data, ...tables.data } };
}
