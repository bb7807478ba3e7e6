/**
 * Runs one of the command-line entries as plain Node.js: `node api/launch/run-cli.mjs check|trace|bench …`.
 * The entry is bundled into dist/cli first when a source of it is newer, so that starting takes a fraction
 * of a second.
 */
import { existsSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { fail } from './debian.mjs';
import { ROOT } from './packages.mjs';

const ENTRIES = {
  check: 'worker/src/command-line/check.ts',
  trace: 'worker/src/command-line/trace.ts',
  bench: 'shared/engine/bench/bench.ts',
  'bench-run': 'shared/engine/bench/run-mode.ts',
};
const SOURCES = ['shared', 'worker/src/command-line'];

const [name, ...words] = process.argv.slice(2);
const entry = ENTRIES[name] ?? fail(`Say which: ${Object.keys(ENTRIES).join(', ')}.`);
const bundle = join(ROOT, 'dist', 'cli', `${name}.cjs`);
if (!isFresh(bundle)) await bundleEntry();
process.argv = [process.argv[0], bundle, ...words];
await import(pathToFileURL(bundle).href);

async function bundleEntry() {
  if (!existsSync(join(ROOT, 'node_modules', 'esbuild'))) {
    fail('The packages are not installed yet: run "npm ci" first.');
  }
  const { build } = await import('esbuild');
  await build({
    absWorkingDir: ROOT,
    // The bench runs another bundle in processes of its own.
    entryPoints: { [name]: entry, ...(name === 'bench' && { 'bench-run': ENTRIES['bench-run'] }) },
    outdir: join('dist', 'cli'),
    bundle: true,
    platform: 'node',
    target: 'node20',
    // Starts a tenth sooner than a module, and so does a shorter text.
    format: 'cjs',
    outExtension: { '.js': '.cjs' },
    minifyWhitespace: true,
    sourcemap: true,
    // Writes constants where they are used: a constant of another module is looked up every time otherwise.
    minifySyntax: true,
    logLevel: 'error',
    // gcode-parser is CommonJS and reads its own files; only the bench uses it.
    external: ['gcode-parser', 'esbuild'],
  });
}

function isFresh(file) {
  if (!existsSync(file)) return false;
  const made = statSync(file).mtimeMs;
  return SOURCES.every((each) => newest(join(ROOT, each)) <= made);
}

function newest(path) {
  const found = statSync(path);
  if (!found.isDirectory()) return found.mtimeMs;
  return Math.max(found.mtimeMs, ...readdirSync(path).map((name) => newest(join(path, name))));
}
