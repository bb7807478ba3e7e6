import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import type { ValidSetup } from '#contracts';
import * as column from './columns';
import { revisionColumns } from './people';

export class ToolRow extends Model<InferAttributes<ToolRow>, InferCreationAttributes<ToolRow>> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare number: number;
  declare createdAt: CreationOptional<Date>;
}
export class ToolRevisionRow extends Model<
  InferAttributes<ToolRevisionRow>,
  InferCreationAttributes<ToolRevisionRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare toolId: string;
  declare number: number;
  declare madeBy: string | null;
  declare madeAt: CreationOptional<Date>;
  declare reason: string;
  declare body: ValidSetup['tools'][number];
  declare lengthOffset: number | null;
  declare diameterOffset: number | null;
}

export function bindTools(sequelize: Sequelize) {
  return {
    tool: column.bind(sequelize, ToolRow, 'tool', {
      id: column.key,
      shopId: column.reference,
      number: column.whole,
      createdAt: column.momentNow,
    }),
    toolRevision: column.bind(sequelize, ToolRevisionRow, 'tool_revision', {
      ...revisionColumns,
      toolId: column.reference,
      body: column.json,
      lengthOffset: column.maybeLength,
      diameterOffset: column.maybeLength,
    }),
  };
}
