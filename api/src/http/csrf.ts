import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto';
import type { Request, RequestHandler, Response } from 'express';
import { refuse } from './problems';

export const CSRF_COOKIE = 'XSRF-TOKEN';
const CSRF_HEADER = 'x-xsrf-token';
const SAFE_METHODS = new Set(['GET', 'HEAD', 'OPTIONS']);

export interface CsrfGuard {
  /** Gives a visitor without a usable token one, in a cookie that the page's script can read. */
  readonly offer: RequestHandler;
  /** Refuses a writing request whose header does not repeat the cookie. */
  readonly demand: RequestHandler;
  /** A new token, given at sign-in and sign-out so that no token outlives a change of person. */
  renew(response: Response): void;
}

/**
 * Double submit: the token stands in a cookie and must be repeated in a header, which a page of another
 * origin can neither read nor set. Tokens are signed, so that a cookie planted by a neighbouring host
 * is not taken for ours.
 */
export function guardAgainstForgery(secret: string, secureCookies: boolean): CsrfGuard {
  const sign = (nonce: string) =>
    createHmac('sha256', secret).update(`csrf ${nonce}`).digest('base64url');
  const isOurs = (token: string) => {
    const [nonce, signature] = token.split('.');
    return nonce !== undefined && signature !== undefined && same(signature, sign(nonce));
  };
  const renew = (response: Response) => {
    const nonce = randomBytes(18).toString('base64url');
    response.cookie(CSRF_COOKIE, `${nonce}.${sign(nonce)}`, {
      sameSite: 'strict',
      secure: secureCookies,
      path: '/',
    });
  };
  return {
    renew,
    offer: (request, response, next) => {
      if (!isOurs(cookieOf(request, CSRF_COOKIE))) renew(response);
      next();
    },
    demand: (request, _response, next) => {
      if (SAFE_METHODS.has(request.method)) return next();
      const cookie = cookieOf(request, CSRF_COOKIE);
      const header = request.get(CSRF_HEADER) ?? '';
      if (cookie !== '' && same(cookie, header) && isOurs(cookie)) return next();
      throw refuse(
        'page-out-of-date',
        'The request does not carry the token this page was given, so it was not carried out.',
      );
    },
  };
}

/** A cookie's text; empty when it was not sent. */
export function cookieOf(request: Request, name: string): string {
  const cookies: Record<string, unknown> = request.cookies ?? {};
  const value = cookies[name];
  return typeof value === 'string' ? value : '';
}

function same(a: string, b: string): boolean {
  const left = Buffer.from(a);
  const right = Buffer.from(b);
  return left.length === right.length && timingSafeEqual(left, right);
}
