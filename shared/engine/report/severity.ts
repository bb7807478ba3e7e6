import type { Counts, Severity, Verdict } from './report';

const RANK: Readonly<Record<Severity, number>> = { stop: 0, hold: 1, note: 2 };

export function severityRank(severity: Severity): number {
  return RANK[severity];
}

export function worseOf(one: Severity, other: Severity): Severity {
  return RANK[one] <= RANK[other] ? one : other;
}

export function countSeverities(severities: readonly Severity[]): Counts {
  const count = (wanted: Severity) => severities.filter((each) => each === wanted).length;
  return { stop: count('stop'), hold: count('hold'), note: count('note') };
}

/** Every hold counts as unanswered; answers are the product's to overlay. */
export function verdictOf(counts: Counts): Verdict {
  if (counts.stop > 0) return 'stopped';
  return counts.hold > 0 ? 'held' : 'clear';
}
