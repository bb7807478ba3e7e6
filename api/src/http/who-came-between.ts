import type { Revision } from '#contracts';
import { StoreRefusal } from '../db/store-refusal';
import { changedMeanwhile } from './problems';

/**
 * Runs a change that is based on a revision. When another change came between, the refusal names who made
 * it and when; `revisions` reads them, newest first, once the change has been rolled back.
 */
export async function namingWhoCameBetween<T>(
  what: string,
  change: () => Promise<T>,
  revisions: () => Promise<readonly Revision[] | undefined>,
): Promise<T> {
  try {
    return await change();
  } catch (error) {
    if (!(error instanceof StoreRefusal) || error.code !== 'stale') throw error;
    const newest = (await revisions())?.[0];
    throw newest ? changedMeanwhile(what, newest) : error;
  }
}
