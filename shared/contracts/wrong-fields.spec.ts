import { expect, test } from 'vitest';
import type { z } from 'zod';
import {
  loadingChangeSchema,
  machineSchema,
  newToolSchema,
  offsetChangeSchema,
  setupImportSchema,
  signInSchema,
  wrongFields,
} from './index';

function wrong(schema: z.ZodType, input: unknown) {
  const read = schema.safeParse(input);
  return read.success ? [] : wrongFields(read.error.issues, input);
}
const at = (fields: ReturnType<typeof wrong>, path: string) =>
  fields.find((field) => field.path === path);

test('says what is missing, what was expected and gives an example', () => {
  const fields = wrong(newToolSchema, { tool: { number: 4, holder: {} } });
  expect(at(fields, 'tool.gaugeLength')).toEqual({
    path: 'tool.gaugeLength',
    message: 'gaugeLength is missing: give a number, such as 78.2.',
    expected: 'a number',
    example: 78.2,
  });
  expect(at(fields, 'tool.turns')?.expected).toBe('one of "cw", "ccw", "never"');
});

test('shows the value that stands there and the bound it breaks', () => {
  const fields = wrong(newToolSchema, { tool: { number: 0, diameter: 'six', maxRpm: -1 } });
  expect(at(fields, 'tool.number')?.message).toBe(
    'number is 0: give a number of more than 0, such as 4.',
  );
  expect(at(fields, 'tool.diameter')?.message).toBe('diameter is "six": give a number, such as 6.');
});

test('names every unknown key, for a misspelt one is the usual reason', () => {
  const fields = wrong(signInSchema, { email: 'a@b.example', pasword: 'x' });
  expect(at(fields, 'pasword')?.message).toBe(
    '"pasword" is not known here: check its spelling or leave it out.',
  );
  expect(at(fields, 'password')?.message).toBe('password is missing: give text.');
});

test('lists the ways a value may be given', () => {
  const loading = { pockets: [], inSpindle: 'nothing' };
  const fields = wrong(loadingChangeSchema, { basedOn: 1, loading });
  expect(at(fields, 'loading.inSpindle')?.expected).toBe('a number or null or "unknown"');
});

test('points into lists by their index', () => {
  const loading = {
    pockets: [
      { pocket: 1, tool: 1 },
      { pocket: 'two', tool: 2 },
    ],
    inSpindle: null,
  };
  const fields = wrong(loadingChangeSchema, { basedOn: 1, loading });
  expect(fields.map((field) => field.path)).toEqual(['loading.pockets[1].pocket']);
});

test('passes on what the contract itself says', () => {
  const fields = wrong(machineSchema, { travel: { x: [10, 0] } });
  expect(at(fields, 'travel.x')?.message).toBe('The first number must not exceed the second.');
  const offsets = wrong(offsetChangeSchema, { basedOn: 1, work: { G50: { x: 1 } } });
  expect(at(offsets, 'work.G50')?.message).toBe(
    '"G50" is no name here: a work offset is written G54 … G59.3.',
  );
});

test('never shows a password', () => {
  const fields = wrong(signInSchema, { email: 'a@b.example', password: ['secret'] });
  expect(JSON.stringify(fields)).not.toContain('secret');
});

test('gives one entry a path and stops at a hundred', () => {
  const tools = Array.from({ length: 300 }, () => ({}));
  const fields = wrong(setupImportSchema, { setup: { tools } });
  expect(fields).toHaveLength(100);
  expect(new Set(fields.map((field) => field.path)).size).toBe(100);
});
