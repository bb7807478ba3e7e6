import { createServer, type Server } from 'node:http';
import { once } from 'node:events';
import { join } from 'node:path';
import { tmpdir } from 'node:os';
import { randomUUID } from 'node:crypto';
import type { Express } from 'express';
import type { Role } from '#contracts';
import { API_BASE, buildApp, routeTables } from '../../../api/src/app';
import { openProgressFeed } from '../../../api/src/checks/progress-feed';
import { makeTestDatabase } from '../../../api/src/db/testing/test-database';
import type { Dependencies } from '../../../api/src/dependencies';
import { guardAgainstForgery } from '../../../api/src/http/csrf';
import { openLog } from '../../../api/src/http/request-log';
import type { Route } from '../../../api/src/http/route';
import { openTurnstile } from '../../../api/src/programs/turnstile';
import { openPasswords } from '../../../api/src/sessions/passwords';
import { sessionCookies } from '../../../api/src/sessions/session-cookies';
import { countAttempts } from '../../../api/src/sessions/sign-in-attempts';
import { openClient, type Client } from './client';

export const PASSWORD = 'a-long-enough-password';
const TOKEN_SECRET = 'a-secret-of-the-specs-alone-0123456789';

export interface TestHouse {
  readonly deps: Dependencies;
  readonly app: Express;
  readonly server: Server;
  /** http://127.0.0.1:port */
  readonly address: string;
  /** Every route as mounted, with its base. */
  readonly routes: readonly { readonly base: string; readonly route: Route }[];
  readonly url: string;
  readonly tokenSecret: string;
  /** Moves the clock of the house; the database keeps its own. */
  advance(seconds: number): void;
  /** A visitor with no session. */
  visitor(): Client;
  /** A new shop with nobody in it yet. */
  addShop(name?: string): Promise<string>;
  /** A signed-in person with these roles, made for the occasion. */
  signedIn(shopId: string, ...roles: Role[]): Promise<SignedInClient>;
  close(): Promise<void>;
}
export interface SignedInClient extends Client {
  readonly email: string;
  readonly personId: string;
  readonly shopId: string;
}

/** The real app on a real database of its own, listening on a free loopback port. */
export async function openTestHouse(): Promise<TestHouse> {
  const { database, queue, url, drop } = await makeTestDatabase();
  const logger = openLog('silent');
  let ahead = 0;
  const passwords = await openPasswords();
  const feed = await openProgressFeed(url, logger);
  const deps: Dependencies = {
    config: { secureCookies: false, webFolder: join(tmpdir(), 'no-web-client-here') },
    logger,
    database,
    queue,
    feed,
    passwords,
    attempts: countAttempts(),
    uploads: openTurnstile(3),
    tokenSecret: TOKEN_SECRET,
    demoSignIns: [],
    isStopping: () => false,
    now: () => new Date(Date.now() + ahead),
  };
  const app = buildApp(deps);
  const server = createServer(app).listen(0, '127.0.0.1');
  await once(server, 'listening');
  const place = server.address();
  const address = `http://127.0.0.1:${typeof place === 'object' && place ? place.port : 0}`;
  const tables = routeTables(deps, {
    csrf: guardAgainstForgery(TOKEN_SECRET, false),
    cookies: sessionCookies(false),
  });
  const routes = tables.flatMap(({ base, routes: own }) => own.map((route) => ({ base, route })));
  const passwordHash = await passwords.hash(PASSWORD);
  const visitor = () => openClient(address, API_BASE, routes);

  return {
    deps,
    app,
    server,
    address,
    routes,
    url,
    tokenSecret: TOKEN_SECRET,
    advance: (seconds) => (ahead += seconds * 1000),
    visitor,
    addShop: async (name = 'Plain Joinery') => (await database.stores.shops.create({ name })).id,
    signedIn: async (shopId, ...roles) => {
      const email = `${roles.join('.')}.${randomUUID().slice(0, 8)}@shop.example`;
      const name = `Some ${roles.join(' and ')}`;
      const person = await database.stores.people.add(shopId, { email, name, passwordHash, roles });
      const client = visitor();
      await client.post('/session', { email, password: PASSWORD });
      return { ...client, email, personId: person.id, shopId };
    },
    close: async () => {
      await feed.stop();
      server.closeAllConnections();
      server.close();
      await drop();
    },
  };
}
