import type { Dependencies } from '../dependencies';
import type { Actor } from '../http/route';
import type { ReadClaims } from './access-tokens';

/** The person a verified token names, as they are now. */
export async function findActor(
  deps: Dependencies,
  claims: ReadClaims,
): Promise<Actor | 'inactive' | 'ended'> {
  const { stores } = deps.database;
  const person = await stores.people.find(claims.shopId, claims.personId);
  if (!person) return 'ended';
  if (!person.active) return 'inactive';
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
