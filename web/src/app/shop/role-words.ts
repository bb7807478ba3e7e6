import type { Role } from '#contracts';

/** What a role is for, beside its tick box. */
export const ROLE_WORDS: Readonly<Record<Role, string>> = {
  operator: 'loads the rack, measures tools, answers holds at the machine',
  programmer: 'keeps tools, work offsets and job sheets, answers holds by judgement',
  lead: 'decides what may run unattended, describes machines and racks',
  admin: 'enters people and roles, describes machines and racks',
};
