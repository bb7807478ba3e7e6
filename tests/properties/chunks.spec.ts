import fc from 'fast-check';
import { expect, test } from 'vitest';
import { startCheck, type Report } from '#engine';
import { COUNTS, SEED } from '../counts';
import { programs, spell } from './programs';
import { openMachine } from './trace-of';

const setup = openMachine();
const runs = { numRuns: COUNTS.properties, seed: SEED };

function reportOf(bytes: Uint8Array, cuts: readonly number[]): Report {
  const check = startCheck(setup);
  const pushAll = () => {
    let from = 0;
    for (const cut of cuts) {
      const to = Math.min(bytes.length, from + cut);
      check.push(bytes.subarray(from, to));
      from = to;
    }
    check.push(bytes.subarray(from));
  };
  do pushAll();
  while (check.endOfText() === 'read-again');
  return check.report({ name: 'chunks.nc' });
}

/** What a posted program may hold beside its blocks. */
const debris = fc.constantFrom(
  '',
  '%',
  '/T3 M6',
  '/ G0 Z50.',
  '(COMMENT (NESTED)',
  'N10 G1 X1.2.3',
  '; ä ø ✓ 😀',
  'G0 X−5',
  'MO6',
  '\u00a0G0 X1',
  'O1000 (NAME)',
  'G41 D2',
  'G40',
);
const ends = fc.constantFrom('\n', '\r\n', '\r', '\n\n', '\r\r\n');
const texts = fc
  .tuple(
    programs,
    fc.array(debris, { maxLength: 4 }),
    fc.array(ends, { minLength: 1, maxLength: 5 }),
    fc.boolean(),
  )
  .map(([steps, extra, lineEnds, hasMark]) => {
    const lines = spell(steps, { units: 'mm', distance: 'absolute' });
    extra.forEach((text, index) => lines.splice((index * 7) % lines.length, 0, text));
    const text = lines.map((line, index) => line + lineEnds[index % lineEnds.length]!).join('');
    return new TextEncoder().encode((hasMark ? '\ufeff' : '') + text);
  });

test('splitting the text into chunks changes nothing of the report', () => {
  fc.assert(
    fc.property(
      texts,
      fc.array(fc.integer({ min: 0, max: 40 }), { maxLength: 120 }),
      (bytes, cuts) => {
        expect(reportOf(bytes, cuts)).toEqual(reportOf(bytes, []));
      },
    ),
    runs,
  );
});

test('one byte at a time is the same too', () => {
  fc.assert(
    fc.property(texts, (bytes) => {
      expect(
        reportOf(
          bytes,
          Array.from(bytes, () => 1),
        ),
      ).toEqual(reportOf(bytes, []));
    }),
    { ...runs, numRuns: Math.ceil(COUNTS.properties / 5) },
  );
});

/** Line ends as an editor counts them: written anew here, with nothing of the engine's. */
function linesAsAnEditorCounts(text: string): number {
  const lines = text.split(/\r\n|\n|\r/);
  return lines.at(-1) === '' ? lines.length - 1 : lines.length;
}

test('counts lines as an editor does, whatever ends them', () => {
  const pieces = fc.array(fc.constantFrom('G0 X1', '', ' ', '\n', '\r', '\r\n', '(x)', 'M30'), {
    maxLength: 60,
  });
  fc.assert(
    fc.property(
      pieces,
      fc.array(fc.integer({ min: 1, max: 9 }), { maxLength: 40 }),
      (parts, cuts) => {
        const text = parts.join('');
        const report = reportOf(new TextEncoder().encode(text), cuts);
        expect(report.program.lines).toBe(linesAsAnEditorCounts(text));
      },
    ),
    runs,
  );
});
