import * as z from 'zod';

/** The role table of the product, once: routes refuse by it and the client hides by it. */
export const ROLES = ['operator', 'programmer', 'lead', 'admin'] as const;
export const roleSchema = z.enum(ROLES);
export type Role = (typeof ROLES)[number];

const EVERYONE = ROLES;
export const PERMISSIONS = {
  read: EVERYONE,
  'upload-program': EVERYONE,
  'ask-for-check': EVERYONE,
  'answer-look-hold': ['operator', 'programmer', 'lead'],
  'answer-judge-hold': ['programmer', 'lead'],
  'change-loading': ['operator', 'programmer', 'lead'],
  'record-length': ['operator', 'programmer', 'lead'],
  'record-run': ['operator', 'programmer', 'lead'],
  'enter-spoilboard': ['operator', 'programmer', 'lead'],
  'teach-pocket': ['operator', 'programmer', 'lead'],
  'say-spindle-holds': ['operator', 'programmer', 'lead'],
  'change-tools': ['programmer', 'lead'],
  'change-work-offsets': ['programmer', 'lead'],
  'change-job-sheet': ['programmer', 'lead'],
  'renumber-program': ['programmer', 'lead'],
  'change-machine': ['lead', 'admin'],
  'change-rack': ['lead', 'admin'],
  'change-macro': ['lead', 'admin'],
  'sign-off': ['lead'],
  'set-policy': ['lead'],
  'manage-people': ['admin'],
} as const satisfies Record<string, readonly Role[]>;
export type Permission = keyof typeof PERMISSIONS;

/** Whether any of a person's roles grants the permission. */
export function may(roles: readonly Role[], permission: Permission): boolean {
  const granted: readonly Role[] = PERMISSIONS[permission];
  return roles.some((role) => granted.includes(role));
}
