import { execFileSync } from 'node:child_process';
import { readdirSync, readFileSync } from 'node:fs';
import { join, relative } from 'node:path';
import { describe, expect, test } from 'vitest';
import { listFiles, readSourceFiles, ROOT } from './source-files';

/** The rooms of the house; beside them only dot-files, the lock file and tool configurations. */
const TOP_LEVEL = [
  'README.md',
  'DEVELOPERS.md',
  'package.json',
  'angular.json',
  'web',
  'api',
  'worker',
  'shared',
  'fixtures',
  'tests',
];
const TOOL_FILES =
  /^(\..+|package-lock\.json|tsconfig.*\.json|vitest\..*config\.ts|vitest\.config\.ts|eslint\.config\.js)$/;
const IGNORED = ['node_modules', 'dist', 'coverage'];

describe('the house', () => {
  test('has exactly the top level it was given', () => {
    const found = readdirSync(ROOT).filter(
      (name) => !TOOL_FILES.test(name) && !IGNORED.includes(name),
    );
    expect(found.sort()).toEqual([...TOP_LEVEL].sort());
  });

  test('names files in kebab case', () => {
    const odd = readSourceFiles()
      .map(({ path }) => path)
      .filter(
        (path) =>
          !/^[a-z0-9-]+(\.(config|routes|spec|worker|harness))*\.ts$/.test(
            path.split('/').at(-1) ?? '',
          ),
      );
    expect(odd).toEqual([]);
  });

  test('includes every spec in one configuration', () => {
    const specs = ['api', 'worker', 'shared', 'fixtures', 'tests', 'web']
      .flatMap((part) => listFiles(join(ROOT, part)))
      .map((path) => relative(ROOT, path))
      .filter((path) => /\.(spec|test)\.ts$/.test(path));
    const orphans = specs.filter(
      (path) => !/^((api|worker|shared|fixtures|tests)\/.*|web\/src\/.*)\.spec\.ts$/.test(path),
    );
    expect(orphans).toEqual([]);
    expect(specs.length).toBeGreaterThan(0);
  });

  test('has no test that is skipped, focused or only promised', () => {
    const marks = /\b(it|test|describe)\.(skip|only|todo)\b|\bx(it|describe)\(/;
    const marked = readSourceFiles()
      .map(({ path }) => path)
      .filter((path) => path !== 'tests/architecture/house.spec.ts')
      .filter(
        (path) => path.endsWith('.spec.ts') && marks.test(readFileSync(join(ROOT, path), 'utf8')),
      );
    expect(marked).toEqual([]);
  });

  test('names no registry host in the lock file', () => {
    expect(readFileSync(join(ROOT, 'package-lock.json'), 'utf8')).not.toContain('"resolved"');
  });

  test('pins every package exactly', () => {
    const { dependencies, devDependencies } = JSON.parse(
      readFileSync(join(ROOT, 'package.json'), 'utf8'),
    ) as Record<string, Record<string, string>>;
    const loose = Object.entries({ ...dependencies, ...devDependencies }).filter(
      ([, version]) => !/^\d/.test(version),
    );
    expect(loose).toEqual([]);
  });

  test('the lint rule that holds the layers refuses a trespass', () => {
    const eslint = join(ROOT, 'node_modules', '.bin', 'eslint');
    const lint = (path: string, text: string) => {
      try {
        execFileSync(eslint, ['--stdin', '--stdin-filename', path], {
          cwd: ROOT,
          input: text,
          encoding: 'utf8',
        });
        return '';
      } catch (error) {
        // ESLint ends with 1 when it has something to say; what it says is on its standard output.
        return (error as { stdout: string }).stdout;
      }
    };
    expect(lint('api/src/app.ts', "import '../../web/src/main';\n")).toContain('never import web');
    expect(lint('web/src/main.ts', "import '../../api/src/app';\n")).toContain('only by HTTP');
    expect(lint('worker/src/main.ts', "import '../../shared/engine/lexer/lexer';\n")).toContain(
      '#engine',
    );
    expect(lint('shared/engine/index.ts', "import 'node:fs';\n")).toContain('pure');
  });
});
