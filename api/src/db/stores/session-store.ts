import { Op } from 'sequelize';
import { inTransaction, type StoreContext } from '../store-context';

/** A refresh token as kept: only the hash of what the browser holds. */
export interface RefreshToken {
  readonly id: string;
  readonly shopId: string;
  readonly personId: string;
  /** All tokens that came from one sign-in, each replacing the one before. */
  readonly familyId: string;
  readonly expiresAt: Date;
  readonly usedAt: Date | null;
  readonly revokedAt: Date | null;
}
export interface NewRefreshToken {
  readonly personId: string;
  readonly familyId: string;
  readonly tokenHash: string;
  readonly expiresAt: Date;
}
export interface SessionStore {
  add(shopId: string, token: NewRefreshToken): Promise<string>;
  /** Before the token is known no shop is: the only look-up by hash alone. */
  findByHash(tokenHash: string): Promise<RefreshToken | undefined>;
  /** Whether this call used it: false means it was used or revoked before, so somebody holds a copy. */
  markUsed(shopId: string, id: string): Promise<boolean>;
  /** Whether a sign-in still holds: some token of its family is neither revoked nor out of date. */
  isAlive(shopId: string, familyId: string): Promise<boolean>;
  revokeFamily(shopId: string, familyId: string): Promise<void>;
  revokeAllOf(shopId: string, personId: string): Promise<void>;
  removeExpired(before: Date): Promise<number>;
}

export function openSessionStore(ctx: StoreContext): SessionStore {
  const { refreshToken } = ctx.models;
  const revoke = async (where: { shopId: string; familyId?: string; personId?: string }) => {
    await refreshToken.update(
      { revokedAt: new Date() },
      { where: { ...where, revokedAt: null }, ...inTransaction(ctx) },
    );
  };
  return {
    async add(shopId, token) {
      const row = await refreshToken.create({ shopId, ...token }, { ...inTransaction(ctx) });
      return row.id;
    },
    async findByHash(tokenHash) {
      const row = await refreshToken.findOne({ where: { tokenHash }, ...inTransaction(ctx) });
      if (!row) return undefined;
      const { id, shopId, personId, familyId, expiresAt, usedAt, revokedAt } = row;
      return { id, shopId, personId, familyId, expiresAt, usedAt, revokedAt };
    },
    async markUsed(shopId, id) {
      const [changed] = await refreshToken.update(
        { usedAt: new Date() },
        { where: { shopId, id, usedAt: null, revokedAt: null }, ...inTransaction(ctx) },
      );
      return changed === 1;
    },
    async isAlive(shopId, familyId) {
      // Served by refresh_token_family.
      const row = await refreshToken.findOne({
        where: { shopId, familyId, revokedAt: null, expiresAt: { [Op.gt]: new Date() } },
        attributes: ['id'],
        ...inTransaction(ctx),
      });
      return row !== null;
    },
    revokeFamily: (shopId, familyId) => revoke({ shopId, familyId }),
    revokeAllOf: (shopId, personId) => revoke({ shopId, personId }),
    removeExpired: (before) =>
      refreshToken.destroy({
        where: { expiresAt: { [Op.lt]: before } },
        ...inTransaction(ctx),
      }),
  };
}
