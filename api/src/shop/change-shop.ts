import type { ShopChange, ShopDetails } from '#contracts';
import type { Dependencies } from '../dependencies';
import type { Author } from '../http/route';

export async function changeShop(
  deps: Dependencies,
  actor: Author,
  change: ShopChange,
): Promise<ShopDetails> {
  return await deps.database.transaction(async (stores) => {
    const shop = await stores.shops.change(actor.shopId, change);
    await stores.audit.add(actor.shopId, {
      personId: actor.id,
      action: 'shop.change',
      subject: shop.name,
      detail: { ...change },
    });
    return shop;
  });
}
