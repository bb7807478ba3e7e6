import { wordFold } from '../report/fold-words';
import { lengthWords, type ReaderUnits } from '../report/length-words';
import type { FindingData } from '../report/report';
import { RULES } from './catalogue';
import type { Rule, Wording } from './rule';

const RULE_BY_ID: ReadonlyMap<string, Rule> = new Map(RULES.map((rule) => [rule.id, rule]));

/**
 * Words a stored finding from its figures, in the reader's unit; with `both` it gives the report's own
 * sentence. A rule this engine does not know (an older report) is said to be so.
 */
export function wordFinding(
  finding: { readonly rule: string; readonly data: FindingData },
  units: ReaderUnits,
): Wording {
  const { folded } = finding.data;
  if (typeof folded === 'number') return wordFold(folded);
  const rule = RULE_BY_ID.get(finding.rule);
  if (rule) return rule.word(finding.data, lengthWords(units));
  return {
    message: `The rule ${finding.rule} is not known to this version.`,
    advice: 'Check the program again to see the finding in today’s words.',
  };
}
