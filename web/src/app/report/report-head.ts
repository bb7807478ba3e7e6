import type { CheckDetails, CheckRecord, ReportSummary, Units } from '#contracts';
import { counted, formatCount } from '../ui/count';
import { formatLength } from '../ui/length';
import { kindOfVerdict } from '../ui/severity-mark/mark-kind';
import { formatDuration, formatMoment, secondsBetween } from '../ui/time';
import { shortHash, wordAgainst, wordCounts, wordCoverage } from './word-report';

const VERDICT_LEADS = { stopped: 'Stopped.', held: 'Held.', clear: 'Clear.' } as const;

/** The line of facts under a report's heading. */
export function factsOf({ check, sha256 }: CheckDetails, now: Date) {
  const took = secondsBetween(check.startedAt, check.finishedAt);
  const when = `checked ${formatMoment(check.finishedAt, now)}`;
  return {
    revision: `revision ${check.programRevision}`,
    hash: shortHash(sha256),
    sha256,
    lines: counted(check.lines, 'line'),
    against: wordAgainst(check.against),
    when: check.finishedAt ? `${when}${took === null ? '' : `, took ${formatDuration(took)}`}` : '',
  };
}

/** How far a check has got that is not over; `share` in per cent of its lines. */
export function progressOf(check: Pick<CheckRecord, 'state' | 'lines' | 'linesRead'>) {
  const { state, lines, linesRead } = check;
  if (state === 'queued') {
    return { share: 0, lead: 'Waiting.', words: 'The check stands in line and begins by itself.' };
  }
  return {
    share: lines > 0 ? Math.min(100, (100 * linesRead) / lines) : 0,
    lead: 'Checking.',
    words: `${formatCount(linesRead)} of ${counted(lines, 'line')} read.`,
  };
}

/** What the banner says of a finished check: for an attended run, and beside it an unattended one. */
export function verdictOf(summary: ReportSummary, units: Units) {
  const { verdict, counts, unattended, tools, seconds } = summary;
  const lows = tools.flatMap(({ lowest }) => (lowest === null ? [] : [lowest]));
  return {
    kind: kindOfVerdict(verdict),
    lead: VERDICT_LEADS[verdict],
    words: `${wordCounts(counts)} ${wordCoverage(summary)}`,
    unattended: {
      kind: kindOfVerdict(unattended.verdict),
      verdict: unattended.verdict,
      words: wordCounts(unattended.counts),
    },
    run: formatDuration(seconds.total),
    changes: String(tools.reduce((sum, tool) => sum + tool.changes, 0)),
    lowest: formatLength(lows.length > 0 ? Math.min(...lows) : null, units),
  };
}
