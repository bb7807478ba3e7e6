import { MODES, readSetupFile, runMode, type Mode } from './modes';

/**
 * One process of the bench: runs one mode over a file and prints its figures as one JSON line. A program of
 * its own, so that it loads the engine and nothing else.
 */
const [mode, file, setup] = process.argv.slice(2);
if (!isMode(mode) || file === undefined || setup === undefined)
  throw new Error(`Give a mode (${MODES.join(', ')}), a program and a setup file.`);
const before = process.hrtime.bigint();
void Promise.resolve(runMode(mode, file, readSetupFile(setup))).then((result) => {
  const wall = Number(process.hrtime.bigint() - before) / 1e6;
  const { user, system } = process.cpuUsage();
  const cpu = (user + system) / 1000;
  const peak = process.resourceUsage().maxRSS / 1024;
  process.stdout.write(`${JSON.stringify({ cpu, wall, peak, result })}\n`);
});

function isMode(word: string | undefined): word is Mode {
  return MODES.some((each) => each === word);
}
