import type { CheckProgress, CheckRecord } from '#contracts';

/** The bench's checks, parted by what they ask of a person. Each program appears once a machine. */
export interface BenchLists {
  readonly running: readonly CheckRecord[];
  readonly failed: readonly CheckRecord[];
  readonly stopped: readonly CheckRecord[];
  readonly held: readonly CheckRecord[];
  readonly clear: readonly CheckRecord[];
  /** Done, but something they were held against has changed since. */
  readonly outOfDate: readonly CheckRecord[];
}

/** The newest check of each program on each machine; `checks` come newest first. */
export function newestEach(checks: readonly CheckRecord[]): readonly CheckRecord[] {
  const seen = new Set<string>();
  return checks.filter((check) => {
    const key = `${check.programId} ${check.machineId}`;
    if (seen.has(key)) return false;
    seen.add(key);
    return true;
  });
}

/** What the event stream has said since the list was read, laid over the list. */
export function withProgress(
  checks: readonly CheckRecord[],
  byCheck: ReadonlyMap<string, CheckProgress>,
): readonly CheckRecord[] {
  return checks.map((check) => {
    const progress = byCheck.get(check.id);
    if (!progress || !isAhead(progress, check)) return check;
    const { state, linesRead, lines, verdict } = progress;
    return { ...check, state, linesRead, lines: lines || check.lines, verdict };
  });
}

export function partChecks(checks: readonly CheckRecord[]): BenchLists {
  const newest = newestEach(checks);
  const done = newest.filter((check) => check.state === 'done');
  const upToDate = done.filter((check) => !check.outOfDate);
  return {
    running: newest.filter((check) => check.state === 'queued' || check.state === 'running'),
    failed: newest.filter((check) => check.state === 'failed'),
    stopped: upToDate.filter((check) => check.verdict === 'stopped'),
    held: upToDate.filter((check) => check.verdict === 'held'),
    clear: upToDate.filter((check) => check.verdict === 'clear'),
    outOfDate: done.filter((check) => check.outOfDate),
  };
}

/** How many checks wait for a person; one that is stopped and out of date counts once. */
export function countNeedingSomeone(lists: BenchLists): number {
  const { failed, stopped, held, outOfDate } = lists;
  return failed.length + stopped.length + held.length + outOfDate.length;
}

/** Whole per cent of lines read, 0 while the number of lines is not known. */
export function percentRead(check: Pick<CheckRecord, 'linesRead' | 'lines'>): number {
  if (!(0 < check.lines)) return 0;
  return Math.min(100, Math.round((100 * check.linesRead) / check.lines));
}

const ORDER = ['queued', 'running', 'done', 'failed'] as const;
/** Events and readings race: a check never goes back from done to running on the page. */
function isAhead(progress: CheckProgress, check: CheckRecord): boolean {
  const [said, known] = [ORDER.indexOf(progress.state), ORDER.indexOf(check.state)];
  return known < said || (known === said && check.linesRead <= progress.linesRead);
}
