import { HttpContext, HttpContextToken } from '@angular/common/http';

/** Set on requests that are part of renewing the session: a 401 there must not renew it again. */
export const NO_REFRESH = new HttpContextToken<boolean>(() => false);
export const withoutRefresh = (): HttpContext => new HttpContext().set(NO_REFRESH, true);
