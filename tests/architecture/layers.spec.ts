import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { readSourceFiles, ROOT, type SourceFile } from './source-files';

const files = readSourceFiles();
const isSpec = (path: string) => path.endsWith('.spec.ts');
const shipped = files.filter(({ path }) => !isSpec(path));

/** Which folders each layer may import; a path matches by its beginning. */
const ENGINE_STAGES: Readonly<Record<string, readonly string[]>> = {
  'shared/engine/geometry/': [],
  'shared/engine/shop/': ['shared/engine/geometry/'],
  'shared/engine/source/': ['shared/engine/shop/', 'shared/engine/geometry/'],
  'shared/engine/lexer/': [
    'shared/engine/source/',
    'shared/engine/shop/',
    'shared/engine/geometry/',
  ],
  'shared/engine/blocks/': [
    'shared/engine/lexer/',
    'shared/engine/source/',
    'shared/engine/shop/',
    'shared/engine/geometry/',
  ],
  'shared/engine/expressions/': ['shared/engine/lexer/'],
  'shared/engine/statements/': ['shared/engine/expressions/', 'shared/engine/lexer/'],
  'shared/engine/flow/': [
    'shared/engine/statements/',
    'shared/engine/expressions/',
    'shared/engine/lexer/',
    'shared/engine/source/',
  ],
  'shared/engine/interpreter/': [
    'shared/engine/flow/',
    'shared/engine/statements/',
    'shared/engine/parameters/',
    'shared/engine/expressions/',
    'shared/engine/blocks/',
    'shared/engine/lexer/',
    'shared/engine/source/',
    'shared/engine/shop/',
    'shared/engine/geometry/',
  ],
};

describe('the layers', () => {
  test('each stage of the engine imports only the stages to its left', () => {
    const trespasses = Object.entries(ENGINE_STAGES).flatMap(([stage, allowed]) =>
      shipped
        .filter(({ path }) => path.startsWith(stage))
        .flatMap(({ path, imports }) =>
          imports
            .filter((target) => ![stage, ...allowed].some((each) => target.startsWith(each)))
            .map((target) => `${path} imports ${target}`),
        ),
    );
    expect(trespasses).toEqual([]);
  });

  test('no rule imports another rule', () => {
    const rules = new Set(shipped.filter(isRule).map(({ path }) => path));
    const trespasses = shipped
      .filter(isRule)
      .flatMap(({ path, imports }) =>
        imports.filter((target) => rules.has(target)).map((target) => `${path} imports ${target}`),
      );
    expect(trespasses).toEqual([]);
  });

  test('the engine has no dependency and reaches nothing outside itself', () => {
    const outside = shipped
      .filter(({ path }) => path.startsWith('shared/engine/'))
      .filter(({ path }) => !/\/(testing|bench)\/|write-reference/.test(path))
      .flatMap(({ path, imports, packages }) =>
        [...imports.filter((target) => !target.startsWith('shared/engine/')), ...packages].map(
          (target) => `${path} imports ${target}`,
        ),
      );
    expect(outside).toEqual([]);
  });

  test('api, worker and web reach the engine and the contracts only through their index', () => {
    const inside = /^shared\/(engine|contracts)\/(?!index\.ts$)/;
    const trespasses = shipped
      .filter(({ path }) => /^(api|worker|web)\//.test(path))
      .flatMap(({ path, imports, typeImports }) =>
        [...imports, ...typeImports]
          .filter((target) => inside.test(target))
          .map((target) => `${path} imports ${target}`),
      );
    expect(trespasses).toEqual([]);
  });

  test('api and worker never import web, web never imports api or worker, api never imports worker', () => {
    const forbidden: readonly [RegExp, RegExp][] = [
      [/^(api|worker)\//, /^web\//],
      [/^web\//, /^(api|worker)\//],
      [/^api\//, /^worker\//],
      [/^worker\//, /^api\/(?!src\/db\/)/],
    ];
    const trespasses = shipped.flatMap(({ path, imports, typeImports }) =>
      [...imports, ...typeImports]
        .filter((target) => forbidden.some(([from, to]) => from.test(path) && to.test(target)))
        .map((target) => `${path} imports ${target}`),
    );
    expect(trespasses).toEqual([]);
  });

  test('no import goes in a circle', () => {
    expect(findCircles(shipped)).toEqual([]);
  });

  test('process.env is read by the configuration files alone', () => {
    const readers = shipped
      .filter(({ path }) => /^(api|worker)\/src\//.test(path) && !path.endsWith('/config.ts'))
      .filter(({ path }) => !path.includes('/testing/'))
      .map(({ path }) => path)
      .filter((path) => readFileSync(join(ROOT, path), 'utf8').includes('process.env'));
    expect(readers).toEqual([]);
  });
});

function isRule({ path }: SourceFile): boolean {
  const text = path.startsWith('shared/engine/rules/')
    ? readFileSync(join(ROOT, path), 'utf8')
    : '';
  return /\bdefineRule\(/.test(text) && !path.endsWith('/rule.ts');
}

/** Depth first; each circle once, by the file at which it closes. */
function findCircles(sources: readonly SourceFile[]): string[] {
  const byPath = new Map(sources.map((each) => [each.path, each]));
  const done = new Set<string>();
  const circles: string[] = [];
  const visit = (path: string, trail: readonly string[]): void => {
    const seen = trail.indexOf(path);
    if (seen >= 0) {
      circles.push([...trail.slice(seen), path].join(' -> '));
      return;
    }
    if (done.has(path)) return;
    for (const target of byPath.get(path)?.imports ?? []) visit(target, [...trail, path]);
    done.add(path);
  };
  for (const { path } of sources) visit(path, []);
  return circles;
}
