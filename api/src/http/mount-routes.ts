import express, { Router, type Request, type RequestHandler, type Response } from 'express';
import type { z } from 'zod';
import { may, PERMISSIONS, wrongFields, type Permission, type Role } from '#contracts';
import { notFound, refuse } from './problems';
import type { Actor, Route } from './route';

/** Bytes of a JSON body: forms are small, setups and macros hold whole texts. */
const BODY_LIMITS = { small: 256 * 1024, document: 16 * 1024 * 1024 } as const;
const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/i;

export interface Guards {
  /** Puts the signed-in person on the request, or refuses. */
  readonly signedIn: RequestHandler;
  readonly notForged: RequestHandler;
  actorOf(request: Request): Actor;
}

/**
 * Mounts every route of the table. The order is the same for all: not forged, signed in, allowed, read,
 * valid; a body is read only once its sender may write.
 */
export function mountRoutes(routes: readonly Route[], guards: Guards): Router {
  const router = Router();
  for (const route of routes) {
    const open = route.may === 'anyone';
    router[route.method](
      route.path,
      guards.notForged,
      ...(open ? [] : [guards.signedIn, allow(route, guards)]),
      ...(route.body ? [readBody(route)] : []),
      answer(route, guards),
    );
  }
  return router;
}

function allow(route: Route, guards: Guards): RequestHandler {
  return (request, _response, next) => {
    if (route.may !== 'anyone') demandPermission(guards.actorOf(request).roles, route.may);
    next();
  };
}

/** Refuses, naming the roles that would do, unless one of `permissions` is granted. */
export function demandPermission(
  roles: readonly Role[],
  permissions: readonly [Permission, ...Permission[]],
  what = 'this',
): void {
  if (permissions.some((permission) => may(roles, permission))) return;
  const able = [...new Set(permissions.flatMap((permission) => PERMISSIONS[permission]))];
  throw refuse(
    'not-allowed',
    `You are signed in as ${listed(roles)}; ${what} needs ${listed(able, 'or')}.`,
  );
}

function readBody(route: Route): RequestHandler {
  const read = express.json({ limit: BODY_LIMITS[route.size], strict: false });
  return (request, response, next) => {
    // Anything else would be skipped by the reader and then look like an empty body.
    if (request.is('application/json') === false) {
      throw refuse('unreadable-body', 'The request must be JSON (content type application/json).');
    }
    read(request, response, next);
  };
}

function answer(route: Route, guards: Guards): RequestHandler {
  return async (request, response) => {
    const call = {
      id: idOf(route, request),
      query: route.query ? valid(route.query, request.query) : undefined,
      body: route.body ? valid(route.body, request.body) : undefined,
      request,
      response,
      ...(route.may === 'anyone' ? {} : { actor: guards.actorOf(request) }),
    };
    const reply = await route.answer(call);
    if (route.reply.kind === 'document') sendDocument(response, route.status, reply);
    else if (route.reply.kind === 'nothing') response.status(route.status).end();
  };
}

function sendDocument(response: Response, status: number, reply: unknown): void {
  response.status(status).setHeader('Cache-Control', 'no-store').json(reply);
}

/** An id that is no UUID names nothing, just like one of another shop. */
function idOf(route: Route, request: Request): string {
  if (!route.path.includes(':id')) return '';
  const id = request.params['id'];
  if (typeof id !== 'string' || !UUID.test(id)) throw notFound(route.names);
  return id;
}

function valid(schema: z.ZodType, input: unknown): unknown {
  const read = schema.safeParse(input ?? {});
  if (read.success) return read.data;
  const fields = wrongFields(read.error.issues, input ?? {});
  const first = fields[0];
  const more = fields.length === 1 ? '' : ` (and ${fields.length - 1} more)`;
  throw refuse('wrong-fields', `${first?.message ?? 'The request cannot be used.'}${more}`, {
    fields,
  });
}

function listed(words: readonly string[], conjunction = 'and'): string {
  if (words.length <= 1) return words[0] ?? 'nobody';
  return `${words.slice(0, -1).join(', ')} ${conjunction} ${words.at(-1)}`;
}
