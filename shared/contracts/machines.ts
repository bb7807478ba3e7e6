import * as z from 'zod';
import {
  controllerSchema,
  loadingSchema,
  machineSchema,
  offsetsSchema,
  policySchema,
  rackSchema,
  setupSchema,
  toolSchema,
} from './setup';

/** Who made a revision, when and why. Revisions are immutable; `number` counts from 1. */
export const revisionSchema = z.object({
  number: z.number().int().min(1),
  madeBy: z.string().nullable(),
  madeAt: z.string(),
  reason: z.string(),
});
/** Sent with every change: the revision it was based on (409 when another came between) and why. */
const change = {
  basedOn: z.number().int().min(0),
  reason: z.string().max(500).default(''),
};
export const macroTextSchema = z.strictObject({
  name: z.string().min(1).max(200),
  text: z.string().max(2_000_000),
});

export const machineListSchema = z.object({
  machines: z.array(
    z.object({
      id: z.uuid(),
      name: z.string(),
      edge: z.enum(['front', 'back', 'left', 'right']),
      pockets: z.number().int(),
      loaded: z.number().int(),
      revision: z.number().int(),
      loadingRevision: z.number().int(),
    }),
  ),
});
/** A machine with everything that stands on it now. */
export const machineDetailsSchema = z.object({
  id: z.uuid(),
  name: z.string(),
  /** The engine's machine and controller parts, at `revision`. */
  machine: machineSchema,
  controller: controllerSchema,
  revision: revisionSchema,
  rack: rackSchema,
  rackRevision: revisionSchema,
  loading: loadingSchema,
  loadingRevision: revisionSchema,
  work: offsetsSchema.shape.work,
  offsetRevision: revisionSchema,
  macro: macroTextSchema.nullable(),
  macroRevision: revisionSchema.nullable(),
});
export const revisionListSchema = z.object({ revisions: z.array(revisionSchema) });
export const loadingHistorySchema = z.object({
  revisions: z.array(revisionSchema.extend({ loading: loadingSchema })),
});
export const descriptionChangeSchema = z.strictObject({
  ...change,
  machine: machineSchema,
  controller: controllerSchema,
});
export const rackChangeSchema = z.strictObject({ ...change, rack: rackSchema });
export const loadingChangeSchema = z.strictObject({ ...change, loading: loadingSchema });
export const offsetChangeSchema = z.strictObject({
  ...change,
  work: offsetsSchema.shape.work,
});
export const macroChangeSchema = z.strictObject({ ...change, macro: macroTextSchema });
/** Import of a setup file: a new machine, or new revisions of an existing one. Tools are matched by number. */
export const setupImportSchema = z.strictObject({
  setup: setupSchema,
  reason: z.string().max(500).default(''),
  /** Whether tools of the file replace tools of the shop that differ; without it a difference is a 409. */
  replaceTools: z.boolean().default(false),
});

export const toolRecordSchema = z.object({
  id: z.uuid(),
  tool: toolSchema,
  /** Length and diameter table values kept for this tool number, null: none. */
  lengthOffset: z.number().nullable(),
  diameterOffset: z.number().nullable(),
  revision: revisionSchema,
  /** Where it sits now, on every machine. */
  places: z.array(z.object({ machineId: z.uuid(), machine: z.string(), pocket: z.number() })),
});
export const toolListSchema = z.object({ tools: z.array(toolRecordSchema) });
export const toolChangeSchema = z.strictObject({
  ...change,
  tool: toolSchema,
  lengthOffset: z.number().nullable().default(null),
  diameterOffset: z.number().nullable().default(null),
});
export const newToolSchema = toolChangeSchema.omit({ basedOn: true });
/** A measured gauge length, mm; `method` as the shop names it (setter, block, presetter). */
export const measurementSchema = z.strictObject({
  gaugeLength: z.number().positive(),
  method: z.string().min(1).max(100),
  /** Whether the controller's table now holds the new length too. */
  inTable: z.boolean().default(true),
});
export const shopPolicySchema = policySchema;

export type Revision = z.output<typeof revisionSchema>;
export type MachineList = z.output<typeof machineListSchema>;
export type MachineDetails = z.output<typeof machineDetailsSchema>;
export type LoadingHistory = z.output<typeof loadingHistorySchema>;
export type DescriptionChange = z.input<typeof descriptionChangeSchema>;
export type RackChange = z.input<typeof rackChangeSchema>;
export type LoadingChange = z.input<typeof loadingChangeSchema>;
export type OffsetChange = z.input<typeof offsetChangeSchema>;
export type MacroChange = z.input<typeof macroChangeSchema>;
export type SetupImport = z.input<typeof setupImportSchema>;
export type ToolRecord = z.output<typeof toolRecordSchema>;
export type ToolList = z.output<typeof toolListSchema>;
export type ToolChange = z.input<typeof toolChangeSchema>;
export type NewTool = z.input<typeof newToolSchema>;
export type Measurement = z.input<typeof measurementSchema>;
