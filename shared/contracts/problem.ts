import * as z from 'zod';

/** RFC 9457 problem details. `code` is ours and stable; `next` says what the person can do. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string(),
  instance: z.string().optional(),
  code: z.string(),
  next: z.string().optional(),
  requestId: z.string().optional(),
  /** One entry a wrong field: path, what was expected, an example where one helps. */
  fields: z
    .array(
      z.object({
        path: z.string(),
        message: z.string(),
        expected: z.string().optional(),
        example: z.unknown().optional(),
      }),
    )
    .optional(),
});
export type Problem = z.output<typeof problemSchema>;
