/**
 * The whole public surface of the checking engine. Pure: no Node, no DOM, no clock, no randomness.
 * Bytes are pushed in chunks of any size; the same bytes and setup give the same report, byte for byte.
 */
import type { Rule, RuleReference } from './rules/rule';
import { RULES as CATALOGUE } from './rules/catalogue';

export type * from './shop/setup';
export type * from './report/report';
export type * from './interpreter/events';
export type { Rule, RuleExamples, RuleGroup, RuleReference, Wording } from './rules/rule';
export type { Check, CheckOptions, ProgramName } from './check';
export type { Trace, TraceMotion, TraceOptions } from './trace';
export { CODE_DEEDS, INPUT_MEANINGS } from './shop/setup';
export { checkProgram, startCheck } from './check';
export { startTrace } from './trace';
export { wordFinding } from './rules/word-finding';
export { canonicalJson } from './report/canonical-json';
export { sha256Hex } from './report/sha256';
export { ENGINE_VERSION } from './version';

/** Every rule's reference: what it is called, what it protects and its examples. */
export const RULES: readonly RuleReference[] = CATALOGUE satisfies readonly Rule[];
