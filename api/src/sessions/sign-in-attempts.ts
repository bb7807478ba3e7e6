/** Wrong passwords in a row after which sign-in pauses. */
export const LOCK_AFTER = 10;
export const LOCK_SECONDS = 15 * 60;

/** Addresses nobody has, kept at most: enough to answer alike, too few to fill the memory. */
const MOST_UNKNOWN = 10_000;

interface Count {
  failures: number;
  lockedUntil: Date | null;
}

/**
 * Counts attempts at addresses that belong to nobody, so that they are answered exactly as those that
 * do. Known people are counted in the database; a stranger's guesses need not outlive the process.
 */
export interface SignInAttempts {
  /** Counts one attempt; `lockedUntil` as for a person. */
  count(email: string, now: Date): { failures: number; lockedUntil: Date | null };
  /** Until when the address is paused, null: it is not. */
  lockedUntil(email: string): Date | null;
  forget(email: string): void;
}

export function countAttempts(most = MOST_UNKNOWN): SignInAttempts {
  const counts = new Map<string, Count>();
  return {
    count: (email, now) => {
      const key = email.toLowerCase();
      const count = counts.get(key) ?? { failures: 0, lockedUntil: null };
      count.failures += 1;
      if (LOCK_AFTER <= count.failures) {
        count.lockedUntil = new Date(now.getTime() + LOCK_SECONDS * 1000);
      }
      // Taken out and put back, so that the first in the map is the longest untouched.
      counts.delete(key);
      counts.set(key, count);
      if (most < counts.size) counts.delete(counts.keys().next().value ?? key);
      return { ...count };
    },
    lockedUntil: (email) => counts.get(email.toLowerCase())?.lockedUntil ?? null,
    forget: (email) => void counts.delete(email.toLowerCase()),
  };
}
