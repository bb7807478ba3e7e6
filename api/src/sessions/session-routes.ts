import type { Response } from 'express';
import {
  firstPersonSchema,
  ownChangeSchema,
  personSchema,
  sessionSchema,
  signInSchema,
  welcomeSchema,
} from '#contracts';
import type { Dependencies } from '../dependencies';
import { cookieOf, type CsrfGuard } from '../http/csrf';
import { defineOpenRawRoute, defineOpenRoute, defineRoute, type Route } from '../http/route';
import { changeOwn } from './change-own';
import { beginSession, describeSession, renewSession, type OpenSession } from './keep-session';
import { makeFirstPerson } from './make-first-person';
import { REFRESH_COOKIE, type SessionCookies } from './session-cookies';
import { signIn } from './sign-in';
import { signOut } from './sign-out';

const GROUP = 'Sign-in';

export interface SessionKeeping {
  readonly cookies: SessionCookies;
  readonly csrf: CsrfGuard;
}

export function sessionRoutes(deps: Dependencies, { cookies, csrf }: SessionKeeping): Route[] {
  const hand = (response: Response, opened: OpenSession) => {
    cookies.set(response, opened.tokens);
    return opened.session;
  };
  return [
    defineOpenRoute({
      method: 'get',
      path: '/welcome',
      group: GROUP,
      summary: 'Whether the first person is still to be made, and the sign-ins of the demo',
      reply: welcomeSchema,
      answer: async () => ({
        needsFirstPerson: !(await deps.database.stores.people.anyone()),
        demo: [...deps.demoSignIns],
      }),
    }),
    defineOpenRoute({
      method: 'post',
      path: '/first-person',
      group: GROUP,
      summary:
        'Make the shop and its first person, who is admin and lead; only while there is nobody',
      body: firstPersonSchema,
      status: 201,
      reply: sessionSchema,
      answer: async ({ body, response }) => {
        const { shopId, person } = await makeFirstPerson(deps, body);
        csrf.renew(response);
        return hand(response, await beginSession(deps, { shopId, personId: person.id }));
      },
    }),
    defineOpenRoute({
      method: 'post',
      path: '/session',
      group: GROUP,
      summary: 'Sign in; ten wrong passwords in a row pause sign-in for fifteen minutes',
      body: signInSchema,
      status: 201,
      reply: sessionSchema,
      answer: async ({ body, response }) => {
        const { shopId, person } = await signIn(deps, body);
        csrf.renew(response);
        return hand(response, await beginSession(deps, { shopId, personId: person.id }));
      },
    }),
    defineRoute({
      method: 'get',
      path: '/session',
      group: GROUP,
      summary: 'Who is signed in, and until when the access token holds',
      may: 'read',
      reply: sessionSchema,
      answer: ({ actor }) =>
        describeSession(
          deps.database.stores,
          { personId: actor.id, shopId: actor.shopId },
          actor.accessEnds,
        ),
    }),
    defineOpenRoute({
      method: 'post',
      path: '/session/refresh',
      group: GROUP,
      summary: 'Renew the session by the refresh cookie, which is exchanged for a new one',
      reply: sessionSchema,
      answer: async ({ request, response }) =>
        hand(response, await renewSession(deps, cookieOf(request, REFRESH_COOKIE))),
    }),
    defineOpenRawRoute({
      method: 'delete',
      path: '/session',
      group: GROUP,
      summary: 'Sign out; safe to repeat',
      reply: { kind: 'nothing' },
      answer: async ({ request, response }) => {
        await signOut(deps, cookieOf(request, REFRESH_COOKIE));
        cookies.clear(response);
        csrf.renew(response);
      },
    }),
    defineRoute({
      method: 'patch',
      path: '/session/person',
      group: GROUP,
      summary: 'Change your own units, name or password; a new password ends every other sign-in',
      may: 'read',
      body: ownChangeSchema,
      reply: personSchema,
      answer: async ({ actor, body, response }) => {
        const { person, opened } = await changeOwn(deps, actor, body);
        if (opened) hand(response, opened);
        return person;
      },
    }),
  ];
}
