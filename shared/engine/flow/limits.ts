/**
 * Where following a program ends. All are far above what real programs need and low enough that whatever is
 * pushed is done within seconds; none is a limit of a machine.
 */

/** A text of which lines are needed in another order is kept whole up to this size, bytes. */
export const LARGEST_KEPT = 64 * 1024 * 1024;
/** Blocks that are carried out beyond one for every line, in one walk. */
export const MOST_REPEATED = 2_000_000;
/**
 * Turns of one loop, or jumps back by one line, before it is taken for one that never ends. A curve cut by steps
 * of a hundredth of a degree takes 36,000 a turn.
 */
export const MOST_TURNS = 300_000;
/** Turns that all begin with the same parameters: where so many pass, all others will. */
export const MOST_IDLE_TURNS = 1_000;
/**
 * Calls within calls. Controllers stop at 4 to 10 (facts sheet 12.1.7 and 12.1.8 for the lower ones; ten is
 * common practice, no source).
 */
export const DEEPEST_CALL = 10;
/** Walks of one reading, each with its own outcome of what is not known before the run. */
export const MOST_WALKS = 16;
/** Conditions of one walk whose other outcome is kept for a walk of its own. */
export const MOST_DECISIONS = 64;
