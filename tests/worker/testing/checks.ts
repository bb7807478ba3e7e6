import { setTimeout } from 'node:timers/promises';
import type { CheckRecord } from '#contracts';
import type { Stores } from '../../../api/src/db/database';
import type { StockedShop } from '../../../api/src/db/testing/stock-shop';

export async function ask(
  stores: Stores,
  { shopId, machineId, personId }: StockedShop,
  programRevisionId: string,
): Promise<CheckRecord> {
  const request = { programRevisionId, machineId, askedBy: personId, cause: 'asked' as const };
  return await stores.checks.ask(shopId, request);
}

/** Asks again and again, as a page without server-sent events does, until the check is over. */
export async function whenDone(
  stores: Stores,
  shopId: string,
  checkId: string,
): Promise<CheckRecord> {
  for (;;) {
    const check = await stores.checks.find(shopId, checkId);
    if (!check) throw new Error(`Check ${checkId} is gone.`);
    if (check.state === 'done' || check.state === 'failed') return check;
    await setTimeout(50);
  }
}
