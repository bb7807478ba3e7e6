import { randomBytes } from 'node:crypto';
import { hash, verify } from '@node-rs/argon2';

/** argon2id with 19 MiB, two passes, one lane: the least OWASP's password storage sheet recommends. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

export interface Passwords {
  hash(password: string): Promise<string>;
  /** Whether `password` made `stored`. Without `stored` it takes as long and is never so. */
  matches(stored: string | undefined, password: string): Promise<boolean>;
}

/** A hash of a password nobody knows is made once, so that an unknown address costs the same time. */
export async function openPasswords(): Promise<Passwords> {
  const nobodys = await hash(randomBytes(32).toString('base64'), COST);
  return {
    hash: (password) => hash(password, COST),
    matches: async (stored, password) => {
      const same = await verify(stored ?? nobodys, password);
      return same && stored !== undefined;
    },
  };
}
