import * as z from 'zod';
import {
  findingSchema,
  reportSummarySchema,
  severitySchema,
  verdictSchema,
  countsSchema,
} from './report';
import { jobSheetSchema } from './setup';

export const checkStateSchema = z.enum(['queued', 'running', 'done', 'failed']);
export const checkSchema = z.object({
  id: z.uuid(),
  programId: z.uuid(),
  programName: z.string(),
  programRevision: z.number().int(),
  programRevisionId: z.uuid(),
  machineId: z.uuid(),
  machineName: z.string(),
  state: checkStateSchema,
  /** Lines read so far of all lines. */
  linesRead: z.number().int(),
  lines: z.number().int(),
  verdict: verdictSchema.nullable(),
  unattendedVerdict: verdictSchema.nullable(),
  counts: countsSchema.nullable(),
  askedBy: z.string().nullable(),
  askedAt: z.string(),
  startedAt: z.string().nullable(),
  finishedAt: z.string().nullable(),
  /** Why it failed, in a sentence; null otherwise. */
  failure: z.string().nullable(),
  /** What it was held against. */
  against: z.object({
    machineRevision: z.number().int(),
    rackRevision: z.number().int(),
    loadingRevision: z.number().int(),
    offsetRevision: z.number().int(),
    macroRevision: z.number().int().nullable(),
    setupSha256: z.string(),
  }),
  /** Whether anything it was held against has a newer revision now. */
  outOfDate: z.boolean(),
});
export const programSchema = z.object({
  id: z.uuid(),
  name: z.string(),
  revision: z.number().int(),
  revisionId: z.uuid(),
  sha256: z.string(),
  bytes: z.number().int(),
  lines: z.number().int(),
  uploadedBy: z.string().nullable(),
  uploadedAt: z.string(),
  /** The newest check of the newest revision, per machine. */
  checks: z.array(checkSchema),
});
export const programPageSchema = z.object({
  programs: z.array(programSchema),
  total: z.number().int(),
});
export const programQuerySchema = z.object({
  search: z.string().max(200).default(''),
  verdict: z.enum(['', 'stopped', 'held', 'clear', 'waiting']).default(''),
  machineId: z.uuid().optional(),
  sort: z.enum(['name', 'uploadedAt', 'lines', 'verdict']).default('uploadedAt'),
  direction: z.enum(['asc', 'desc']).default('desc'),
  offset: z.coerce.number().int().min(0).default(0),
  limit: z.coerce.number().int().min(1).max(200).default(25),
});
export const programRevisionSchema = z.object({
  id: z.uuid(),
  number: z.number().int(),
  sha256: z.string(),
  bytes: z.number().int(),
  lines: z.number().int(),
  originalName: z.string(),
  uploadedBy: z.string().nullable(),
  uploadedAt: z.string(),
  checks: z.array(checkSchema),
});
export const programDetailsSchema = z.object({
  program: programSchema,
  revisions: z.array(programRevisionSchema),
  job: jobSheetSchema.nullable(),
  jobRevision: z.number().int(),
});
export const jobChangeSchema = z.strictObject({
  basedOn: z.number().int().min(0),
  job: jobSheetSchema,
});
/** One entry a file of the upload, in the order sent; a refused file does not sink the others. */
export const uploadResultSchema = z.object({
  files: z.array(
    z.discriminatedUnion('outcome', [
      z.object({
        outcome: z.literal('stored'),
        name: z.string(),
        programId: z.uuid(),
        revisionId: z.uuid(),
        revision: z.number().int(),
        /** Whether the newest revision already had exactly these bytes: no new revision was made. */
        unchanged: z.boolean(),
        checkId: z.uuid(),
      }),
      z.object({
        outcome: z.literal('refused'),
        name: z.string(),
        code: z.string(),
        reason: z.string(),
        next: z.string(),
      }),
    ]),
  ),
});
export const newCheckSchema = z.strictObject({ machineId: z.uuid() });
export const lineRangeQuerySchema = z.object({
  from: z.coerce.number().int().min(1),
  to: z.coerce.number().int().min(1),
});
export const lineRangeSchema = z.object({
  from: z.number().int(),
  /** The lines' text, decoded as UTF-8 without line ends; very long lines are cut at 2,000 characters. */
  lines: z.array(z.string()),
  total: z.number().int(),
});
export const blockWordsQuerySchema = z.object({ line: z.coerce.number().int().min(1) });
export const blockWordsSchema = z.object({
  line: z.number().int(),
  words: z.array(z.object({ letter: z.string(), value: z.number() })),
  comments: z.array(z.string()),
  /** Whether the words and comments are the whole block; expressions and the like are not among them. */
  isPlain: z.boolean(),
});
export const storedFindingSchema = findingSchema.extend({ id: z.string() });
export const findingQuerySchema = z.object({
  severity: severitySchema.optional(),
  tool: z.coerce.number().int().optional(),
  rule: z.string().optional(),
  offset: z.coerce.number().int().min(0).default(0),
  limit: z.coerce.number().int().min(1).max(5000).default(2000),
});
export const findingPageSchema = z.object({
  findings: z.array(storedFindingSchema),
  total: z.number().int(),
});
/** A check with its summary and the setup it was held against. */
export const checkDetailsSchema = z.object({
  check: checkSchema,
  summary: reportSummarySchema.nullable(),
  /** The setup document as checked, for drawing rack, table and tools as they were then. */
  setup: z.unknown(),
  /** Whether the program named is still the newest revision. */
  newestRevision: z.number().int(),
  sha256: z.string(),
});
/** The path in plan, decimated by the worker: x0 y0 x1 y1 … in machine mm of the gauge point. */
export const pathSchema = z.object({
  /** No point lies farther from the true path than this, mm. */
  tolerance: z.number(),
  /** Whether the path was cut off at the point limit; the plan says so. */
  truncated: z.boolean(),
  runs: z.array(
    z.object({
      tool: z.number().int().nullable(),
      kind: z.enum(['rapid', 'feed']),
      fromLine: z.number().int(),
      points: z.array(z.number()),
    }),
  ),
});
/** One server-sent event of a check: its state and how far it has read. */
export const checkProgressSchema = z.object({
  checkId: z.uuid(),
  state: checkStateSchema,
  linesRead: z.number().int(),
  lines: z.number().int(),
  verdict: verdictSchema.nullable(),
});
export const benchSchema = z.object({
  /** Checks asked by anyone, newest first, not yet done or done lately. */
  checks: z.array(checkSchema),
  counts: z.object({
    waiting: z.number().int(),
    stopped: z.number().int(),
    held: z.number().int(),
    clear: z.number().int(),
    outOfDate: z.number().int(),
  }),
  machines: z.array(
    z.object({
      id: z.uuid(),
      name: z.string(),
      inSpindle: z.union([z.number(), z.null(), z.literal('unknown')]),
      loaded: z.number().int(),
      pockets: z.number().int(),
      lastLoading: z.string().nullable(),
    }),
  ),
});

export type CheckState = z.output<typeof checkStateSchema>;
export type CheckRecord = z.output<typeof checkSchema>;
export type ProgramRecord = z.output<typeof programSchema>;
export type ProgramPage = z.output<typeof programPageSchema>;
export type ProgramQuery = z.output<typeof programQuerySchema>;
export type ProgramDetails = z.output<typeof programDetailsSchema>;
export type ProgramRevision = z.output<typeof programRevisionSchema>;
export type UploadResult = z.output<typeof uploadResultSchema>;
export type LineRange = z.output<typeof lineRangeSchema>;
export type BlockWords = z.output<typeof blockWordsSchema>;
export type StoredFinding = z.output<typeof storedFindingSchema>;
export type FindingPage = z.output<typeof findingPageSchema>;
export type FindingQuery = z.input<typeof findingQuerySchema>;
export type CheckDetails = z.output<typeof checkDetailsSchema>;
export type PlanPath = z.output<typeof pathSchema>;
export type CheckProgress = z.output<typeof checkProgressSchema>;
export type Bench = z.output<typeof benchSchema>;
