/**
 * The whole public surface of the checking engine. Pure: no Node, no DOM, no clock, no randomness.
 * Bytes are pushed in chunks of any size; the same bytes and setup give the same report, byte for byte.
 */
export type * from './shop/setup';
export type * from './report/report';
export { CODE_DEEDS, INPUT_MEANINGS } from './shop/setup';
export { ENGINE_VERSION } from './version';
