import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { startCheck } from '#engine';
import { setupSchema } from '#contracts';

/**
 * `npm run programs:table -- SETUP FOLDER`: a Markdown table of every program of a folder: its verdict, how
 * many of its blocks are understood, and the first word that is not, with its line.
 */
const [setupFile, folder] = process.argv.slice(2);
if (setupFile === undefined || folder === undefined) {
  throw new Error('Give a setup file and a folder of programs.');
}
const setup = setupSchema.parse(JSON.parse(readFileSync(setupFile, 'utf8')));
const print = (cells: readonly (string | number)[]) => {
  process.stdout.write(`| ${cells.join(' | ')} |\n`);
};

print(['program', 'lines', 'blocks', 'understood', 'verdict', 'first that is not']);
print(['---', '--:', '--:', '--:', '---', '---']);
let blocks = 0;
let modelled = 0;
for (const name of readdirSync(folder).sort()) {
  const bytes = new Uint8Array(readFileSync(join(folder, name)));
  const check = startCheck(setup);
  do check.push(bytes);
  while (check.endOfText() === 'read-again');
  const { coverage, program, verdict, findings } = check.report({ name });
  blocks += coverage.blocks;
  modelled += coverage.modelled;
  const first = findings.find(({ rule }) => rule === 'not-modelled' || rule === 'unreadable-block');
  const part = `${((100 * coverage.modelled) / Math.max(1, coverage.blocks)).toFixed(1)} %`;
  const why = first ? `line ${first.line}: ${first.message.replaceAll('|', '\\|')}` : '';
  print([name, program.lines, coverage.blocks, part, verdict, why]);
}
print(['all', '', blocks, `${((100 * modelled) / Math.max(1, blocks)).toFixed(2)} %`, '', '']);
