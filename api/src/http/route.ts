import type { Request, Response } from 'express';
import type { z } from 'zod';
import type { Permission, Role, Units } from '#contracts';

/** Who is asking, as the database has it at this very request. */
export interface Actor {
  readonly id: string;
  readonly shopId: string;
  readonly email: string;
  readonly name: string;
  readonly roles: readonly Role[];
  readonly units: Units;
  /** The family of refresh tokens this sign-in began. */
  readonly sessionId: string;
  /** When the access token of this request ends. */
  readonly accessEnds: Date;
}

/** As much of the actor as a use case needs: whose name the change bears and what they may do. */
export type Author = Pick<Actor, 'id' | 'shopId' | 'roles'>;

export interface OpenCall<Query, Body> {
  /** The `:id` of the path; empty where the path has none. Always a UUID otherwise. */
  readonly id: string;
  readonly query: Query;
  readonly body: Body;
  readonly request: Request;
  readonly response: Response;
}
export interface Call<Query, Body> extends OpenCall<Query, Body> {
  readonly actor: Actor;
}

/** What a route answers with: a document, nothing, bytes it writes itself, or a stream of events. */
export type Reply =
  | { readonly kind: 'document'; readonly schema: z.ZodType }
  | { readonly kind: 'nothing' }
  | { readonly kind: 'bytes'; readonly contentType: string; readonly holds: string }
  | { readonly kind: 'events'; readonly schema: z.ZodType };

/** One route as the router mounts it and the OpenAPI document describes it. */
export interface Route {
  readonly method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  /** Express spelling, below /api/v1. The only parameter is `:id`. */
  readonly path: string;
  readonly group: string;
  readonly summary: string;
  /** Any one of these lets a person in; 'anyone' asks for no sign-in. */
  readonly may: 'anyone' | readonly [Permission, ...Permission[]];
  /** What `:id` names, for "There is no such …". */
  readonly names: string;
  readonly query?: z.ZodType;
  readonly body?: z.ZodType;
  /** 'document' for bodies that hold whole setups or macros. */
  readonly size: 'small' | 'document';
  /** Whether the body is files; the route reads it itself. */
  readonly takesFiles: boolean;
  readonly status: number;
  readonly reply: Reply;
  answer(call: OpenCall<unknown, unknown> & { readonly actor?: Actor }): Promise<unknown>;
}

interface Head {
  readonly method: Route['method'];
  readonly path: string;
  readonly group: string;
  readonly summary: string;
  readonly names?: string;
  readonly size?: Route['size'];
  readonly takesFiles?: boolean;
  readonly status?: number;
}
interface Shapes<Q extends z.ZodType, B extends z.ZodType> {
  readonly query?: Q;
  readonly body?: B;
}

/** A route that answers a signed-in person with one JSON document. */
export function defineRoute<Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  route: Head &
    Shapes<Q, B> & {
      readonly may: Permission | readonly [Permission, ...Permission[]];
      readonly reply: R;
      answer(call: Call<z.output<Q>, z.output<B>>): Promise<z.output<R>>;
    },
): Route {
  return complete(route, { kind: 'document', schema: route.reply }, permissions(route.may));
}

/** A route that answers anyone with one JSON document. */
export function defineOpenRoute<Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  route: Head &
    Shapes<Q, B> & {
      readonly reply: R;
      answer(call: OpenCall<z.output<Q>, z.output<B>>): Promise<z.output<R>>;
    },
): Route {
  return complete(route, { kind: 'document', schema: route.reply }, 'anyone');
}

/** A route that writes its own reply to a signed-in person: a download, a stream of events, nothing. */
export function defineRawRoute<Q extends z.ZodType, B extends z.ZodType>(
  route: Head &
    Shapes<Q, B> & {
      readonly may: Permission | readonly [Permission, ...Permission[]];
      readonly reply: Exclude<Reply, { kind: 'document' }>;
      answer(call: Call<z.output<Q>, z.output<B>>): Promise<void>;
    },
): Route {
  return complete(route, route.reply, permissions(route.may));
}

/** As defineRawRoute, for anyone. */
export function defineOpenRawRoute(
  route: Head & {
    readonly reply: Exclude<Reply, { kind: 'document' }>;
    answer(call: OpenCall<unknown, unknown>): Promise<void>;
  },
): Route {
  return complete(route, route.reply, 'anyone');
}

function permissions(
  may: Permission | readonly [Permission, ...Permission[]],
): readonly [Permission, ...Permission[]] {
  return typeof may === 'string' ? [may] : may;
}

function complete(
  route: Head & Shapes<z.ZodType, z.ZodType> & { answer: unknown },
  reply: Reply,
  may: Route['may'],
): Route {
  return {
    method: route.method,
    path: route.path,
    group: route.group,
    summary: route.summary,
    names: route.names ?? 'entry',
    may,
    ...(route.query ? { query: route.query } : {}),
    ...(route.body ? { body: route.body } : {}),
    size: route.size ?? 'small',
    takesFiles: route.takesFiles ?? false,
    status: route.status ?? (reply.kind === 'nothing' ? 204 : 200),
    reply,
    // The router hands over what the schemas above made, and an actor wherever `may` asks for one:
    // the types part only here, where a list of routes of different shapes is made.
    answer: route.answer as Route['answer'],
  };
}
