import { policySchema, type ShopChange, type ShopDetails, type ValidSetup } from '#contracts';
import type { ShopRow } from '../models/people';
import { inTransaction, together, type StoreContext } from '../store-context';
import { missing } from '../store-refusal';

type Policy = ValidSetup['policy'];

export interface ShopStore {
  create(shop: { readonly name: string }): Promise<ShopDetails>;
  find(shopId: string): Promise<ShopDetails | undefined>;
  change(shopId: string, change: ShopChange): Promise<ShopDetails>;
  /** The policy that stands now; a shop that never set one has the defaults of the contract. */
  policy(shopId: string): Promise<Policy>;
  addPolicy(
    shopId: string,
    change: { readonly policy: Policy; readonly madeBy: string | null; readonly reason?: string },
  ): Promise<Policy>;
}

export function openShopStore(ctx: StoreContext): ShopStore {
  const { shop, policyRevision } = ctx.models;
  const newestPolicy = (shopId: string, within: StoreContext) =>
    policyRevision.findOne({
      where: { shopId },
      order: [['number', 'desc']],
      ...inTransaction(within),
    });
  return {
    async create({ name }) {
      return asShop(await shop.create({ name }, { ...inTransaction(ctx) }));
    },
    async find(shopId) {
      const row = await shop.findByPk(shopId, { ...inTransaction(ctx) });
      return row ? asShop(row) : undefined;
    },
    async change(shopId, change) {
      const row = await shop.findByPk(shopId, { ...inTransaction(ctx) });
      if (!row) throw missing('shop');
      return asShop(await row.update(change, { ...inTransaction(ctx) }));
    },
    async policy(shopId) {
      return (await newestPolicy(shopId, ctx))?.body ?? policySchema.parse({});
    },
    addPolicy(shopId, { policy, madeBy, reason = '' }) {
      return together(ctx, async (bound) => {
        const { transaction } = bound;
        const row = await shop.findByPk(shopId, { transaction, lock: transaction.LOCK.UPDATE });
        if (!row) throw missing('shop');
        const number = ((await newestPolicy(shopId, bound))?.number ?? 0) + 1;
        await policyRevision.create(
          { shopId, number, body: policy, madeBy, reason },
          { transaction },
        );
        return policy;
      });
    },
  };
}

function asShop(row: ShopRow): ShopDetails {
  return { id: row.id, name: row.name, uploadLimitBytes: row.uploadLimitBytes };
}
