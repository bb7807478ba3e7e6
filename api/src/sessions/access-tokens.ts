import jwt from 'jsonwebtoken';
import { z } from 'zod';

export const ACCESS_SECONDS = 10 * 60;
export const ISSUER = 'nightlatch';
export const ALGORITHM = 'HS256';

const claimsSchema = z.object({
  sub: z.uuid(),
  shop: z.uuid(),
  session: z.uuid(),
  exp: z.number().int(),
});

export interface Claims {
  readonly personId: string;
  readonly shopId: string;
  readonly sessionId: string;
}
export interface ReadClaims extends Claims {
  readonly expiresAt: Date;
}

/** A signed token that says who is asking for the next ten minutes, and when it ends. */
export function issueAccessToken(
  claims: Claims,
  secret: string,
  now: Date,
): { token: string; expiresAt: Date } {
  const issued = Math.floor(now.getTime() / 1000);
  const token = jwt.sign(
    { shop: claims.shopId, session: claims.sessionId, iat: issued, exp: issued + ACCESS_SECONDS },
    secret,
    { algorithm: ALGORITHM, issuer: ISSUER, subject: claims.personId },
  );
  return { token, expiresAt: new Date((issued + ACCESS_SECONDS) * 1000) };
}

/** What a verified token claims; undefined when it is signed by us but not of this form. */
export function readClaims(payload: unknown): ReadClaims | undefined {
  const read = claimsSchema.safeParse(payload);
  if (!read.success) return undefined;
  const { sub, shop, session, exp } = read.data;
  return { personId: sub, shopId: shop, sessionId: session, expiresAt: new Date(exp * 1000) };
}
