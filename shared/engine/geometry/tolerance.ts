/**
 * Every tolerance of the engine, with its unit, where it comes from and which way it errs. Code that
 * compares with one is written so that NaN lands on the unsafe side: it asks for a proven gap, and
 * whatever is not proven is reported.
 */

/**
 * A limit is passed when exceeded by more than this (mm): our convention, a tenth of what a good
 * router repeats. Exactly at a limit is inside. Larger would let real overtravel by; smaller would
 * report the last digit of an inch program converted by 25.4.
 */
export const LIMIT_SLACK = 0.001;

/** A travel limit is near within this (mm): what a fresh touch-off of work zero easily moves. */
export const NEAR_LIMIT = 1;

/**
 * Cell of the record of what was cut (mm). It decides only whether a rapid through stock is a stop
 * or a hold, so it may be coarse; a finer one costs memory and time for no other answer.
 */
export const CUT_CELL = 2;

/** The record of what was cut never holds more cells than this; larger tables get larger cells. */
export const MOST_CUT_CELLS = 1_000_000;

/**
 * Space counts as cut down to a height when the record is at most this far above it (mm): a tenth of
 * what a layer of paint is thick. It errs towards "cut", which is still reported as a hold.
 */
export const CUT_DEPTH_SLACK = 0.01;

/**
 * Numeric search along an arc stops when what is left of it is shorter than this (mm). Below
 * LIMIT_SLACK, so that nothing the slack would report is lost.
 */
export const ARC_SEARCH_STEP = 0.0005;
