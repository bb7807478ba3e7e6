import { MODES, readSetupFile, runMode, type Mode } from './modes';

/**
 * `npm run bench`: how fast the engine is, in whole processes that take turns, against a newline count
 * and against a public parser that only cuts the same file into words. With `--only MODE FILE SETUP` it is
 * one of those processes: it runs one mode, and prints its figures as one JSON line.
 */
const [first, mode, file, setup] = process.argv.slice(2);
if (first === '--only' && file !== undefined && setup !== undefined && isMode(mode))
  runOne(mode, file, setup);
else await (await import('./take-turns')).takeTurns(process.argv.slice(2));

function isMode(word: string | undefined): word is Mode {
  return MODES.some((each) => each === word);
}

function runOne(mode: Mode, file: string, setup: string): void {
  const before = process.hrtime.bigint();
  const result = runMode(mode, file, readSetupFile(setup));
  const wall = Number(process.hrtime.bigint() - before) / 1e6;
  const { user, system } = process.cpuUsage();
  const cpu = (user + system) / 1000;
  const peak = process.resourceUsage().maxRSS / 1024;
  process.stdout.write(`${JSON.stringify({ cpu, wall, peak, result })}\n`);
}
