import type { MachineState, Observer, Place } from '../interpreter/events';
import type { CutMemory, FindingDraft, Reporter, Rule } from '../rules/rule';
import type { Setup } from '../shop/setup';
import type { Assumption, FindingData, Severity } from './report';
import { roundData } from './rounding';
import { worseOf } from './severity';

/** One hazard from its first violating block to the next tool or offset change. */
export interface Episode {
  readonly rule: Rule;
  readonly severity: Severity;
  readonly unattended: Severity;
  readonly cause: string;
  readonly tool: number | null;
  readonly workOffset: string;
  readonly first: Place;
  endLine: number;
  worstLine: number;
  worstBy: number;
  worstData: FindingData;
  count: number;
  /** Where not every walk finds it: what the walk that does had assumed. */
  readonly assumed?: readonly Assumption[] | undefined;
}
/** What of a rule no longer stands on its own, once it has found too many. */
export interface Fold {
  readonly rule: Rule;
  readonly severity: Severity;
  readonly unattended: Severity;
  readonly firstLine: number;
  endLine: number;
  findings: number;
  count: number;
}
/** What one walk found. */
export interface Gathered {
  readonly episodes: readonly Episode[];
  readonly folds: readonly Fold[];
}

/** After this many findings of a rule the rest fold into one (engine.md). */
export const FINDINGS_A_RULE = 500;
/** Folded episodes whose blocks are told apart; beyond it a block may count as one more finding. */
const FOLDED_KEYS = 10_000;

export interface EpisodeBook {
  /** Ends every episode at a tool or offset change; called before the rules see the event. */
  readonly closing: Observer;
  /** Counts blocks; called after the rules have seen the block. */
  readonly counting: Observer;
  reporterFor(rule: Rule): Reporter;
  gathered(): Gathered;
}

interface Entry {
  readonly target: Episode | Fold;
  lastBlock: number;
  lastPlace: string;
}

export function openEpisodes(setup: Setup, cuts: CutMemory): EpisodeBook {
  const episodes: Episode[] = [];
  const folds = new Map<string, Fold>();
  const open = new Map<string, Entry>();
  const openFolded = new Map<string, Entry>();
  const foundByRule = new Map<string, number>();
  let block = 0;
  const endAll = () => {
    open.clear();
    openFolded.clear();
  };

  const begin = (rule: Rule, key: string, episode: Episode): void => {
    const found = (foundByRule.get(rule.id) ?? 0) + 1;
    foundByRule.set(rule.id, found);
    const entry = { lastBlock: block, lastPlace: spot(episode.first) };
    if (found <= FINDINGS_A_RULE) {
      episodes.push(episode);
      open.set(key, { ...entry, target: episode });
      return;
    }
    if (openFolded.size >= FOLDED_KEYS) openFolded.clear();
    openFolded.set(key, { ...entry, target: foldIn(folds, episode) });
  };

  const found = (rule: Rule, draft: FindingDraft, state: MachineState): void => {
    const episode = beginEpisode(rule, draft, state, setup);
    const key = episodeKey(episode);
    const entry = open.get(key) ?? openFolded.get(key);
    if (!entry) return begin(rule, key, episode);
    const place = spot(draft.at);
    const sameBlock = entry.lastBlock === block && entry.lastPlace === place;
    entry.lastBlock = block;
    entry.lastPlace = place;
    extend(entry.target, episode, sameBlock ? 0 : 1);
  };

  return {
    closing: {
      toolChanged: endAll,
      offsetChanged(event) {
        if (event.from !== event.to) endAll();
      },
    },
    counting: {
      block() {
        block += 1;
      },
    },
    reporterFor: (rule) => ({ cuts, found: (draft, state) => found(rule, draft, state) }),
    gathered: () => ({ episodes, folds: [...folds.values()] }),
  };
}

/** Severity is part of the key: a stop never hides among the holds of its own rule. */
export function episodeKey(episode: Episode): string {
  const { rule, cause, tool, workOffset, severity } = episode;
  return `${rule.id} ${severity} ${tool} ${workOffset} ${cause}`;
}

export function beginEpisode(
  rule: Rule,
  draft: FindingDraft,
  state: Pick<MachineState, 'held' | 'workOffset'>,
  setup: Setup,
): Episode {
  const severities = severitiesOf(rule, draft, setup);
  return {
    rule,
    ...severities,
    cause: draft.cause,
    tool: draft.tool ?? state.held.number,
    workOffset: state.workOffset,
    first: draft.at,
    endLine: draft.at.line,
    worstLine: draft.at.line,
    worstBy: draft.by ?? 0,
    worstData: draft.data,
    count: 1,
  };
}

/** An unattended run is never judged more kindly, and a shop may only raise. */
function severitiesOf(
  rule: Rule,
  draft: FindingDraft,
  setup: Setup,
): { severity: Severity; unattended: Severity } {
  const own = draft.severity ?? rule.severity;
  const raised = setup.policy.raise[rule.id];
  const severity = raised ? worseOf(own, raised) : own;
  const unattended = worseOf(draft.unattended ?? rule.unattended ?? severity, severity);
  return { severity, unattended };
}

function extend(target: Episode | Fold, by: Episode, blocks: number): void {
  target.count += blocks;
  target.endLine = Math.max(target.endLine, by.first.line);
  if (!('worstBy' in target) || !(target.worstBy < by.worstBy)) return;
  target.worstBy = by.worstBy;
  target.worstLine = by.first.line;
  target.worstData = by.worstData;
}

function foldIn(folds: Map<string, Fold>, episode: Episode): Fold {
  const { rule, severity, unattended, first } = episode;
  const key = `${rule.id} ${severity} ${unattended}`;
  const fold = folds.get(key);
  if (fold) {
    fold.findings += 1;
    fold.count += 1;
    fold.endLine = Math.max(fold.endLine, first.line);
    return fold;
  }
  const begun = {
    rule,
    severity,
    unattended,
    firstLine: first.line,
    endLine: first.line,
    findings: 1,
    count: 1,
  };
  folds.set(key, begun);
  return begun;
}

function spot(place: Place): string {
  return place.within ? `${place.line} ${place.within.text} ${place.within.line}` : `${place.line}`;
}

/** Data is rounded when the report is put together, not for each violating block. */
export function episodeData(episode: Episode): FindingData {
  return roundData(episode.worstData);
}
