import {
  DataTypes,
  literal,
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import type { Role, Units, ValidSetup } from '#contracts';
import * as column from './columns';

export class ShopRow extends Model<InferAttributes<ShopRow>, InferCreationAttributes<ShopRow>> {
  declare id: CreationOptional<string>;
  declare name: string;
  declare uploadLimitBytes: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
}
export class PersonRow extends Model<
  InferAttributes<PersonRow>,
  InferCreationAttributes<PersonRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare email: string;
  declare name: string;
  declare passwordHash: string;
  declare units: CreationOptional<Units>;
  declare active: CreationOptional<boolean>;
  declare failedSignIns: CreationOptional<number>;
  declare lockedUntil: CreationOptional<Date | null>;
  declare createdAt: CreationOptional<Date>;
}
export class PersonRoleRow extends Model<
  InferAttributes<PersonRoleRow>,
  InferCreationAttributes<PersonRoleRow>
> {
  declare shopId: string;
  declare personId: string;
  declare role: Role;
}
export class RefreshTokenRow extends Model<
  InferAttributes<RefreshTokenRow>,
  InferCreationAttributes<RefreshTokenRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare personId: string;
  declare familyId: string;
  declare tokenHash: string;
  declare createdAt: CreationOptional<Date>;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;
  declare revokedAt: CreationOptional<Date | null>;
}
export class PolicyRevisionRow extends Model<
  InferAttributes<PolicyRevisionRow>,
  InferCreationAttributes<PolicyRevisionRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare number: number;
  declare madeBy: string | null;
  declare madeAt: CreationOptional<Date>;
  declare reason: string;
  declare body: ValidSetup['policy'];
}

/** What every revision row carries beside its own columns. */
export const revisionColumns = {
  id: column.key,
  shopId: column.reference,
  number: column.whole,
  madeBy: column.maybeReference,
  madeAt: column.momentNow,
  reason: { ...column.words, defaultValue: '' },
};

export function bindPeople(sequelize: Sequelize) {
  return {
    shop: column.bind(sequelize, ShopRow, 'shop', {
      id: column.key,
      name: column.words,
      uploadLimitBytes: {
        ...column.bigWhole('uploadLimitBytes'),
        defaultValue: literal('268435456'),
      },
      createdAt: column.momentNow,
    }),
    person: column.bind(sequelize, PersonRow, 'person', {
      id: column.key,
      shopId: column.reference,
      email: column.words,
      name: column.words,
      passwordHash: column.words,
      units: { ...column.words, defaultValue: 'mm' },
      active: { ...column.yesNo, defaultValue: true },
      failedSignIns: { ...column.whole, defaultValue: 0 },
      lockedUntil: column.maybeMoment,
      createdAt: column.momentNow,
    }),
    personRole: column.bind(sequelize, PersonRoleRow, 'person_role', {
      shopId: column.reference,
      personId: column.partOfKey,
      role: { type: DataTypes.TEXT, allowNull: false, primaryKey: true },
    }),
    refreshToken: column.bind(sequelize, RefreshTokenRow, 'refresh_token', {
      id: column.key,
      shopId: column.reference,
      personId: column.reference,
      familyId: column.reference,
      tokenHash: column.words,
      createdAt: column.momentNow,
      expiresAt: column.moment,
      usedAt: column.maybeMoment,
      revokedAt: column.maybeMoment,
    }),
    policyRevision: column.bind(sequelize, PolicyRevisionRow, 'policy_revision', {
      ...revisionColumns,
      body: column.json,
    }),
  };
}
