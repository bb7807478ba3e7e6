import type { Rule } from './rule';

/** Every rule, alphabetical within its group; one import line and one entry line a rule. */
export const RULES: readonly Rule[] = [];
