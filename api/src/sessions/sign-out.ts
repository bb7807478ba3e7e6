import type { Dependencies } from '../dependencies';
import { hashOf } from './keep-session';

/** Ends the session a refresh token belongs to; no session is no error. */
export async function signOut(deps: Dependencies, token: string): Promise<void> {
  const held = await deps.database.stores.sessions.findByHash(hashOf(token));
  if (!held || held.revokedAt) return;
  await deps.database.transaction(async (stores) => {
    await stores.sessions.revokeFamily(held.shopId, held.familyId);
    await stores.audit.add(held.shopId, {
      personId: held.personId,
      action: 'session.end',
      subject: 'signed out',
    });
  });
}
