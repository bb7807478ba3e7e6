import type { ValidSetup } from '#contracts';
import type { Dependencies } from '../dependencies';
import type { Author } from '../http/route';

type Policy = ValidSetup['policy'];

/** A new revision of the policy; checks made before keep the one they were held against. */
export async function changePolicy(
  deps: Dependencies,
  actor: Author,
  policy: Policy,
): Promise<Policy> {
  return await deps.database.transaction(async (stores) => {
    const kept = await stores.shops.addPolicy(actor.shopId, { policy, madeBy: actor.id });
    await stores.audit.add(actor.shopId, {
      personId: actor.id,
      action: 'policy.change',
      subject: 'shop policy',
      detail: { policy: kept },
    });
    return kept;
  });
}
