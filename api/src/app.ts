import compression from 'compression';
import cookieParser from 'cookie-parser';
import express, { type Express, type Request, type Response } from 'express';
import { benchRoutes } from './bench/bench-routes';
import { checkRoutes } from './checks/check-routes';
import type { Dependencies } from './dependencies';
import { healthRoutes } from './health/health-routes';
import { answerProblems, answerUnknownRoute } from './http/answer-problems';
import { guardAgainstForgery, type CsrfGuard } from './http/csrf';
import { mountRoutes } from './http/mount-routes';
import { logRequests } from './http/request-log';
import type { Route } from './http/route';
import { secureHeaders } from './http/security-headers';
import { serveWebClient } from './http/web-client';
import { machineRoutes } from './machines/machine-routes';
import { peopleRoutes } from './people/people-routes';
import { programRoutes } from './programs/program-routes';
import { referenceRoutes } from './reference/reference-routes';
import { authenticate } from './sessions/authenticate';
import { findActor } from './sessions/find-actor';
import { limitSignIns } from './sessions/limit-sign-ins';
import { sessionCookies, type SessionCookies } from './sessions/session-cookies';
import { sessionRoutes } from './sessions/session-routes';
import { shopRoutes } from './shop/shop-routes';
import { toolRoutes } from './tools/tool-routes';

export const API_BASE = '/api/v1';

/** The whole HTTP side of the product, built from its parts. It never listens: `main.ts` and specs do. */
export function buildApp(deps: Dependencies): Express {
  const { secureCookies, webFolder } = deps.config;
  const csrf = guardAgainstForgery(deps.tokenSecret, secureCookies);
  const authentication = authenticate(deps.tokenSecret, (claims) => findActor(deps, claims));
  const guards = { ...authentication, notForged: csrf.demand };
  const tables = routeTables(deps, { csrf, cookies: sessionCookies(secureCookies) });

  const app = express();
  app.disable('x-powered-by');
  // Nothing the API sends may be kept, so a hash of every reply would be for nothing.
  app.disable('etag');
  // Without this a query of nested brackets would reach the routes as objects.
  app.set('query parser', 'simple');
  app.use(logRequests(deps.logger), ...secureHeaders({ overTls: secureCookies }));
  app.use(compression({ filter: mayCompress }), cookieParser());
  // Not beyond the API: a file that may be kept by anyone must carry nobody's cookie.
  app.use(API_BASE, csrf.offer, limitSignIns());
  for (const { base, routes } of tables) app.use(base || '/', mountRoutes(routes, guards));
  app.use(API_BASE, answerUnknownRoute);
  app.use(serveWebClient(webFolder), answerUnknownRoute);
  app.use(answerProblems(deps.logger));
  return app;
}

/** Every route there is, as mounted; the reference describes the others and itself. */
export function routeTables(
  deps: Dependencies,
  keeping: { readonly csrf: CsrfGuard; readonly cookies: SessionCookies },
): { readonly base: string; readonly routes: readonly Route[] }[] {
  const api = [
    ...sessionRoutes(deps, keeping),
    ...benchRoutes(deps),
    ...programRoutes(deps),
    ...checkRoutes(deps),
    ...machineRoutes(deps),
    ...toolRoutes(deps),
    ...peopleRoutes(deps),
    ...shopRoutes(deps),
  ];
  const root = { base: '', routes: healthRoutes(deps) };
  const reference = referenceRoutes((own) => [{ base: API_BASE, routes: [...api, ...own] }, root]);
  return [{ base: API_BASE, routes: [...api, ...reference] }, root];
}

/** A compressed stream would sit in the compressor until it is long enough to be worth sending. */
function mayCompress(request: Request, response: Response): boolean {
  const type = String(response.getHeader('Content-Type') ?? '');
  return !type.startsWith('text/event-stream') && compression.filter(request, response);
}
