/** Input that makes a result impossible: the reason goes to standard error, the exit code is 3. */
export class InputRefused extends Error {}

export const EXIT_REFUSED = 3;

/** Runs a command and ends the process with its exit code; a refused input with 3 and its reason. */
export function runCommand(command: (words: readonly string[]) => number): void {
  // A reader that has seen enough closes the pipe; that is no fault of ours.
  process.stdout.on('error', (error: NodeJS.ErrnoException) => {
    if (error.code !== 'EPIPE') throw error;
    process.exit();
  });
  try {
    process.exitCode = command(process.argv.slice(2));
  } catch (error) {
    if (!(error instanceof InputRefused)) throw error;
    process.stderr.write(`${error.message}\n`);
    process.exitCode = EXIT_REFUSED;
  }
}
