import type { Dependencies } from '../dependencies';
import type { Actor } from '../http/route';
import type { ReadClaims } from './access-tokens';

/** The person a verified token names, as they are now; a sign-out ends the access token too. */
export async function findActor(
  deps: Dependencies,
  claims: ReadClaims,
): Promise<Actor | 'inactive' | 'ended'> {
  const { stores } = deps.database;
  const person = await stores.people.find(claims.shopId, claims.personId);
  if (!person) return 'ended';
  if (!person.active) return 'inactive';
  if (!(await stores.sessions.isAlive(claims.shopId, claims.sessionId))) return 'ended';
  return {
    id: person.id,
    shopId: claims.shopId,
    email: person.email,
    name: person.name,
    roles: person.roles,
    units: person.units,
    sessionId: claims.sessionId,
    accessEnds: claims.expiresAt,
  };
}
