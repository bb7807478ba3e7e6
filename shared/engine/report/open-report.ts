import type { Observer, Place } from '../interpreter/events';
import type { Rule } from '../rules/rule';
import type { Shop } from '../shop/shop';
import type { Report } from './report';

/**
 * The report of one check while it is being gathered. The walk of the program is handed the observers
 * and calls them; this gathers what they find and, at the end, puts the report together.
 *
 * How a check uses it:
 *
 *     const gathering = openReport(shop, rules);
 *     walk(program, gathering.observers);                  // every `/` block read as run
 *     if (program has a `/` block)
 *       walk(program, gathering.openSecondWalk());         // every `/` block skipped
 *     return gathering.finish({ name, sha256, bytes, lines, blocks, firstSkippable });
 *
 * The observers stand in the order in which they are to be called; the last one counts blocks and has
 * to be called after every rule has seen the block.
 */
export interface ReportInProgress {
  /** For the walk that reads `/` blocks as run: the rules, then what the summaries rest on. */
  readonly observers: readonly Observer[];
  /** Observers for the walk that skips `/` blocks, with a state of their own. Called at most once. */
  openSecondWalk(): readonly Observer[];
  finish(read: ProgramRead): Report;
}

/** What the reading stages know about the program once its last byte is read. */
export interface ProgramRead {
  /** Base name, as it is to stand in the report. */
  readonly name: string;
  readonly sha256: string;
  readonly bytes: number;
  /** As an editor counts: line ends, and one more if text follows the last. */
  readonly lines: number;
  /** Distinct program lines with at least one word, whether run or not. */
  readonly blocks: number;
  /** The first block with a `/`, if there is one. */
  readonly firstSkippable?: Place | undefined;
}

export function openReport(_shop: Shop, _rules: readonly Rule[]): ReportInProgress {
  throw new Error('The report is not put together yet.');
}
