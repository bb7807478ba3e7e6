import type { MachineState, Observer, Place } from '../interpreter/events';
import type { Extent, FindingData, Severity } from '../report/report';
import type { Shop } from '../shop/shop';

/** One hazard, one file. The file name is the id; the rule reference is generated from these fields. */
export interface Rule {
  readonly id: string;
  readonly group: RuleGroup;
  /** Heading: a statement of the fault, no full stop. */
  readonly title: string;
  readonly severity: Severity;
  /** Severity of an unattended run, where it differs. */
  readonly unattended?: Severity | undefined;
  /** For holds: whether looking at the machine answers it, or judgement. */
  readonly hold?: 'look' | 'judge' | undefined;
  /** One sentence: what gets hurt if this is ignored. */
  readonly protects: string;
  /** Why it is so, what the rule assumes, what it cannot see. */
  readonly explanation: string;
  /** The smallest programs that show it, run as tests against the plain test shop with the given changes. */
  readonly examples: RuleExamples;
  /** Words a finding from its data alone, in the reader's unit. Sentences are whole and carry no line number. */
  readonly word: (data: FindingData, lengths: LengthWords) => Wording;
  readonly observe: (shop: Shop, report: Reporter) => Observer;
  /** What only the comparison of the two readings of `/` blocks shows; called when there are any. */
  readonly compare?:
    ((run: WalkFacts, skipped: WalkFacts, report: FinalReporter) => void) | undefined;
}
/** What of a rule the docs and the client need: all but the code that looks. */
export type RuleReference = Omit<Rule, 'observe' | 'compare' | 'word'>;
/** One reading of a program with `/` blocks, for comparison with the other. */
export interface WalkFacts {
  readonly firstSkippable: Place;
  readonly tools: readonly number[];
  /** Lowest gauge-point and tip z per tool, and the extents, each null when nothing moved. */
  readonly lowest: Readonly<Record<number, number>>;
  readonly extent: Extent | null;
}
export type RuleGroup =
  | 'reading'
  | 'state'
  | 'tools'
  | 'length'
  | 'travel-and-clearance'
  | 'spindle-and-feed'
  | 'arcs-and-cycles'
  | 'unattended'
  | 'tool-change-macro';
export interface RuleExamples {
  /** Deep-merged over the plain test shop's setup document. */
  readonly setup?: object;
  readonly bad: string;
  readonly good: string;
}
export interface Wording {
  readonly message: string;
  readonly advice: string;
}
/** How a sentence writes a length: '34.2 mm (1.346 in)' in the report, one unit for a person's own view. */
export interface LengthWords {
  /** A length, e.g. '34.2 mm (1.346 in)'. */
  length(mm: number): string;
  /** A position on an axis, e.g. 'X 1304.2 mm (51.346 in)'. */
  position(axis: string, mm: number): string;
  /** A feed, e.g. '4800 mm/min (189 in/min)'. */
  feed(mmPerMinute: number): string;
}

/**
 * Whether this walk remembers where it has cut. Few programs ever need it, and remembering costs more than
 * all the rest, so a check walks without; a rule that has to know wants it, and then the walk begins again.
 */
export interface CutMemory {
  readonly isKept: boolean;
  want(): void;
}

/** What a rule says happened in the block now read (or at `at`). */
export interface FindingDraft {
  /** Keys the episode beside rule, tool and work offset: axis and side, body pair, code, word. */
  readonly cause: string;
  /** How bad; the greatest of an episode is its worst place. Default 0 (the first stays the worst). */
  readonly by?: number | undefined;
  readonly at: Place;
  readonly data: FindingData;
  /** Where one rule has two severities, such as length-offset-disagrees. */
  readonly severity?: Severity | undefined;
  readonly unattended?: Severity | undefined;
  /** The tool the finding is about, where it is not the one in the spindle. */
  readonly tool?: number | undefined;
}
export interface Reporter {
  readonly cuts: CutMemory;
  /** Counts the block towards the episode of its cause; blocks, not motions, are counted. */
  found(draft: FindingDraft, state: MachineState): void;
}
/** Reports after the walks are over, when there is no machine state any more. */
export interface FinalReporter {
  found(draft: FindingDraft): void;
}

export function defineRule(rule: Rule): Rule {
  return rule;
}
