import type { CheckRecord } from '#contracts';

/** What a mark can stand for: a severity, the clear verdict, and the two states before a verdict. */
export type MarkKind = 'stop' | 'hold' | 'note' | 'clear' | 'waiting' | 'failed';

export const MARK_WORDS: Readonly<Record<MarkKind, string>> = {
  stop: 'stop',
  hold: 'hold',
  note: 'note',
  clear: 'clear',
  waiting: 'waiting',
  failed: 'not finished',
};

type Verdict = NonNullable<CheckRecord['verdict']>;
const KIND_OF_VERDICT: Readonly<Record<Verdict, MarkKind>> = {
  stopped: 'stop',
  held: 'hold',
  clear: 'clear',
};

/** The mark and word for a check as it stands: its verdict, or why it has none yet. */
export function markOfCheck(check: Pick<CheckRecord, 'state' | 'verdict'>): {
  kind: MarkKind;
  word: string;
} {
  if (check.state === 'failed') return { kind: 'failed', word: 'not finished' };
  if (check.state === 'queued') return { kind: 'waiting', word: 'waiting' };
  if (check.state === 'running' || !check.verdict) return { kind: 'waiting', word: 'checking' };
  return { kind: KIND_OF_VERDICT[check.verdict], word: check.verdict };
}

export function kindOfVerdict(verdict: Verdict): MarkKind {
  return KIND_OF_VERDICT[verdict];
}
