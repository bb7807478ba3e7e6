import type { Wording } from '../rules/rule';

/** The sentence for the rest of a rule's findings, once it has found too many to list. */
export function wordFold(findings: number): Wording {
  const more = findings === 1 ? '1 more finding' : `${findings} more findings`;
  return {
    message: `There ${findings === 1 ? 'is' : 'are'} ${more} of this kind that ${findings === 1 ? 'is' : 'are'} not listed one by one.`,
    advice: 'Put right what the listed ones have in common, then check again.',
  };
}
