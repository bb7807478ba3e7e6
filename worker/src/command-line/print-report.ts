import type { Counts, Finding, Report, Severity } from '#engine';

const MARKS: Readonly<Record<Severity, string>> = { stop: 'STOP', hold: 'HOLD', note: 'note' };
const VERDICTS = { stopped: 'Stopped', held: 'Held', clear: 'Clear' } as const;
const CAUTION =
  'A check of numbers against a description, not of the machine itself. Prove the first run, keep the emergency stop in reach, follow the maker’s manual and local codes.';

/** A report for a person at a terminal: verdict, findings by line, tools, and what it was blind to. */
export function printReport(report: Report, isUnattended: boolean): string {
  const { program, coverage, seconds } = report;
  const { verdict, counts } = isUnattended ? report.unattended : report;
  const read =
    coverage.modelled === coverage.blocks
      ? `All ${coverage.blocks} blocks were understood.`
      : `${coverage.blocks - coverage.modelled} of ${coverage.blocks} blocks were not understood.`;
  return [
    `${program.name}  ${program.lines} lines  sha256 ${program.sha256}`,
    `${VERDICTS[verdict]}${isUnattended ? ' for an unattended run' : ''}. ${spellCounts(counts)} ${read}`,
    CAUTION,
    '',
    ...report.findings.flatMap((finding) => printFinding(finding, isUnattended)),
    ...report.tools.map(
      (tool) =>
        `T${tool.number}  ${tool.pocket === null ? 'no pocket' : `pocket ${tool.pocket}`}  from line ${tool.firstLine}  cuts ${tool.cutSeconds} s${tool.lowest === null ? '' : `  lowest Z ${tool.lowest} mm`}`,
    ),
    `Runs about ${Math.ceil(seconds.total / 60)} min (${seconds.total} s).`,
    '',
    'Not seen by this check:',
    ...report.blind.map((sentence) => `  ${sentence}`),
    '',
  ].join('\n');
}

function spellCounts({ stop, hold, note }: Counts): string {
  return `${stop} forbid the run, ${hold} wait for an answer, ${note} are worth knowing.`;
}

function printFinding(finding: Finding, isUnattended: boolean): string[] {
  const severity = isUnattended ? (finding.unattended ?? finding.severity) : finding.severity;
  const { line, endLine, worstLine, count, columns, within } = finding;
  const where = columns ? `${line}:${columns[0]}` : `${line}`;
  const span = count > 1 ? ` (${count} blocks to line ${endLine}, worst at line ${worstLine})` : '';
  const folded = finding.folded ? ` (and ${finding.folded} more of this rule)` : '';
  const inside = within ? ` [${within.text} line ${within.line}]` : '';
  const assuming = (finding.assumed ?? [])
    .map((each) => ` [if ${each.condition} at line ${each.within?.line ?? each.line}]`)
    .join('');
  const skipping = finding.blockDelete ? ' [with block delete on]' : '';
  return [
    `${MARKS[severity]}  ${where}  ${finding.message}${span}${folded}${inside}${skipping}${assuming}  (${finding.rule})`,
    `      ${finding.advice}`,
    '',
  ];
}
