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

export class ProgramRow extends Model<
  InferAttributes<ProgramRow>,
  InferCreationAttributes<ProgramRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare name: string;
  declare createdAt: CreationOptional<Date>;
}
export class ProgramTextRow extends Model<
  InferAttributes<ProgramTextRow>,
  InferCreationAttributes<ProgramTextRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  /** Null while the text is being written. */
  declare sha256: CreationOptional<string | null>;
  declare bytes: CreationOptional<number>;
  declare lines: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
}
export class ProgramChunkRow extends Model<
  InferAttributes<ProgramChunkRow>,
  InferCreationAttributes<ProgramChunkRow>
> {
  declare textId: string;
  declare ordinal: number;
  /** The line its first byte belongs to; a line longer than a chunk belongs to several. */
  declare firstLine: number;
  /** Lines of which at least one byte stands here. */
  declare lineCount: number;
  declare firstByte: number;
  declare byteCount: number;
  /** gzip of the bytes. */
  declare data: Buffer;
}
export class ProgramRevisionRow extends Model<
  InferAttributes<ProgramRevisionRow>,
  InferCreationAttributes<ProgramRevisionRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare programId: string;
  declare number: number;
  declare textId: string;
  declare originalName: string;
  declare uploadedBy: string | null;
  declare uploadedAt: CreationOptional<Date>;
}
export class JobRevisionRow extends Model<
  InferAttributes<JobRevisionRow>,
  InferCreationAttributes<JobRevisionRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare programId: string;
  declare number: number;
  declare madeBy: string | null;
  declare madeAt: CreationOptional<Date>;
  declare reason: string;
  declare body: NonNullable<ValidSetup['job']>;
}

export function bindPrograms(sequelize: Sequelize) {
  return {
    program: column.bind(sequelize, ProgramRow, 'program', {
      id: column.key,
      shopId: column.reference,
      name: column.words,
      createdAt: column.momentNow,
    }),
    programText: column.bind(sequelize, ProgramTextRow, 'program_text', {
      id: column.key,
      shopId: column.reference,
      sha256: column.maybeWords,
      bytes: { ...column.bigWhole('bytes'), defaultValue: 0 },
      lines: { ...column.whole, defaultValue: 0 },
      createdAt: column.momentNow,
    }),
    programChunk: column.bind(sequelize, ProgramChunkRow, 'program_chunk', {
      textId: column.partOfKey,
      ordinal: { ...column.whole, primaryKey: true },
      firstLine: column.whole,
      lineCount: column.whole,
      firstByte: column.bigWhole('firstByte'),
      byteCount: column.whole,
      data: column.bytes,
    }),
    programRevision: column.bind(sequelize, ProgramRevisionRow, 'program_revision', {
      id: column.key,
      shopId: column.reference,
      programId: column.reference,
      number: column.whole,
      textId: column.reference,
      originalName: column.words,
      uploadedBy: column.maybeReference,
      uploadedAt: column.momentNow,
    }),
    jobRevision: column.bind(sequelize, JobRevisionRow, 'job_revision', {
      ...revisionColumns,
      programId: column.reference,
      body: column.json,
    }),
  };
}
