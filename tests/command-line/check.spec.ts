import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { reportSchema } from '#contracts';
import { checkStory } from '../golden/stories';
import { run, story } from './run';

const NORTH = 'fixtures/machines/north-router.json';

describe('check', () => {
  let folder: string;
  const file = (name: string, content: string | Uint8Array) => {
    const path = join(folder, name);
    writeFileSync(path, content);
    return path;
  };
  beforeAll(() => {
    folder = mkdtempSync(join(tmpdir(), 'nightlatch-cli-'));
  });
  afterAll(() => rmSync(folder, { recursive: true }));

  test('ends with 0 and says so when the program is clear', () => {
    const { code, out, err } = run('check', ...story('cabinet-door'));
    expect({ code, err }).toEqual({ code: 0, err: '' });
    expect(out).toContain('Clear.');
    expect(out).toContain('emergency stop in reach');
  });

  test('ends with 2 and names the line when the program must not run', () => {
    const { code, out } = run('check', ...story('long-worktop'));
    expect(code).toBe(2);
    expect(out).toMatch(/^STOP {2}16:1 .*past the right-hand travel/m);
  });

  test('ends with 1 when a person must look', () => {
    const unitless = file(
      'unitless.nc',
      'G90 G94 G17 G40 G49 G80 G54\nG53 G0 Z-10\nG0 X10 Y10\nM30\n',
    );
    const { code, out } = run('check', '--setup', NORTH, unitless);
    expect(out).toContain('HOLD');
    expect(code).toBe(1);
  });

  test('prints with --json exactly the report the engine makes, one object a line', () => {
    const { out } = run('check', '--json', ...story('sign-panel'));
    const lines = out.trimEnd().split('\n');
    expect(lines.length).toBe(1);
    const report: unknown = JSON.parse(lines[0] ?? '');
    expect(reportSchema.safeParse(report).error).toBeUndefined();
    expect(report).toEqual(JSON.parse(JSON.stringify(checkStory('sign-panel'))));
  });

  test('takes the highest exit code of several programs', () => {
    const [flag = '', setup = '', bad = ''] = story('long-worktop');
    const { code, out } = run(
      'check',
      '--json',
      flag,
      setup,
      'fixtures/programs/cabinet-door/program.nc',
      bad,
    );
    expect(code).toBe(2);
    expect(out.trimEnd().split('\n').length).toBe(2);
  });

  test('gives a report for an empty file, and for text that is no program', () => {
    const { code, out } = run(
      'check',
      '--json',
      '--setup',
      NORTH,
      file('empty.nc', ''),
      file('letter.txt', 'Dear sir,\n\nplease find\n'),
    );
    expect(code).toBe(2);
    const [empty, letter] = out
      .trimEnd()
      .split('\n')
      .map((line) => reportSchema.parse(JSON.parse(line)));
    expect(empty?.findings.map(({ rule, line }) => ({ rule, line }))).toContainEqual({
      rule: 'empty-program',
      line: 1,
    });
    expect(letter?.verdict).toBe('stopped');
  });

  test('refuses a picture with its reason on standard error and nothing on standard output', () => {
    const png = Uint8Array.of(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13);
    const { code, out, err } = run('check', '--setup', NORTH, file('photo.nc', png));
    expect({ code, out }).toEqual({ code: 3, out: '' });
    expect(err).toContain('is no text but a binary file');
  });

  test('refuses a setup by naming each wrong path, what was expected and an example', () => {
    const broken = file(
      'broken.json',
      JSON.stringify({ format: 'nightlatch-setup', version: 2, rack: [] }),
    );
    const { code, out, err } = run(
      'check',
      '--setup',
      broken,
      'fixtures/programs/cabinet-door/program.nc',
    );
    expect({ code, out }).toEqual({ code: 3, out: '' });
    expect(err).toMatch(/version: version is 2: give 1/);
    expect(err).toMatch(/machine: machine is missing/);
  });

  test.each([
    ['no setup', ['fixtures/programs/cabinet-door/program.nc'], /No setup is given/],
    ['no program', ['--setup', NORTH], /No program is given/],
    ['an unknown option', ['--setup', NORTH, '--fast', 'x.nc'], /Unknown option '--fast'/],
    [
      'a missing program',
      ['--setup', NORTH, 'nothere.nc'],
      /nothere\.nc cannot be read: no such file/,
    ],
    ['a missing setup', ['--setup', 'nothere.json', 'x.nc'], /nothere\.json cannot be read/],
  ] as const)('refuses %s', (_, words, reason) => {
    const { code, out, err } = run('check', ...words);
    expect({ code, out }).toEqual({ code: 3, out: '' });
    expect(err).toMatch(reason);
  });

  test('judges the unattended run when asked', () => {
    const paused = file('paused.nc', 'G21 G90 G94 G17 G40 G49 G80 G54\nG53 G0 Z0\nM0\nM30\n');
    expect(run('check', '--setup', NORTH, paused).code).toBe(0);
    expect(run('check', '--unattended', '--setup', NORTH, paused).code).toBe(2);
  });

  test('reads blocks with a slash as skipped when block delete is on', () => {
    const slashed = file(
      'slashed.nc',
      'G21 G90 G94 G17 G40 G49 G80 G54\n/G53 G0 X5000\nG53 G0 Z0\nM30\n',
    );
    expect(run('check', '--setup', NORTH, slashed).code).toBe(2);
    expect(run('check', '--block-delete', 'on', '--setup', NORTH, slashed).code).toBe(0);
  });
});
