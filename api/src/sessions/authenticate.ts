import type { Request, RequestHandler } from 'express';
import passport from 'passport';
import { Strategy } from 'passport-jwt';
import { cookieOf } from '../http/csrf';
import { refuse, Refusal } from '../http/problems';
import type { Actor } from '../http/route';
import { ALGORITHM, ISSUER, readClaims, type ReadClaims } from './access-tokens';
import { ACCESS_COOKIE } from './session-cookies';

export interface Authentication {
  readonly signedIn: RequestHandler;
  actorOf(request: Request): Actor;
}

/**
 * Reads the access cookie on every request and looks the person up each time, so that someone who was
 * made inactive or lost a role is refused at once and not when the token runs out.
 */
export function authenticate(
  secret: string,
  findActor: (claims: ReadClaims) => Promise<Actor | 'inactive' | 'ended'>,
): Authentication {
  const actors = new WeakMap<Request, Actor>();
  const guard = new passport.Passport();
  const strategy = new Strategy(
    {
      jwtFromRequest: (request: Request) => cookieOf(request, ACCESS_COOKIE) || null,
      secretOrKey: secret,
      algorithms: [ALGORITHM],
      issuer: ISSUER,
    },
    (payload: unknown, done) => {
      const claims = readClaims(payload);
      if (!claims) return done(null, false);
      findActor(claims).then(
        (found) => done(null, { found }),
        (error: unknown) => done(error, false),
      );
    },
  );
  guard.use(strategy);

  const signedIn: RequestHandler = (request, response, next) => {
    const decide = (error: unknown, user: { found: Actor | 'inactive' | 'ended' } | false) => {
      if (error) return next(error);
      const outcome = user === false ? absence(request) : user.found;
      if (outcome instanceof Refusal) return next(outcome);
      if (outcome === 'inactive') return next(noLongerActive());
      if (outcome === 'ended') return next(sessionEnded());
      actors.set(request, outcome);
      next();
    };
    const check = guard.authenticate('jwt', { session: false }, decide) as RequestHandler;
    check(request, response, next);
  };
  return {
    signedIn,
    actorOf: (request) => {
      const actor = actors.get(request);
      if (!actor) throw new Error('a route asked for the actor without asking for a sign-in');
      return actor;
    },
  };
}

function absence(request: Request): Refusal {
  if (cookieOf(request, ACCESS_COOKIE) !== '') return sessionEnded();
  return refuse('not-signed-in', 'This needs a sign-in.');
}

function sessionEnded(): Refusal {
  return refuse('session-ended', 'The ten minutes of this sign-in are over, or it was ended.', {
    next: 'The page renews it by itself; sign in again if this stays.',
  });
}

function noLongerActive(): Refusal {
  return refuse('no-longer-active', 'The shop admin has made this account inactive.');
}
