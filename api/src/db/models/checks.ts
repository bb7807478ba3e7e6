import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import type { CheckState, FindingDocument, ReportSummary } from '#contracts';
import * as column from './columns';

type Verdict = ReportSummary['verdict'];
type Severity = FindingDocument['severity'];
export type CheckCause = 'upload' | 'asked' | 'loading-changed';

export class SetupSnapshotRow extends Model<
  InferAttributes<SetupSnapshotRow>,
  InferCreationAttributes<SetupSnapshotRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare sha256: string;
  declare body: unknown;
  declare createdAt: CreationOptional<Date>;
}
export class CheckRunRow extends Model<
  InferAttributes<CheckRunRow>,
  InferCreationAttributes<CheckRunRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare programRevisionId: string;
  declare machineId: string;
  declare setupSnapshotId: string;
  declare machineRevisionId: string;
  declare rackRevisionId: string;
  declare loadingRevisionId: string;
  declare offsetRevisionId: string;
  declare macroRevisionId: string | null;
  declare jobRevisionId: string | null;
  declare policyRevisionId: string | null;
  declare askedBy: string | null;
  declare askedAt: CreationOptional<Date>;
  declare cause: CheckCause;
  declare state: CreationOptional<CheckState>;
  declare jobId: CreationOptional<string | null>;
  /** How often a worker has started on it. */
  declare attempts: CreationOptional<number>;
  declare startedAt: CreationOptional<Date | null>;
  declare finishedAt: CreationOptional<Date | null>;
  declare linesRead: CreationOptional<number>;
  declare failure: CreationOptional<string | null>;
  declare verdict: CreationOptional<Verdict | null>;
  declare unattendedVerdict: CreationOptional<Verdict | null>;
  declare stopCount: CreationOptional<number | null>;
  declare holdCount: CreationOptional<number | null>;
  declare noteCount: CreationOptional<number | null>;
  declare summary: CreationOptional<ReportSummary | null>;
  declare dependsOnTools: CreationOptional<number[] | null>;
}
export class CheckToolRow extends Model<
  InferAttributes<CheckToolRow>,
  InferCreationAttributes<CheckToolRow>
> {
  declare checkId: string;
  declare toolRevisionId: string;
}
export class FindingRow extends Model<
  InferAttributes<FindingRow>,
  InferCreationAttributes<FindingRow>
> {
  declare id: CreationOptional<string>;
  declare checkId: string;
  /** Its place in the report, from 0. */
  declare ordinal: number;
  declare rule: string;
  declare severity: Severity;
  declare unattended: Severity | null;
  declare line: number;
  declare endLine: number;
  declare worstLine: number;
  declare count: number;
  declare columnFrom: number | null;
  declare columnTo: number | null;
  declare within: FindingDocument['within'] | null;
  declare blockDelete: 'on' | null;
  declare assumed: FindingDocument['assumed'] | null;
  declare tool: number | null;
  declare folded: number | null;
  declare hold: 'look' | 'judge' | null;
  declare message: string;
  declare advice: string;
  declare data: FindingDocument['data'];
}
export class CheckPathRow extends Model<
  InferAttributes<CheckPathRow>,
  InferCreationAttributes<CheckPathRow>
> {
  declare checkId: string;
  declare tolerance: number;
  declare truncated: boolean;
  declare points: number;
  /** gzip of the runs as JSON. */
  declare runs: Buffer;
}

export function bindChecks(sequelize: Sequelize) {
  return {
    setupSnapshot: column.bind(sequelize, SetupSnapshotRow, 'setup_snapshot', {
      id: column.key,
      shopId: column.reference,
      sha256: column.words,
      body: column.document,
      createdAt: column.momentNow,
    }),
    checkRun: column.bind(sequelize, CheckRunRow, 'check_run', checkRunColumns),
    checkTool: column.bind(sequelize, CheckToolRow, 'check_tool', {
      checkId: column.partOfKey,
      toolRevisionId: column.partOfKey,
    }),
    finding: column.bind(sequelize, FindingRow, 'finding', findingColumns),
    checkPath: column.bind(sequelize, CheckPathRow, 'check_path', {
      checkId: column.partOfKey,
      tolerance: column.length,
      truncated: column.yesNo,
      points: column.whole,
      runs: column.bytes,
    }),
  };
}

const checkRunColumns = {
  id: column.key,
  shopId: column.reference,
  programRevisionId: column.reference,
  machineId: column.reference,
  setupSnapshotId: column.reference,
  machineRevisionId: column.reference,
  rackRevisionId: column.reference,
  loadingRevisionId: column.reference,
  offsetRevisionId: column.reference,
  macroRevisionId: column.maybeReference,
  jobRevisionId: column.maybeReference,
  policyRevisionId: column.maybeReference,
  askedBy: column.maybeReference,
  askedAt: column.momentNow,
  cause: column.words,
  state: { ...column.words, defaultValue: 'queued' },
  jobId: column.maybeReference,
  attempts: { ...column.whole, defaultValue: 0 },
  startedAt: column.maybeMoment,
  finishedAt: column.maybeMoment,
  linesRead: { ...column.whole, defaultValue: 0 },
  failure: column.maybeWords,
  verdict: column.maybeWords,
  unattendedVerdict: column.maybeWords,
  stopCount: column.maybeWhole,
  holdCount: column.maybeWhole,
  noteCount: column.maybeWhole,
  summary: column.maybeDocument,
  dependsOnTools: column.maybeWholes,
};
const findingColumns = {
  id: column.serial,
  checkId: column.reference,
  ordinal: column.whole,
  rule: column.words,
  severity: column.words,
  unattended: column.maybeWords,
  line: column.whole,
  endLine: column.whole,
  worstLine: column.whole,
  count: column.whole,
  columnFrom: column.maybeWhole,
  columnTo: column.maybeWhole,
  within: column.maybeDocument,
  blockDelete: column.maybeWords,
  assumed: column.maybeDocument,
  tool: column.maybeWhole,
  folded: column.maybeWhole,
  hold: column.maybeWords,
  message: column.words,
  advice: column.words,
  data: column.document,
};
