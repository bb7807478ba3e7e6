import { canonicalJson, sha256Hex, type startCheck } from '#engine';
import { reportSchema, setupSchema, type ReportDocument, type ValidSetup } from '#contracts';
import type { Logger } from 'pino';
import { claimCheck } from '../../../api/src/db/claim-check';
import type { CheckRuns, CheckToRun } from '../../../api/src/db/stores/check-runs';
import type { Deaths } from './die-at';
import { paceProgress } from './pace-progress';
import { EngineFault, walkProgram, type Walked } from './walk-program';

export interface CheckProgramParts {
  readonly runs: CheckRuns;
  readonly startCheck: typeof startCheck;
  readonly databaseUrl: string;
  readonly logger: Logger;
  readonly deaths: Deaths;
  /** Aborted when the worker is asked to stop. */
  readonly stopping: AbortSignal;
  /** Milliseconds of a clock that only goes forward. */
  readonly now: () => number;
}

/**
 * Carries out one check. Safe to be run twice or by two workers: one claims it, and whoever comes
 * after it was finished changes nothing. What it throws makes the queue try the job again.
 */
export async function checkProgram(parts: CheckProgramParts, checkId: string): Promise<void> {
  const { runs, logger } = parts;
  const claim = await claimCheck(parts.databaseUrl, checkId);
  if (!claim) {
    logger.info({ checkId }, 'another worker is at this check');
    return;
  }
  try {
    const run = await runs.begin(checkId);
    if (!run) {
      logger.info({ checkId }, 'this check is finished already');
      return;
    }
    await carryOut(parts, run, AbortSignal.any([claim.lost, parts.stopping]));
  } finally {
    await claim.release();
  }
}

async function carryOut(
  parts: CheckProgramParts,
  run: CheckToRun,
  signal: AbortSignal,
): Promise<void> {
  const { runs, logger, deaths, now } = parts;
  const { checkId } = run;
  const setup = setupSchema.safeParse(run.setup);
  if (!setup.success) {
    logger.error({ checkId, err: setup.error }, 'the setup kept with the check is refused');
    await runs.fail(checkId, SETUP_REFUSED);
    return;
  }
  const began = now();
  logger.info({ checkId, lines: run.program.lines }, 'the check begins');
  try {
    await deaths.reached('begun');
    const { report, path } = await walk(parts, run, setup.data, signal);
    await deaths.reached('before-save');
    const result = { report: asDocument(run, setup.data, report), path };
    const isNew = await runs.save(checkId, result, () => deaths.reached('within-save'));
    await deaths.reached('after-save');
    const milliseconds = Math.round(now() - began);
    const { verdict, counts } = report;
    logger.info({ checkId, isNew, verdict, counts, milliseconds }, 'the check is done');
  } catch (error) {
    if (error instanceof EngineFault) {
      logger.error({ checkId, line: error.line, err: error.cause }, 'the engine failed');
      await runs.fail(checkId, sentenceOf(error));
      return;
    }
    if (parts.stopping.aborted) {
      logger.info({ checkId }, 'the worker stops; the check is given back');
      await runs.giveBack(checkId);
      return;
    }
    throw error;
  }
}

async function walk(
  { runs, startCheck, deaths, now }: CheckProgramParts,
  run: CheckToRun,
  setup: ValidSetup,
  signal: AbortSignal,
): Promise<Walked> {
  const pass = paceProgress(
    {
      tell: (linesRead) => runs.tell(run, linesRead),
      keep: (linesRead) => runs.keepProgress(run.checkId, linesRead),
    },
    now,
  );
  return await walkProgram(run, setup, {
    startCheck,
    signal,
    onProgress: async (linesRead) => {
      await deaths.walked(linesRead);
      await pass(linesRead);
    },
  });
}

/** A report that is not of the contract's shape, or about another setup, must not be kept as a verdict. */
function asDocument(
  { program }: CheckToRun,
  setup: ValidSetup,
  report: Walked['report'],
): ReportDocument {
  const checked = reportSchema.safeParse(report);
  if (!checked.success) throw new EngineFault(program.lines, checked.error);
  const expected = sha256Hex(canonicalJson(setup));
  if (checked.data.setup.sha256 === expected) return checked.data;
  const cause = new Error(`The report is about setup ${checked.data.setup.sha256}.`);
  throw new EngineFault(program.lines, cause);
}

const SETUP_REFUSED =
  'The setup kept with this check was written by another version of Nightlatch and cannot be read any ' +
  'more, so nothing was checked. Ask for the check again: it takes the setup as it stands now.';

function sentenceOf({ line }: EngineFault): string {
  return (
    `The check failed at line ${line} by a fault of Nightlatch itself, not of the program. Nothing is ` +
    'known about this program: do not run it unproven. Report the program to whoever looks after ' +
    'Nightlatch, and ask for the check again once it is mended.'
  );
}
