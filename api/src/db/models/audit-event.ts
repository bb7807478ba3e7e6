import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import * as column from './columns';

export class AuditEventRow extends Model<
  InferAttributes<AuditEventRow>,
  InferCreationAttributes<AuditEventRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare at: CreationOptional<Date>;
  declare personId: string | null;
  declare action: string;
  declare subject: string;
  declare detail: Record<string, unknown>;
}

export function bindAudit(sequelize: Sequelize) {
  return {
    auditEvent: column.bind(sequelize, AuditEventRow, 'audit_event', {
      id: column.serial,
      shopId: column.reference,
      at: column.momentNow,
      personId: column.maybeReference,
      action: column.words,
      subject: column.words,
      detail: column.json,
    }),
  };
}
