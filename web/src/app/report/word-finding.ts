import type { StoredFinding, Units } from '#contracts';
import { RULES, wordFinding } from '#engine';

/** A finding's sentence and what to do, in the person's unit. */
export interface FindingWords {
  readonly message: string;
  readonly advice: string;
}

const KNOWN: ReadonlySet<string> = new Set(RULES.map((rule) => rule.id));

/** Words a finding by the engine's own sentence; one of a rule unknown here keeps the words it came with. */
export function wordInUnits(
  finding: Pick<StoredFinding, 'rule' | 'data' | 'message' | 'advice'>,
  units: Units,
): FindingWords {
  if (!KNOWN.has(finding.rule)) return { message: finding.message, advice: finding.advice };
  return wordFinding(finding, units);
}
