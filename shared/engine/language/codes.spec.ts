import { expect, test } from 'vitest';
import { codeName } from '../blocks/code-groups';
import { runProgram } from '../testing/check-rule';
import { readFileSync } from 'node:fs';
import type { Code } from './code';
import { CODES } from './codes';
import { languageReference } from './reference';
import { STATEMENTS, WORDS } from './words';

/** Whether the check says of a program that it does not follow something in it. */
const isNamed = (program: string, language: Code['only'] = 'rs274ngc'): boolean =>
  runProgram(program.includes('M30') ? program : `${program}\nM30\n`, {
    controller: { language },
  }).findings.some(({ rule }) => rule === 'not-modelled');

/** Every code a program can write: G0 to G99.9, M0 to M199. */
const ALL = [
  ...Array.from({ length: 1000 }, (_, tenths) => codeName('G', tenths)),
  ...Array.from({ length: 200 }, (_, number) => `M${number}`),
];

test('what the table does not list is named where it stands, and nothing that it lists is', () => {
  const listed = new Map(CODES.map((entry) => [entry.code, entry]));
  const wrong = ALL.filter((code) => {
    const entry = listed.get(code);
    const isFollowed = entry !== undefined && entry.modelled !== 'named';
    return isNamed(entry?.example ?? code) === isFollowed;
  });
  expect(wrong).toEqual([]);
});

test('every entry is a code that a program can write, once', () => {
  const codes = CODES.map(({ code }) => code);
  expect(new Set(codes).size).toBe(codes.length);
  expect(codes.filter((code) => !ALL.includes(code))).toEqual([]);
});

test.each([...WORDS, ...STATEMENTS].filter(({ example }) => example !== undefined))(
  '$code is followed, or named, as the table says',
  ({ example, modelled, only }) => {
    expect(isNamed(example!, only)).toBe(modelled === 'named');
  },
);

test('every letter has its row', () => {
  const letters = [...'ABCDEFHIJKLNPQRSTUVWXYZ'];
  expect(WORDS.map(({ code }) => code)).toEqual(letters);
});

test('the reference is as its tables are now', () => {
  const written = readFileSync(new URL('README.md', import.meta.url), 'utf8');
  expect(written).toBe(languageReference());
});
