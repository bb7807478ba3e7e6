import type { Welcome } from '#contracts';
import type { ProgressFeed } from './checks/progress-feed';
import type { Config } from './config';
import type { CheckQueue } from './db/check-queue';
import type { Database } from './db/database';
import type { Logger } from './http/request-log';
import type { Turnstile } from './programs/turnstile';
import type { Passwords } from './sessions/passwords';
import type { SignInAttempts } from './sessions/sign-in-attempts';

/** What the routes and use cases work with; `main.ts` and the specs put it together. */
export interface Dependencies {
  readonly config: Pick<Config, 'secureCookies' | 'webFolder'>;
  readonly logger: Logger;
  readonly database: Database;
  readonly queue: Pick<CheckQueue, 'answers'>;
  readonly feed: ProgressFeed;
  readonly passwords: Passwords;
  readonly attempts: SignInAttempts;
  /** How many files are being stored at once: each holds a database connection while it comes in. */
  readonly uploads: Turnstile;
  readonly tokenSecret: string;
  /** Sign-ins the welcome page shows; empty unless the demo was seeded. */
  readonly demoSignIns: Welcome['demo'];
  /** Whether the server is on its way out; readiness says so. */
  isStopping(): boolean;
  now(): Date;
}
