import type { NewPerson, Person } from '#contracts';
import type { Dependencies } from '../dependencies';
import type { Author } from '../http/route';

export async function addPerson(
  deps: Pick<Dependencies, 'database' | 'passwords'>,
  actor: Author,
  { name, email, password, roles }: NewPerson,
): Promise<Person> {
  const passwordHash = await deps.passwords.hash(password);
  return await deps.database.transaction(async (stores) => {
    const person = await stores.people.add(actor.shopId, { name, email, passwordHash, roles });
    await stores.audit.add(actor.shopId, {
      personId: actor.id,
      action: 'person.add',
      subject: person.name,
      detail: { email: person.email, roles: person.roles },
    });
    return person;
  });
}
