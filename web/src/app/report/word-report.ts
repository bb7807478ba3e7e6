import type { CheckDetails, MachineDetails, ReportSummary } from '#contracts';
import { counted } from '../ui/count';

type Counts = ReportSummary['counts'];

/** "3 findings forbid this run, 1 waits for an answer, 1 is worth knowing." */
export function wordCounts(counts: Counts): string {
  const { stop, hold, note } = counts;
  const total = stop + hold + note;
  if (total === 0) return 'Nothing was found.';
  const parts = [
    part(stop, 'forbids this run', 'forbid this run'),
    part(hold, 'waits for an answer', 'wait for an answer'),
    part(note, 'is worth knowing', 'are worth knowing'),
  ].filter((each) => each !== null);
  const [first, ...rest] = parts;
  const lead = first!.count === 1 ? '1 finding' : `${first!.count} findings`;
  return `${[`${lead} ${first!.words}`, ...rest.map((each) => `${each.count} ${each.words}`)].join(', ')}.`;
}
function part(count: number, one: string, many: string): { count: number; words: string } | null {
  return count === 0 ? null : { count, words: count === 1 ? one : many };
}

/** "All 58 025 lines were understood." or how many were not. */
export function wordCoverage(summary: Pick<ReportSummary, 'coverage' | 'program'>): string {
  const { blocks, modelled } = summary.coverage;
  const missed = blocks - modelled;
  if (missed > 0) {
    return `${counted(missed, 'line')} of ${counted(blocks, 'block')} could not be followed: the check says nothing about ${missed === 1 ? 'it' : 'them'}.`;
  }
  const { lines } = summary.program;
  if (blocks === 0) return 'No line holds anything to run.';
  return lines === 1
    ? 'Its one line was understood.'
    : `All ${counted(lines, 'line')} were understood.`;
}

/** What a check was held against, in the order a person would ask. */
export function wordAgainst(against: CheckDetails['check']['against']): string {
  const parts = [
    `machine ${against.machineRevision}`,
    `rack ${against.rackRevision}`,
    `loading ${against.loadingRevision}`,
    `offsets ${against.offsetRevision}`,
    against.macroRevision === null ? 'no macro' : `macro ${against.macroRevision}`,
  ];
  return parts.join(' · ');
}

/** Which revisions have moved on since the check, one sentence each; empty: none that is known. */
export function wordChanges(details: CheckDetails, now: MachineDetails | null): readonly string[] {
  const { check, newestRevision } = details;
  const sentences: string[] = [];
  if (newestRevision > check.programRevision) {
    sentences.push(
      `The program has a newer revision: ${newestRevision}; this is ${check.programRevision}.`,
    );
  }
  if (!now) return sentences;
  const then = check.against;
  const pairs: [string, number | null, number | null][] = [
    ['The loading', then.loadingRevision, now.loadingRevision.number],
    ['The rack', then.rackRevision, now.rackRevision.number],
    ['The machine’s description', then.machineRevision, now.revision.number],
    ['The work offsets', then.offsetRevision, now.offsetRevision.number],
    ['The change macro', then.macroRevision, now.macroRevision?.number ?? null],
  ];
  for (const [what, was, is] of pairs) {
    if (was === is || is === null) continue;
    const verb = what.endsWith('s') ? 'are' : 'is';
    sentences.push(
      `${what} ${verb} at revision ${is} now; the check was held against ${was ?? 'none'}.`,
    );
  }
  return sentences;
}

/** `9f2c…b41e`: enough of a hash to compare by eye. */
export function shortHash(sha256: string): string {
  return `${sha256.slice(0, 4)}…${sha256.slice(-4)}`;
}

/** Lines as ranges a person can read: "12, 40–44 and 7 more". */
export function wordLines(lines: readonly number[], most = 8): string {
  const sorted = [...new Set(lines)].sort((a, b) => a - b);
  const ranges: [number, number][] = [];
  for (const line of sorted) {
    const last = ranges.at(-1);
    if (last && line === last[1] + 1) last[1] = line;
    else ranges.push([line, line]);
  }
  const shown = ranges
    .slice(0, most)
    .map(([from, to]) => (from === to ? `${from}` : `${from}–${to}`));
  const rest = ranges.slice(most).reduce((sum, [from, to]) => sum + to - from + 1, 0);
  return rest === 0 ? shown.join(', ') : `${shown.join(', ')} and ${rest} more`;
}
