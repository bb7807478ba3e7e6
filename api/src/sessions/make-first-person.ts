import type { FirstPerson, Person } from '#contracts';
import type { Dependencies } from '../dependencies';
import { refuse } from '../http/problems';

/**
 * The shop and the person who describes it to everyone else. Only while nobody exists: afterwards people
 * are added by an admin.
 */
export async function makeFirstPerson(
  deps: Dependencies,
  { shopName, name, email, password }: FirstPerson,
): Promise<{ shopId: string; person: Person }> {
  // Hashed before the transaction: it takes longer than everything in it.
  const passwordHash = await deps.passwords.hash(password);
  return await deps.database.transaction(async (stores) => {
    if (await stores.people.anyone()) {
      throw refuse('not-possible-now', 'There is a first person already.', {
        next: 'Sign in, or ask the shop admin for an account.',
      });
    }
    const shop = await stores.shops.create({ name: shopName });
    const person = await stores.people.add(shop.id, {
      email,
      name,
      passwordHash,
      roles: ['admin', 'lead'],
    });
    await stores.audit.add(shop.id, {
      personId: person.id,
      action: 'shop.create',
      subject: shopName,
      detail: { firstPerson: email },
    });
    return { shopId: shop.id, person };
  });
}
