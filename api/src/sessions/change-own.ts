import type { OwnChange, Person } from '#contracts';
import type { Dependencies } from '../dependencies';
import { refuse } from '../http/problems';
import type { Actor } from '../http/route';
import { beginSession, type OpenSession } from './keep-session';

/**
 * What people change of themselves. A new password needs the one before, ends every sign-in of the
 * person, and begins a new one for the page it was changed on.
 */
export async function changeOwn(
  deps: Dependencies,
  actor: Actor,
  { units, name, password }: OwnChange,
): Promise<{ person: Person; opened?: OpenSession }> {
  const passwordHash = password && (await newHash(deps, actor, password));
  const changed = await deps.database.transaction(async (stores) => {
    const person = await stores.people.change(actor.shopId, actor.id, {
      units,
      name,
      passwordHash,
    });
    if (passwordHash) await stores.sessions.revokeAllOf(actor.shopId, actor.id);
    await stores.audit.add(actor.shopId, {
      personId: actor.id,
      action: passwordHash ? 'person.change-own-password' : 'person.change-own',
      subject: person.name,
      detail: { units: person.units, name: person.name },
    });
    return person;
  });
  if (!passwordHash) return { person: changed };
  const opened = await beginSession(deps, { personId: actor.id, shopId: actor.shopId });
  return { person: changed, opened };
}

async function newHash(
  deps: Dependencies,
  actor: Actor,
  { current, next }: { readonly current: string; readonly next: string },
): Promise<string> {
  const stored = await deps.database.stores.people.passwordHash(actor.shopId, actor.id);
  if (!(await deps.passwords.matches(stored, current))) {
    throw refuse('wrong-fields', 'The present password is not right, so it was not changed.', {
      fields: [
        {
          path: 'password.current',
          message: 'This is not your present password: type it again.',
          expected: 'your present password',
        },
      ],
    });
  }
  return await deps.passwords.hash(next);
}
