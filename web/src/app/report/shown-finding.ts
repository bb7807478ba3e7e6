import type { StoredFinding, Units } from '#contracts';
import type { Severity } from '#engine';
import { wordInUnits } from './word-finding';

/** For which kind of run a report is read: someone stands by, or nobody does. */
export type RunMode = 'attended' | 'unattended';

/** A finding as this person sees it: worded in their unit, its severity for the run they think of. */
export interface ShownFinding {
  readonly id: string;
  readonly severity: Severity;
  /** Its severity for the other kind of run, where that differs. */
  readonly otherwise: Severity | null;
  readonly line: number;
  readonly endLine: number;
  readonly count: number;
  readonly tool: number | null;
  readonly message: string;
  readonly advice: string;
  readonly finding: StoredFinding;
}

export interface FindingFilter {
  readonly severities: ReadonlySet<Severity>;
  /** Only what concerns this tool; null: any. */
  readonly tool: number | null;
  /** Words that must all occur in the sentence, the advice or the rule's name. */
  readonly text: string;
}
export const SEVERITIES: readonly Severity[] = ['stop', 'hold', 'note'];
export const EVERYTHING: FindingFilter = { severities: new Set(SEVERITIES), tool: null, text: '' };

export function showFindings(
  findings: readonly StoredFinding[],
  mode: RunMode,
  units: Units,
): readonly ShownFinding[] {
  return findings.map((finding) => {
    const unattended = finding.unattended ?? finding.severity;
    const [severity, other] =
      mode === 'attended' ? [finding.severity, unattended] : [unattended, finding.severity];
    return {
      id: finding.id,
      severity,
      otherwise: other === severity ? null : other,
      line: finding.line,
      endLine: finding.endLine,
      count: finding.count,
      tool: finding.tool ?? null,
      ...wordInUnits(finding, units),
      finding,
    };
  });
}

/** Whether the filter lets everything through. */
export function isOpen(filter: FindingFilter): boolean {
  return (
    SEVERITIES.every((severity) => filter.severities.has(severity)) &&
    filter.tool === null &&
    filter.text.trim() === ''
  );
}

/** Splits findings into those wanted and the lines of those left out. */
export function filterFindings(
  findings: readonly ShownFinding[],
  filter: FindingFilter,
): { readonly wanted: readonly ShownFinding[]; readonly leftOut: readonly number[] } {
  if (isOpen(filter)) return { wanted: findings, leftOut: [] };
  const words = filter.text.toLowerCase().split(/\s+/).filter(Boolean);
  const wanted: ShownFinding[] = [];
  const leftOut: number[] = [];
  for (const each of findings) {
    if (passes(each, filter, words)) wanted.push(each);
    else leftOut.push(each.line);
  }
  return { wanted, leftOut };
}

export function countSeverities(
  findings: readonly ShownFinding[],
): Readonly<Record<Severity, number>> {
  const counts = { stop: 0, hold: 0, note: 0 };
  for (const { severity } of findings) counts[severity] += 1;
  return counts;
}

function passes(each: ShownFinding, filter: FindingFilter, words: readonly string[]): boolean {
  if (!filter.severities.has(each.severity)) return false;
  if (filter.tool !== null && each.tool !== filter.tool) return false;
  if (words.length === 0) return true;
  const hay = `${each.message} ${each.advice} ${each.finding.rule}`.toLowerCase();
  return words.every((word) => hay.includes(word));
}
