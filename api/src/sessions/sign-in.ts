import type { Person, SignIn } from '#contracts';
import type { Dependencies } from '../dependencies';
import type { SignInRecord } from '../db/stores/people-store';
import { refuse, type Refusal } from '../http/problems';
import { LOCK_AFTER, LOCK_SECONDS } from './sign-in-attempts';

export interface SignedIn {
  readonly person: Person;
  readonly shopId: string;
}

/**
 * Who the e-mail and password belong to. An attempt is counted before the password is looked at, so
 * that guesses sent side by side are counted too; a right password clears the count. An address that
 * nobody has takes the same steps, the same time and the same answers.
 */
export async function signIn(deps: Dependencies, { email, password }: SignIn): Promise<SignedIn> {
  const record = await deps.database.stores.people.findByEmail(email);
  const attempts = record ? countInDatabase(deps, record) : countInMemory(deps, email);
  const lockedUntil = attempts.lockedUntil;
  if (lockedUntil && deps.now() < lockedUntil) throw paused(lockedUntil, deps.now());
  if (lockedUntil) await attempts.clear();
  const counted = await attempts.count();
  if (LOCK_AFTER < counted.failures) {
    throw paused(counted.lockedUntil ?? deps.now(), deps.now());
  }
  const matches = await deps.passwords.matches(record?.passwordHash, password);
  if (!record || !matches) {
    if (record && counted.failures === LOCK_AFTER) await notePause(deps, record);
    throw refuse('wrong-sign-in', 'No active person has this e-mail and password.');
  }
  await attempts.clear();
  if (!record.person.active) {
    throw refuse('no-longer-active', 'The shop admin has made this account inactive.');
  }
  return { person: record.person, shopId: record.shopId };
}

interface Attempts {
  readonly lockedUntil: Date | null;
  count(): Promise<{ failures: number; lockedUntil: Date | null }>;
  clear(): Promise<void>;
}

function countInDatabase(
  deps: Dependencies,
  { person, shopId, lockedUntil }: SignInRecord,
): Attempts {
  const { people } = deps.database.stores;
  return {
    lockedUntil,
    count: async () => {
      const limit = { lockAfter: LOCK_AFTER, lockSeconds: LOCK_SECONDS };
      const counted = await people.recordFailedSignIn(shopId, person.id, limit);
      return { failures: counted.failedSignIns, lockedUntil: counted.lockedUntil };
    },
    clear: () => people.clearFailedSignIns(shopId, person.id),
  };
}

function countInMemory(deps: Dependencies, email: string): Attempts {
  return {
    lockedUntil: deps.attempts.lockedUntil(email),
    count: () => Promise.resolve(deps.attempts.count(email, deps.now())),
    clear: () => Promise.resolve(deps.attempts.forget(email)),
  };
}

async function notePause(deps: Dependencies, { person, shopId }: SignInRecord): Promise<void> {
  await deps.database.stores.audit.add(shopId, {
    personId: person.id,
    action: 'session.pause',
    subject: person.name,
    detail: { wrongPasswords: LOCK_AFTER, seconds: LOCK_SECONDS },
  });
}

function paused(until: Date, now: Date): Refusal {
  const seconds = Math.max(1, (until.getTime() - now.getTime()) / 1000);
  const minutes = Math.ceil(seconds / 60);
  const span = minutes === 1 ? '1 minute' : `${minutes} minutes`;
  return refuse(
    'sign-in-paused',
    `There were ${LOCK_AFTER} wrong passwords in a row for this e-mail, so sign-in is paused for ${span}.`,
    { retryAfter: seconds },
  );
}
