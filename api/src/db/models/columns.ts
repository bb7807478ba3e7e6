import { DataTypes, literal, type Model, type ModelStatic, type Sequelize } from 'sequelize';

/** Column shapes that the models share, so that a model reads as a list of its columns. */
export const key = {
  type: DataTypes.UUID,
  allowNull: false,
  primaryKey: true,
  defaultValue: literal('gen_random_uuid()'),
};
export const serial = {
  type: DataTypes.BIGINT,
  allowNull: false,
  primaryKey: true,
  autoIncrement: true,
};
export const reference = { type: DataTypes.UUID, allowNull: false };
export const partOfKey = { type: DataTypes.UUID, allowNull: false, primaryKey: true };
export const maybeReference = { type: DataTypes.UUID, allowNull: true };
export const words = { type: DataTypes.TEXT, allowNull: false };
export const maybeWords = { type: DataTypes.TEXT, allowNull: true };
export const whole = { type: DataTypes.INTEGER, allowNull: false };
export const maybeWhole = { type: DataTypes.INTEGER, allowNull: true };
export const length = { type: DataTypes.DOUBLE, allowNull: false };
export const maybeLength = { type: DataTypes.DOUBLE, allowNull: true };
export const yesNo = { type: DataTypes.BOOLEAN, allowNull: false };
export const json = { type: DataTypes.JSONB, allowNull: false };
export const maybeJson = { type: DataTypes.JSONB, allowNull: true };
/** A document kept as it was written, key order and all. */
export const document = { type: DataTypes.JSON, allowNull: false };
export const maybeDocument = { type: DataTypes.JSON, allowNull: true };
export const wholes = { type: DataTypes.ARRAY(DataTypes.INTEGER), allowNull: false };
export const maybeWholes = { type: DataTypes.ARRAY(DataTypes.INTEGER), allowNull: true };
export const bytes = { type: DataTypes.BLOB, allowNull: false };
export const moment = { type: DataTypes.DATE, allowNull: false };
export const maybeMoment = { type: DataTypes.DATE, allowNull: true };
/** Set by the database's own clock, so that every process agrees on the order. */
export const momentNow = { ...moment, defaultValue: literal('now()') };

/** A whole number beyond 32 bits; the driver hands it over as text, and 2^53 is far beyond any file. */
export function bigWhole(attribute: string) {
  return {
    type: DataTypes.BIGINT,
    allowNull: false,
    get(this: Model): number {
      return Number(this.getDataValue(attribute as never));
    },
  };
}

/**
 * Binds a model class to one connection. Sequelize keeps the binding on the class itself, so each
 * connection gets a subclass of its own; a process with two databases open does not mix them up.
 */
export function bind<T extends Model>(
  sequelize: Sequelize,
  base: ModelStatic<T>,
  tableName: string,
  columns: Readonly<Record<string, object>>,
): ModelStatic<T> {
  const bound = class extends (base as unknown as ModelStatic<Model>) {};
  // A copy of each: Sequelize writes the column's name into the very object it is given.
  const own = Object.fromEntries(
    Object.entries(columns).map(([name, column]) => [name, { ...column }]),
  );
  bound.init(own as never, {
    sequelize,
    tableName,
    modelName: tableName,
    underscored: true,
    timestamps: false,
  });
  return bound as unknown as ModelStatic<T>;
}
