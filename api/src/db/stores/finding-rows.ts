import type { FindingDocument, StoredFinding } from '#contracts';

/** The columns of a finding in the order that COPY writes them. */
export const FINDING_COLUMNS = [
  'check_id',
  'ordinal',
  'rule',
  'severity',
  'unattended',
  'line',
  'end_line',
  'worst_line',
  'count',
  'column_from',
  'column_to',
  'within',
  'block_delete',
  'assumed',
  'tool',
  'folded',
  'hold',
  'message',
  'advice',
  'data',
] as const;

/** One finding as a line of COPY's text format. */
export function asCopyLine(checkId: string, ordinal: number, finding: FindingDocument): string {
  const { columns, within, assumed, data } = finding;
  const values = [
    checkId,
    ordinal,
    finding.rule,
    finding.severity,
    finding.unattended,
    finding.line,
    finding.endLine,
    finding.worstLine,
    finding.count,
    columns?.[0],
    columns?.[1],
    within && JSON.stringify(within),
    finding.blockDelete,
    assumed && JSON.stringify(assumed),
    finding.tool,
    finding.folded,
    finding.hold,
    finding.message,
    finding.advice,
    JSON.stringify(data),
  ];
  return `${values.map(asCopyValue).join('\t')}\n`;
}

/** Backslash escapes of COPY's text format; NUL, which text cannot hold, is shown by its symbol. */
function asCopyValue(value: string | number | undefined): string {
  if (value === undefined) return '\\N';
  if (typeof value === 'number') return String(value);
  return value
    .replaceAll('\0', '\u2400')
    .replaceAll('\\', '\\\\')
    .replaceAll('\n', '\\n')
    .replaceAll('\r', '\\r')
    .replaceAll('\t', '\\t');
}

export interface FindingColumns {
  readonly id: string;
  readonly rule: string;
  readonly severity: FindingDocument['severity'];
  readonly unattended: FindingDocument['severity'] | null;
  readonly line: number;
  readonly end_line: number;
  readonly worst_line: number;
  readonly count: number;
  readonly column_from: number | null;
  readonly column_to: number | null;
  readonly within: FindingDocument['within'] | null;
  readonly block_delete: 'on' | null;
  readonly assumed: FindingDocument['assumed'] | null;
  readonly tool: number | null;
  readonly folded: number | null;
  readonly hold: 'look' | 'judge' | null;
  readonly message: string;
  readonly advice: string;
  readonly data: FindingDocument['data'];
}

/** Keys in contract order; what the report leaves out is left out here too. */
export function asFinding(row: FindingColumns): StoredFinding {
  const { column_from: from, column_to: to } = row;
  return {
    rule: row.rule,
    severity: row.severity,
    ...(row.unattended === null ? {} : { unattended: row.unattended }),
    line: row.line,
    endLine: row.end_line,
    worstLine: row.worst_line,
    count: row.count,
    ...(from === null || to === null ? {} : { columns: [from, to] }),
    ...(row.within === null ? {} : { within: row.within }),
    ...(row.block_delete === null ? {} : { blockDelete: row.block_delete }),
    ...(row.assumed === null ? {} : { assumed: row.assumed }),
    ...(row.tool === null ? {} : { tool: row.tool }),
    ...(row.folded === null ? {} : { folded: row.folded }),
    ...(row.hold === null ? {} : { hold: row.hold }),
    message: row.message,
    advice: row.advice,
    data: row.data,
    id: row.id,
  };
}
