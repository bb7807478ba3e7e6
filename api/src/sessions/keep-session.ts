import { createHash, randomBytes, randomUUID } from 'node:crypto';
import type { Session } from '#contracts';
import type { Dependencies } from '../dependencies';
import type { Stores } from '../db/database';
import { notFound, refuse } from '../http/problems';
import { issueAccessToken } from './access-tokens';

/** A night shift and the weekend after it: longer than that away, and one signs in again. */
const REFRESH_DAYS = 7;
/**
 * Two pages of one browser may renew at the same moment with the same cookie; the second is not taken
 * for a thief within this time, but gets no token either: the first one's cookies serve both.
 */
const TWIN_SECONDS = 10;

export interface Tokens {
  readonly access: string;
  readonly refresh: string;
  readonly refreshEnds: Date;
}
export interface OpenSession {
  readonly session: Session;
  readonly tokens: Tokens;
}

interface Holder {
  readonly personId: string;
  readonly shopId: string;
  readonly sessionId: string;
}

/** Begins a session: a new family of refresh tokens. */
export async function beginSession(
  deps: Dependencies,
  who: { readonly personId: string; readonly shopId: string },
): Promise<OpenSession> {
  const holder = { ...who, sessionId: randomUUID() };
  return await deps.database.transaction(async (stores) => {
    await stores.sessions.removeExpired(deps.now());
    const opened = await giveTokens(deps, stores, holder);
    await stores.audit.add(who.shopId, {
      personId: who.personId,
      action: 'session.begin',
      subject: opened.session.person.name,
    });
    return opened;
  });
}

/**
 * Exchanges a refresh token for a new one. A token that comes twice is in two hands: the whole family
 * ends, and both must sign in again.
 */
export async function renewSession(deps: Dependencies, token: string): Promise<OpenSession> {
  const { stores } = deps.database;
  const held = token === '' ? undefined : await stores.sessions.findByHash(hashOf(token));
  if (!held) throw refuse('not-signed-in', 'There is no session to renew.');
  if (held.revokedAt || held.expiresAt <= deps.now()) throw ended();
  const renewed = await deps.database.transaction(async (bound) => {
    if (!(await bound.sessions.markUsed(held.shopId, held.id))) return undefined;
    const person = await bound.people.find(held.shopId, held.personId);
    if (!person?.active) return 'inactive';
    return await giveTokens(deps, bound, { ...held, sessionId: held.familyId });
  });
  if (renewed === 'inactive') {
    await stores.sessions.revokeFamily(held.shopId, held.familyId);
    throw refuse('no-longer-active', 'The shop admin has made this account inactive.');
  }
  if (renewed) return renewed;
  throw await refuseSecondUse(deps, token);
}

async function refuseSecondUse(deps: Dependencies, token: string): Promise<Error> {
  const { stores } = deps.database;
  const held = await stores.sessions.findByHash(hashOf(token));
  if (!held) return ended();
  const age = deps.now().getTime() - (held.usedAt ?? deps.now()).getTime();
  if (!held.revokedAt && age < TWIN_SECONDS * 1000) {
    return refuse('session-just-renewed', 'Another page has just renewed this session.', {
      retryAfter: 1,
    });
  }
  await deps.database.transaction(async (bound) => {
    await bound.sessions.revokeFamily(held.shopId, held.familyId);
    await bound.audit.add(held.shopId, {
      personId: held.personId,
      action: 'session.token-used-twice',
      subject: 'all pages of one sign-in were signed out',
    });
  });
  return ended();
}

/** What an open session says about itself. */
export async function describeSession(
  stores: Stores,
  who: { readonly personId: string; readonly shopId: string },
  expiresAt: Date,
): Promise<Session> {
  const person = await stores.people.find(who.shopId, who.personId);
  const shop = await stores.shops.find(who.shopId);
  if (!person || !shop) throw notFound('person');
  return { person, shop, expiresAt: expiresAt.toISOString() };
}

async function giveTokens(
  deps: Dependencies,
  stores: Stores,
  holder: Holder,
): Promise<OpenSession> {
  const now = deps.now();
  const refresh = randomBytes(32).toString('base64url');
  const refreshEnds = new Date(now.getTime() + REFRESH_DAYS * 24 * 3600 * 1000);
  await stores.sessions.add(holder.shopId, {
    personId: holder.personId,
    familyId: holder.sessionId,
    tokenHash: hashOf(refresh),
    expiresAt: refreshEnds,
  });
  const access = issueAccessToken(holder, deps.tokenSecret, now);
  const session = await describeSession(stores, holder, access.expiresAt);
  return { session, tokens: { access: access.token, refresh, refreshEnds } };
}

/** Tokens are random, so a plain hash keeps them as safe as a slow one would. */
export function hashOf(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}

function ended(): Error {
  return refuse('session-ended', 'This sign-in has ended.');
}
