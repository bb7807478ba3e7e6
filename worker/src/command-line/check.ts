import { createHash } from 'node:crypto';
import { basename } from 'node:path';
import type { ValidSetup } from '#contracts';
import { startCheck, type Report, type Verdict } from '#engine';
import { readCheckWords } from './check-words';
import { InputRefused, runCommand } from './input-refused';
import { printReport } from './print-report';
import { readProgram } from './read-program';
import { readSetup } from './read-setup';

/** `npm run --silent check`: the engine as the worker runs it, on files, without the database. */
const EXIT_CODES: Readonly<Record<Verdict, number>> = { clear: 0, held: 1, stopped: 2 };

runCommand((words) => {
  const { setup: path, programs, json, unattended, blockDelete } = readCheckWords(words);
  const setup = readSetup(path);
  let exitCode = 0;
  let refusals = '';
  for (const program of programs) {
    try {
      const report = checkFile(program, setup, blockDelete);
      process.stdout.write(json ? `${JSON.stringify(report)}\n` : printReport(report, unattended));
      const { verdict } = unattended ? report.unattended : report;
      exitCode = Math.max(exitCode, EXIT_CODES[verdict]);
    } catch (error) {
      // One unreadable program must not hide the reports of the others.
      if (!(error instanceof InputRefused)) throw error;
      refusals += `${error.message}\n`;
    }
  }
  if (refusals !== '') throw new InputRefused(refusals.trimEnd());
  return exitCode;
});

function checkFile(path: string, setup: ValidSetup, blockDelete: boolean): Report {
  const check = startCheck(setup, {
    blockDelete: blockDelete ? 'on' : undefined,
    // Node's own digest is many times faster than the engine's, which must run anywhere.
    digests: false,
  });
  const digest = createHash('sha256');
  readProgram(path, (bytes) => {
    digest.update(bytes);
    check.push(bytes);
  });
  while (check.endOfText() === 'read-again') readProgram(path, (bytes) => check.push(bytes));
  return check.report({ name: basename(path), sha256: digest.digest('hex') });
}
