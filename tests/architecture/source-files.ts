import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { dirname, join, posix, relative } from 'node:path';

export const ROOT = join(import.meta.dirname, '..', '..');
const PARTS = ['api', 'worker', 'web', 'shared', 'fixtures', 'tests'];
const SUBPATHS: Readonly<Record<string, string>> = {
  '#contracts': 'shared/contracts/index.ts',
  '#engine': 'shared/engine/index.ts',
};

export interface SourceFile {
  /** Path from the project's root, with forward slashes. */
  readonly path: string;
  /** Project files it imports, type-only imports apart. */
  readonly imports: readonly string[];
  readonly typeImports: readonly string[];
  /** Packages it imports. */
  readonly packages: readonly string[];
}

/** Every TypeScript file of the project with what it imports. */
export function readSourceFiles(): SourceFile[] {
  return PARTS.flatMap((part) => listFiles(join(ROOT, part)))
    .filter((path) => path.endsWith('.ts') && !path.endsWith('.d.ts'))
    .map(readSourceFile);
}

/** Every file below a folder, as absolute paths. */
export function listFiles(folder: string): string[] {
  if (!existsSync(folder)) return [];
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const path = join(folder, entry.name);
    if (!entry.isDirectory()) return [path];
    return ['node_modules', 'dist', 'screenshots'].includes(entry.name) ? [] : listFiles(path);
  });
}

const IMPORT =
  /(?:^|\n)\s*(import|export)\s+(type\s+)?(?:[^'";]*?\sfrom\s+)?'([^']+)'|import\(\s*'([^']+)'\s*\)/g;

function readSourceFile(absolute: string): SourceFile {
  const path = relative(ROOT, absolute).split('\\').join('/');
  const imports: string[] = [];
  const typeImports: string[] = [];
  const packages: string[] = [];
  for (const [, , type, from, lazily] of readFileSync(absolute, 'utf8').matchAll(IMPORT)) {
    const specifier = from ?? lazily ?? '';
    const target = resolve(path, specifier);
    if (target === undefined) packages.push(specifier);
    else (type ? typeImports : imports).push(target);
  }
  return { path, imports, typeImports, packages };
}

function resolve(from: string, specifier: string): string | undefined {
  if (specifier.startsWith('#')) return SUBPATHS[specifier];
  if (!specifier.startsWith('.')) return undefined;
  const base = posix.join(dirname(from), specifier);
  const candidates = [base, `${base}.ts`, `${base}/index.ts`];
  return candidates.find((each) => existsSync(join(ROOT, each))) ?? base;
}
