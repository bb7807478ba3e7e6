import { episodeKey, type Episode, type Fold, type Gathered } from './episodes';
import type { Assumption } from './report';

/** What one walk found, and what it took for granted on the way. */
export interface AssumedWalk {
  readonly gathered: Gathered;
  readonly assumed: readonly Assumption[];
}

/**
 * The findings of all walks of one reading as if they were of one. A finding stands once; what not every walk
 * finds carries what the walk that found it had assumed.
 */
export function mergeWalks(walks: readonly AssumedWalk[]): Gathered {
  if (walks.length === 1) return walks[0]!.gathered;
  const byKey = walks.map(({ gathered }) => groupByKey(gathered.episodes));
  const merged = new Map<string, Episode[]>();
  const folds = new Map<string, Fold>();
  walks.forEach(({ gathered, assumed }, index) => {
    for (const fold of gathered.folds)
      if (!folds.has(foldKey(fold))) folds.set(foldKey(fold), fold);
    for (const episode of gathered.episodes) {
      const key = episodeKey(episode);
      const known = merged.get(key) ?? [];
      if (known.some((each) => covers(each, episode))) continue;
      const isEverywhere = byKey.every(
        (episodes, other) =>
          other === index || (episodes.get(key) ?? []).some((each) => isLike(each, episode)),
      );
      merged.set(key, [...known, isEverywhere ? episode : { ...episode, assumed }]);
    }
  });
  return { episodes: [...merged.values()].flat(), folds: [...folds.values()] };
}

export function groupByKey(episodes: readonly Episode[]): Map<string, Episode[]> {
  const groups = new Map<string, Episode[]>();
  for (const episode of episodes) {
    const key = episodeKey(episode);
    const like = groups.get(key);
    if (like) like.push(episode);
    else groups.set(key, [episode]);
  }
  return groups;
}

/** Whether what is known says all that the other does: over lines that hold it, and no less bad. */
export function covers(known: Episode, other: Episode): boolean {
  return (
    known.first.line <= other.first.line &&
    other.endLine <= known.endLine &&
    !(known.worstBy < other.worstBy)
  );
}

export function foldKey(one: Pick<Fold, 'rule' | 'severity' | 'unattended'>): string {
  return `${one.rule.id} ${one.severity} ${one.unattended}`;
}

const isLike = (one: Episode, other: Episode): boolean =>
  one.first.line === other.first.line || covers(one, other) || covers(other, one);
