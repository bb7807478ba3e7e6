import * as z from 'zod';

/** The report contract (`nightlatch-report`, version 1). Mirrors the engine's Report type. */
const whole = z.number().int().min(0);
export const severitySchema = z.enum(['stop', 'hold', 'note']);
export const verdictSchema = z.enum(['stopped', 'held', 'clear']);
export const countsSchema = z.strictObject({ stop: whole, hold: whole, note: whole });
const columns = z.tuple([whole, whole]);
const within = z.strictObject({
  text: z.string(),
  line: whole.min(1),
  columns: columns.optional(),
});
export type FindingValueDocument =
  string | number | boolean | null | readonly FindingValueDocument[];
const findingValue: z.ZodType<FindingValueDocument> = z.lazy(() =>
  z.union([z.string(), z.number(), z.boolean(), z.null(), z.array(findingValue)]),
);
export const findingSchema = z.strictObject({
  rule: z.string(),
  severity: severitySchema,
  unattended: severitySchema.optional(),
  line: whole.min(1),
  endLine: whole.min(1),
  worstLine: whole.min(1),
  count: whole.min(1),
  columns: columns.optional(),
  within: within.optional(),
  blockDelete: z.literal('on').optional(),
  assumed: z
    .array(
      z.strictObject({
        line: whole.min(1),
        within: within.optional(),
        condition: z.string().min(1),
      }),
    )
    .optional(),
  tool: whole.optional(),
  folded: whole.optional(),
  hold: z.enum(['look', 'judge']).optional(),
  message: z.string().min(1),
  advice: z.string().min(1),
  data: z.record(z.string(), findingValue),
});
const corner = z.strictObject({ x: z.number(), y: z.number(), z: z.number() });
export const extentSchema = z.strictObject({ min: corner, max: corner });
const window = z.tuple([z.number(), z.number()]).nullable();
export const toolUseSchema = z.strictObject({
  number: whole,
  pocket: whole.nullable(),
  firstLine: whole.min(1),
  changes: whole,
  cutSeconds: z.number(),
  cutLength: z.number(),
  lowest: z.number().nullable(),
});
const workZeroWindowSchema = z.record(
  z.string(),
  z.strictObject({ x: window, y: window, z: window }),
);
/** All of a report but its findings: what the product stores as a check's summary. */
export const reportSummarySchema = z.strictObject({
  format: z.literal('nightlatch-report'),
  version: z.literal(1),
  engine: z.string(),
  program: z.strictObject({
    name: z.string(),
    sha256: z.string().regex(/^[0-9a-f]{64}$/),
    bytes: whole,
    lines: whole,
  }),
  setup: z.strictObject({ sha256: z.string().regex(/^[0-9a-f]{64}$/) }),
  verdict: verdictSchema,
  counts: countsSchema,
  unattended: z.strictObject({ verdict: verdictSchema, counts: countsSchema }),
  tools: z.array(toolUseSchema),
  extents: z.strictObject({
    gauge: extentSchema.nullable(),
    work: z.record(z.string(), extentSchema),
  }),
  workZeroWindow: workZeroWindowSchema,
  seconds: z.strictObject({
    total: z.number(),
    cutting: z.number(),
    rapid: z.number(),
    changes: z.number(),
    dwell: z.number(),
  }),
  material: z.strictObject({ used: z.boolean(), cell: z.number(), bytes: whole }),
  coverage: z.strictObject({ blocks: whole, modelled: whole }),
  dependsOn: z.strictObject({
    tools: z.array(whole),
    pockets: z.array(whole),
    offsets: z.array(z.string()),
    pairs: z.array(z.tuple([whole, whole])),
  }),
  blind: z.array(z.string()),
});
export const reportSchema = z.strictObject({
  ...reportSummarySchema.shape,
  findings: z.array(findingSchema),
});
export type ReportDocument = z.output<typeof reportSchema>;
export type ReportSummary = z.output<typeof reportSummarySchema>;
export type FindingDocument = z.output<typeof findingSchema>;
