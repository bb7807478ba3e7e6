import type { MachineState, Observer, Place } from '../interpreter/events';
import type { CutMemory, FindingDraft, Rule } from '../rules/rule';
import type { Shop } from '../shop/shop';
import { ENGINE_VERSION } from '../version';
import { blindSentences } from './blind';
import { canonicalJson } from './canonical-json';
import { countLinesNotModelled } from './coverage';
import { beginEpisode, openEpisodes, type Episode } from './episodes';
import { listFindings, unattendedSeverities } from './findings';
import { lengthWords } from './length-words';
import { mergeWalks } from './merge-walks';
import type { Assumption, Report } from './report';
import { countSeverities, verdictOf } from './severity';
import { sha256Hex } from './sha256';
import { gatherSummaries } from './summaries';
import { gatherWalkFacts } from './walk-facts';

/**
 * The report of one check while it is being gathered. The walk of the program is handed the observers
 * and calls them; this gathers what they find and, at the end, puts the report together.
 *
 * How a check uses it:
 *
 *     const gathering = openReport(shop, rules, cuts);
 *     walk(program, gathering.observers);                  // every `/` block read as run
 *     if (program has a `/` block)
 *       walk(program, gathering.openSecondWalk());         // every `/` block skipped
 *     walk(program, gathering.openOtherWalk('run', …));    // for each other outcome of a condition
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
  /** Observers for a walk of the same reading that takes something else for granted; `assumed` says what. */
  openOtherWalk(
    reading: 'run' | 'skipped',
    assumed: () => readonly Assumption[],
  ): readonly Observer[];
  /** What the reading's own walk took for granted. */
  assume(reading: 'run' | 'skipped', assumed: readonly Assumption[]): void;
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
  /** Whether some motion was judged at the bounds of what is not known. */
  readonly movesAtBounds?: boolean | undefined;
}

export function openReport(shop: Shop, rules: readonly Rule[], cuts: CutMemory): ReportInProgress {
  const run = openWalk(shop, rules, cuts);
  let skipped: Walk | undefined;
  const others: Record<'run' | 'skipped', OtherWalk[]> = { run: [], skipped: [] };
  const assumed: Record<'run' | 'skipped', readonly Assumption[]> = { run: [], skipped: [] };
  const merge = (reading: 'run' | 'skipped', { book }: Walk) =>
    mergeWalks([
      { gathered: book.gathered(), assumed: assumed[reading] },
      ...others[reading].map((other) => ({
        gathered: other.walk.book.gathered(),
        assumed: other.assumed(),
      })),
    ]);
  const coverage = countLinesNotModelled();
  const summaries = gatherSummaries(shop);
  return {
    observers: [...run.before, coverage, ...summaries.observers, ...run.after],
    openSecondWalk() {
      skipped = openWalk(shop, rules, cuts);
      return [...skipped.before, ...skipped.after];
    },
    openOtherWalk(reading, assumes) {
      const walk = openWalk(shop, rules, cuts);
      others[reading].push({ walk, assumed: assumes });
      return [...walk.before, coverage, ...summaries.ofEveryWalk, ...walk.after];
    },
    assume(reading, made) {
      assumed[reading] = made;
    },
    finish(read) {
      const findings = listFindings(
        merge('run', run),
        skipped && merge('skipped', skipped),
        skipped ? compareWalks(shop, rules, run, skipped, read) : [],
        lengthWords('both'),
      );
      const counts = countSeverities(findings.map((finding) => finding.severity));
      const unattended = countSeverities(unattendedSeverities(findings));
      const summary = summaries.result();
      return {
        format: 'nightlatch-report',
        version: 1,
        engine: ENGINE_VERSION,
        program: {
          name: read.name,
          sha256: read.sha256,
          bytes: read.bytes,
          lines: read.lines,
        },
        setup: { sha256: sha256Hex(canonicalJson(shop.setup)) },
        verdict: verdictOf(counts),
        counts,
        unattended: { verdict: verdictOf(unattended), counts: unattended },
        findings,
        tools: summary.tools,
        extents: summary.extents,
        workZeroWindow: summary.workZeroWindow,
        seconds: summary.seconds,
        material: summary.material,
        coverage: {
          blocks: read.blocks,
          modelled: Math.max(0, read.blocks - coverage.count()),
        },
        dependsOn: summary.dependsOn,
        blind: blindSentences(shop.setup, read.movesAtBounds),
      };
    },
  };
}

type Walk = ReturnType<typeof openWalk>;
interface OtherWalk {
  readonly walk: Walk;
  readonly assumed: () => readonly Assumption[];
}

function openWalk(shop: Shop, rules: readonly Rule[], cuts: CutMemory) {
  const book = openEpisodes(shop.setup, cuts);
  const facts = gatherWalkFacts();
  const observers = rules.map((rule) => rule.observe(shop, book.reporterFor(rule)));
  return { book, facts, before: [book.closing, ...observers, facts], after: [book.counting] };
}

function compareWalks(
  shop: Shop,
  rules: readonly Rule[],
  run: Walk,
  skipped: Walk,
  read: ProgramRead,
): readonly Episode[] {
  const at = read.firstSkippable;
  if (!at) return [];
  const found: Episode[] = [];
  for (const rule of rules) {
    const take = (draft: FindingDraft) =>
      found.push(beginEpisode(rule, draft, NO_STATE, shop.setup));
    rule.compare?.(run.facts.facts(at), skipped.facts.facts(at), { found: take });
  }
  return found;
}

/** After the walks nothing is held and no offset is in force. */
const NO_STATE: Pick<MachineState, 'held' | 'workOffset'> = {
  held: { known: false, number: null, tool: undefined },
  workOffset: '',
};
