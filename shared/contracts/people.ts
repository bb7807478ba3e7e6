import * as z from 'zod';
import { roleSchema } from './roles';

export const unitsSchema = z.enum(['mm', 'inch']);
export const emailSchema = z.email().max(200);
/** At least twelve characters: length is what a password needs. */
export const passwordSchema = z.string().min(12).max(200);
export const signInSchema = z.strictObject({ email: emailSchema, password: z.string().max(200) });
export const personSchema = z.object({
  id: z.uuid(),
  email: z.string(),
  name: z.string(),
  roles: z.array(roleSchema),
  units: unitsSchema,
  active: z.boolean(),
});
export const sessionSchema = z.object({
  person: personSchema,
  shop: z.object({ id: z.uuid(), name: z.string(), uploadLimitBytes: z.number() }),
  /** When the access token ends; the client refreshes before it. */
  expiresAt: z.string(),
});
/** What an unsigned visitor may know: whether the first person is still to be made. */
export const welcomeSchema = z.object({
  needsFirstPerson: z.boolean(),
  demo: z.array(z.object({ email: z.string(), password: z.string(), roles: z.array(roleSchema) })),
});
export const firstPersonSchema = z.strictObject({
  shopName: z.string().min(1).max(200),
  name: z.string().min(1).max(200),
  email: emailSchema,
  password: passwordSchema,
});
export const newPersonSchema = z.strictObject({
  name: z.string().min(1).max(200),
  email: emailSchema,
  password: passwordSchema,
  roles: z.array(roleSchema).min(1),
});
export const personChangeSchema = z.strictObject({
  name: z.string().min(1).max(200).optional(),
  roles: z.array(roleSchema).min(1).optional(),
  active: z.boolean().optional(),
  password: passwordSchema.optional(),
});
/** What a person may change of themselves. */
export const ownChangeSchema = z.strictObject({
  units: unitsSchema.optional(),
  name: z.string().min(1).max(200).optional(),
  password: z.strictObject({ current: z.string(), next: passwordSchema }).optional(),
});
export const peopleSchema = z.object({ people: z.array(personSchema) });
export const auditEventSchema = z.object({
  id: z.string(),
  at: z.string(),
  person: z.string().nullable(),
  action: z.string(),
  subject: z.string(),
  detail: z.record(z.string(), z.unknown()),
});
export const auditTrailSchema = z.object({ events: z.array(auditEventSchema), total: z.number() });
export const shopSchema = z.object({
  id: z.uuid(),
  name: z.string(),
  uploadLimitBytes: z.number().int(),
});
export const shopChangeSchema = z.strictObject({
  name: z.string().min(1).max(200).optional(),
  uploadLimitBytes: z
    .number()
    .int()
    .min(1024)
    .max(4 * 1024 ** 3)
    .optional(),
});

export type Units = z.output<typeof unitsSchema>;
export type Person = z.output<typeof personSchema>;
export type Session = z.output<typeof sessionSchema>;
export type Welcome = z.output<typeof welcomeSchema>;
export type SignIn = z.output<typeof signInSchema>;
export type FirstPerson = z.output<typeof firstPersonSchema>;
export type NewPerson = z.output<typeof newPersonSchema>;
export type PersonChange = z.output<typeof personChangeSchema>;
export type OwnChange = z.output<typeof ownChangeSchema>;
export type AuditEvent = z.output<typeof auditEventSchema>;
export type ShopDetails = z.output<typeof shopSchema>;
export type ShopChange = z.output<typeof shopChangeSchema>;
