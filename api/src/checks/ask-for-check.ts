import type { CheckRecord } from '#contracts';
import type { Stores } from '../db/database';
import type { Author } from '../http/route';

export interface Asked {
  readonly programRevisionId: string;
  readonly machineId: string;
  readonly cause: 'upload' | 'asked';
}

/** Queues a check against the machine as it stands now, in the transaction of whatever led to it. */
export async function askForCheck(
  stores: Stores,
  actor: Author,
  asked: Asked,
): Promise<CheckRecord> {
  const check = await stores.checks.ask(actor.shopId, { ...asked, askedBy: actor.id });
  await stores.audit.add(actor.shopId, {
    personId: actor.id,
    action: 'check.ask',
    subject: `${check.programName} on ${check.machineName}`,
    detail: { checkId: check.id, programRevision: check.programRevision, cause: asked.cause },
  });
  return check;
}
