import type { CookieOptions, Response } from 'express';

export const ACCESS_COOKIE = 'nightlatch_access';
export const REFRESH_COOKIE = 'nightlatch_refresh';
/** The refresh token goes to the one path that reads it and to no other. */
const REFRESH_PATH = '/api/v1/session';

export interface SessionCookies {
  set(response: Response, tokens: { access: string; refresh: string; refreshEnds: Date }): void;
  clear(response: Response): void;
}

export function sessionCookies(secure: boolean): SessionCookies {
  const base: CookieOptions = { httpOnly: true, sameSite: 'strict', secure };
  const access: CookieOptions = { ...base, path: '/' };
  const refresh: CookieOptions = { ...base, path: REFRESH_PATH };
  return {
    set: (response, tokens) => {
      // The access cookie outlives its token on purpose: the reply then says "ended", not "never".
      response.cookie(ACCESS_COOKIE, tokens.access, { ...access, expires: tokens.refreshEnds });
      response.cookie(REFRESH_COOKIE, tokens.refresh, { ...refresh, expires: tokens.refreshEnds });
    },
    clear: (response) => {
      response.clearCookie(ACCESS_COOKIE, access);
      response.clearCookie(REFRESH_COOKIE, refresh);
    },
  };
}
