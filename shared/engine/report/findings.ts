import type { Place } from '../interpreter/events';
import type { LengthWords } from '../rules/rule';
import { episodeData, episodeKey, FINDINGS_A_RULE, type Episode, type Fold } from './episodes';
import type { Gathered } from './episodes';
import { wordFold } from './fold-words';
import { covers, foldKey, groupByKey } from './merge-walks';
import type { Columns, Finding, Severity } from './report';
import { severityRank } from './severity';

/**
 * The findings of a report in their order, from what the walks gathered. A finding of the second walk
 * stands only where the first has none like it: same rule, cause, tool and offset, over lines that hold
 * it, and no less bad.
 */
export function listFindings(
  run: Gathered,
  skipped: Gathered | undefined,
  compared: readonly Episode[],
  lengths: LengthWords,
): readonly Finding[] {
  const only = skipped ? onlyWhenSkipped(run, skipped) : { episodes: [], folds: [] };
  const { kept, folds } = capTogether(run, only);
  return [
    ...kept.run.map((episode) => describe(episode, undefined, lengths)),
    ...kept.only.map((episode) => describe(episode, 'on', lengths)),
    ...compared.map((episode) => describe(episode, undefined, lengths)),
    ...folds.run.map((fold) => describeFold(fold, undefined)),
    ...folds.only.map((fold) => describeFold(fold, 'on')),
  ].sort(inOrder);
}

function onlyWhenSkipped(run: Gathered, skipped: Gathered): Gathered {
  const known = groupByKey(run.episodes);
  const folded = new Set(run.folds.map(foldKey));
  return {
    episodes: skipped.episodes.filter((episode) => {
      if (folded.has(foldKey(episode))) return false;
      return !(known.get(episodeKey(episode)) ?? []).some((like) => covers(like, episode));
    }),
    folds: skipped.folds.filter((fold) => !folded.has(foldKey(fold))),
  };
}

/** The limit of findings a rule counts all walks: what later ones add beyond it folds. */
function capTogether(run: Gathered, only: Gathered) {
  const counts = new Map<string, number>();
  const first = capOne(run, counts);
  const second = capOne(only, counts);
  return {
    kept: { run: first.episodes, only: second.episodes },
    folds: { run: first.folds, only: second.folds },
  };
}

function capOne(gathered: Gathered, counts: Map<string, number>): Gathered {
  const episodes: Episode[] = [];
  const folds = new Map<string, Fold>(gathered.folds.map((fold) => [foldKey(fold), { ...fold }]));
  for (const episode of gathered.episodes) {
    const count = (counts.get(episode.rule.id) ?? 0) + 1;
    counts.set(episode.rule.id, count);
    if (count <= FINDINGS_A_RULE) episodes.push(episode);
    else addTo(folds, episode);
  }
  return { episodes, folds: [...folds.values()] };
}

function addTo(folds: Map<string, Fold>, episode: Episode): void {
  const key = foldKey(episode);
  const fold = folds.get(key);
  const { rule, severity, unattended, first, endLine, count } = episode;
  folds.set(key, {
    rule,
    severity,
    unattended,
    firstLine: Math.min(first.line, fold?.firstLine ?? first.line),
    endLine: Math.max(endLine, fold?.endLine ?? endLine),
    findings: (fold?.findings ?? 0) + 1,
    count: (fold?.count ?? 0) + count,
  });
}

function describe(episode: Episode, blockDelete: 'on' | undefined, lengths: LengthWords): Finding {
  const { rule, first, tool } = episode;
  const data = episodeData(episode);
  return inContractOrder({
    ...judged(episode),
    line: first.line,
    endLine: episode.endLine,
    worstLine: episode.worstLine,
    count: episode.count,
    columns: first.columns,
    within: withinInOrder(first),
    blockDelete,
    assumed: episode.assumed,
    tool: tool === null || tool === 0 ? undefined : tool,
    ...rule.word(data, lengths),
    data,
  });
}

function describeFold(fold: Fold, blockDelete: 'on' | undefined): Finding {
  const data = { folded: fold.findings };
  return inContractOrder({
    ...judged(fold),
    line: fold.firstLine,
    endLine: fold.endLine,
    worstLine: fold.firstLine,
    count: fold.count,
    blockDelete,
    folded: fold.findings,
    ...wordFold(fold.findings),
    data,
  });
}

function judged({ rule, severity, unattended }: Pick<Fold, 'rule' | 'severity' | 'unattended'>) {
  const isHold = severity === 'hold' || unattended === 'hold';
  return {
    rule: rule.id,
    severity,
    unattended: unattended === severity ? undefined : unattended,
    hold: isHold ? (rule.hold ?? 'judge') : undefined,
  };
}

/** Optional keys are left out, not written as undefined; the rest stand as the contract lists them. */
function inContractOrder(finding: Finding): Finding {
  const { rule, severity, unattended, line, endLine, worstLine, count } = finding;
  const { columns, within, blockDelete, assumed, tool, folded, hold } = finding;
  const { message, advice, data } = finding;
  return {
    rule,
    severity,
    ...(unattended && { unattended }),
    line,
    endLine,
    worstLine,
    count,
    ...(columns && { columns }),
    ...(within && { within }),
    ...(blockDelete && { blockDelete }),
    ...(assumed && { assumed }),
    ...(tool !== undefined && { tool }),
    ...(folded !== undefined && { folded }),
    ...(hold && { hold }),
    message,
    advice,
    data,
  };
}

function withinInOrder({ within }: Place): Finding['within'] {
  if (!within) return undefined;
  const { text, line, columns } = within;
  return columns ? { text, line, columns } : { text, line };
}

/** Line, then stop, hold, note, then rule, columns, within.line, message (engine.md). */
function inOrder(one: Finding, other: Finding): number {
  return (
    one.line - other.line ||
    severityRank(one.severity) - severityRank(other.severity) ||
    compareText(one.rule, other.rule) ||
    compareColumns(one.columns, other.columns) ||
    (one.within?.line ?? 0) - (other.within?.line ?? 0) ||
    compareText(one.message, other.message) ||
    severityRank(one.unattended ?? one.severity) - severityRank(other.unattended ?? other.severity)
  );
}

function compareColumns(one: Columns | undefined, other: Columns | undefined): number {
  return (one?.[0] ?? 0) - (other?.[0] ?? 0) || (one?.[1] ?? 0) - (other?.[1] ?? 0);
}

/** By UTF-16 code units, so that no locale can change a report. */
function compareText(one: string, other: string): number {
  return one < other ? -1 : other < one ? 1 : 0;
}

export function unattendedSeverities(findings: readonly Finding[]): readonly Severity[] {
  return findings.map((finding) => finding.unattended ?? finding.severity);
}
