/** Bundles API and worker into dist/server; packages stay outside, so `npm ci` must have run. */
import { build } from 'esbuild';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { ROOT } from './packages.mjs';

export async function buildServer() {
  await build({
    absWorkingDir: ROOT,
    entryPoints: { api: 'api/src/main.ts', worker: 'worker/src/main.ts' },
    outdir: join('dist', 'server'),
    bundle: true,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    packages: 'external',
    sourcemap: true,
    // Writes constants where they are used: a constant of another module is looked up every time otherwise.
    minifySyntax: true,
    logLevel: 'warning',
  });
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) await buildServer();
