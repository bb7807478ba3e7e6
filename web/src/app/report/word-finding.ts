import type { FindingDocument, Units } from '#contracts';

/** A finding's sentence and what to do, in the person's unit. */
export interface FindingWords {
  readonly message: string;
  readonly advice: string;
}

export function wordInUnits(finding: FindingDocument, _units: Units): FindingWords {
  return { message: finding.message, advice: finding.advice };
}
