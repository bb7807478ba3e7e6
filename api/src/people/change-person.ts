import type { Person, PersonChange } from '#contracts';
import type { Stores } from '../db/database';
import type { Dependencies } from '../dependencies';
import { notFound, refuse } from '../http/problems';
import type { Author } from '../http/route';

/**
 * An admin's change of a person. Taking someone's access away, or giving a new password, ends all their
 * sign-ins; the shop keeps at least one active admin, or nobody could let anyone in again.
 */
export async function changePerson(
  deps: Dependencies,
  actor: Author,
  id: string,
  { name, roles, active, password }: PersonChange,
): Promise<Person> {
  const passwordHash = password && (await deps.passwords.hash(password));
  return await deps.database.transaction(async (stores) => {
    const before = await stores.people.find(actor.shopId, id);
    if (!before) throw notFound('person');
    const person = await stores.people.change(actor.shopId, id, {
      name,
      roles,
      active,
      passwordHash,
    });
    await keepOneAdmin(stores, actor.shopId);
    if (!person.active || passwordHash) await stores.sessions.revokeAllOf(actor.shopId, id);
    if (passwordHash) await stores.people.clearFailedSignIns(actor.shopId, id);
    await stores.audit.add(actor.shopId, {
      personId: actor.id,
      action: 'person.change',
      subject: person.name,
      detail: {
        before: { name: before.name, roles: before.roles, active: before.active },
        after: { name: person.name, roles: person.roles, active: person.active },
        newPassword: passwordHash !== undefined,
      },
    });
    return person;
  });
}

async function keepOneAdmin(stores: Stores, shopId: string): Promise<void> {
  if (0 < (await stores.people.countActiveWithRole(shopId, 'admin'))) return;
  throw refuse('not-possible-now', 'This would leave the shop without an active admin.', {
    next: 'Make someone else admin first.',
  });
}
