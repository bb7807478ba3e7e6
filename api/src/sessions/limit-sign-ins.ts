import type { RequestHandler } from 'express';
import { rateLimit } from 'express-rate-limit';
import { refuse } from '../http/problems';

/** A whole shop may sit behind one address; guessing programs send this many in a second. */
const MOST_FAILURES = 100;
const MINUTES = 15;
const PATHS = new Set(['/session', '/first-person']);

/** Slows down whoever guesses at many addresses; the lock-out of one address is the sign-in's own. */
export function limitSignIns(): RequestHandler {
  return rateLimit({
    windowMs: MINUTES * 60 * 1000,
    limit: MOST_FAILURES,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    skip: (request) => request.method !== 'POST' || !PATHS.has(request.path),
    skipSuccessfulRequests: true,
    handler: (_request, _response, next) => {
      next(
        refuse(
          'too-many-requests',
          `More than ${MOST_FAILURES} sign-ins failed from here within ${MINUTES} minutes.`,
          { retryAfter: MINUTES * 60 },
        ),
      );
    },
  });
}
