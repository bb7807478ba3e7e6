import { describe, expect, test } from 'vitest';
import { startCheck, type Place } from '../index';
import { eventsOf } from '../testing/events-of';
import { testSetup } from '../testing/test-shop';

const told = (program: string, change = {}) => eventsOf(program, change, ['programEnd', 'block']);

describe('how a program begins and ends', () => {
  test.each([
    ['G21\nM30\n', ['1 block', '2 end M30', '2 block']],
    ['G21\nM2\n%\n', ['1 block', '2 end M2', '2 block']],
    ['%\nG21\nM30\n%\n', ['2 block', '3 end M30', '3 block']],
    // Header comments before the opening sign, text behind it.
    ['(HEAD)\n% start\nO1 (X)\nG21\nM30\n%', ['3 block', '4 block', '5 end M30', '5 block']],
    ['G21\nM99', ['1 block', '2 end M99', '2 block']],
    // Nothing after the end is carried out; blocks there are told once.
    ['M30\nG0 X1\nG0 X2', ['1 end M30', '1 block', '2 1-6 text-after-end']],
    ['M30\n(NOTE)\n\n%', ['1 end M30', '1 block']],
    ['%\nG21\n%\nG0 X1', ['2 block', '3 end %', '4 1-6 text-after-end', '4 missing-end']],
    // What was called from above may stand after the end.
    [
      'M98 P5\nM30\nO5\nG0 X1\nM99',
      ['1 block', '3 block', '4 block', '5 block', '2 end M30', '2 block'],
    ],
    // A subprogram that nothing calls never runs.
    ['M30\nO5\nG0 X1\nM99', ['1 end M30', '1 block', '2 text-after-end']],
    ['G21\n\n(LAST)\n', ['1 block', '3 missing-end', '3 end end-of-text']],
    ['%\nG21', ['2 block', '2 cut-short percent', '2 missing-end', '2 end end-of-text']],
    [
      'G21\nG0 X',
      ['1 block', '2 4-5 cut-short last-block', '2 block', '2 missing-end', '2 end end-of-text'],
    ],
    [
      'G21\nG0 X\n',
      [
        '1 block',
        '2 4-5 unreadable-block no-number',
        '2 block',
        '2 missing-end',
        '2 end end-of-text',
      ],
    ],
    // No words at all.
    ['', ['1 empty-program', '1 end end-of-text']],
    ['\n\n(NOTHING)\n\n', ['3 empty-program', '3 end end-of-text']],
    ['%\nO1000\n%', ['2 block', '3 end %', '3 empty-program']],
  ])('%j', (program, events) => {
    expect(told(program)).toEqual(events);
  });

  test('an unreadable line is told and left out, and the walk goes on', () => {
    expect(eventsOf('G0 X1 Y\nG0 X2\nM30')).toEqual([
      '1 7-8 unreadable-block no-number',
      '2 rapid X0 Y0 Z0 → X32 Y0 Z0',
    ]);
  });

  test('a line longer than the controller takes is told, comments counted', () => {
    const long = { controller: { longestBlock: 10 } };
    expect(told('G0 X1 (ABC)\nM30', long)).toContain('1 long-block');
    expect(told('G0 X1 (AB)\nM30', long)).not.toContain('1 long-block');
  });
});

describe('block delete', () => {
  const program = 'G21\n/G0 X1\nN5 /G0 X2\nM30';

  test('a check asks for the text again, and skips on its second reading', () => {
    const check = startCheck(testSetup());
    const bytes = new TextEncoder().encode(program);
    check.push(bytes);
    expect(check.endOfText()).toBe('read-again');
    expect(check.linesRead).toBe(0);
    check.push(bytes);
    expect(check.endOfText()).toBe('done');
    expect(check.report({ name: 'x' }).program.lines).toBe(4);
  });

  test('a program without one is read once', () => {
    const check = startCheck(testSetup());
    check.push(new TextEncoder().encode('G21\nM30'));
    expect(check.endOfText()).toBe('done');
  });
});

describe('places', () => {
  function placesOf(program: string, letters: string): (Place | undefined)[] {
    const places: (Place | undefined)[] = [];
    const check = startCheck(testSetup(), {
      observe: () => [{ block: (state) => places.push(state.place({ letters })) }],
    });
    check.push(new TextEncoder().encode(program));
    check.endOfText();
    return places;
  }

  test.each([
    ['G0 X10 Y20', 'X', [4, 7]],
    ['G0 X10 Y20', 'XY', [4, 11]],
    ['G0 X10 Y20 ', 'block', [1, 11]],
    // No such word: the whole block.
    ['G0 X10 Y20', 'F', [1, 11]],
    // Columns count UTF-16 units, a tab one; a byte-order mark has none.
    ['(ø) X1', 'X', [5, 7]],
    ['(😀) X1', 'X', [6, 8]],
    ['\tX1', 'X', [2, 4]],
    ['\ufeffX1', 'X', [1, 3]],
  ])('in %j the words %s stand at %j', (program, letters, columns) => {
    expect(placesOf(program, letters)).toEqual([{ line: 1, columns }]);
  });

  test('nothing to underline is said by leaving the columns out', () => {
    expect(placesOf('G0 X1', 'none')).toEqual([{ line: 1 }]);
  });

  test('the place that set a state outlives its line', () => {
    const seen: unknown[] = [];
    const check = startCheck(testSetup(), {
      observe: () => [
        {
          programEnd: (_event, state) => {
            for (const what of ['distance', 'feed', 'units', 'motionMode', 'plane'] as const)
              seen.push([what, state.setAt(what)]);
          },
        },
      ],
    });
    const text = '(ø) G91\nG1 X1 F600\nG91 X1 F600\nG1 X1\nM30';
    check.push(new TextEncoder().encode(text));
    check.endOfText();
    expect(seen).toEqual([
      ['distance', { line: 1, columns: [5, 8] }],
      ['feed', { line: 2, columns: [7, 11] }],
      ['units', undefined],
      ['motionMode', { line: 2, columns: [1, 3] }],
      ['plane', undefined],
    ]);
  });
});

test('comments come decoded, messages without their mark', () => {
  const comments = eventsOf('(6 mm ø) G0 X1\n(msg, LOAD) ; end\nM30', {}, ['comment']);
  expect(comments).toEqual(['1 comment 6 mm ø', '2 message  LOAD', '2 comment  end']);
});
