import { describe, expect, test } from 'vitest';
import { eventsOf } from '../testing/events-of';

const setup = (more: { controller?: object; machine?: object; loading?: object } = {}) => ({
  machine: {
    travel: { x: [-9000, 9000], y: [-9000, 9000], z: [-9000, 9000] },
    start: { x: 0, y: 0, z: 0 },
    references: { g28: { x: 1, y: 2, z: 3 } },
    ...more.machine,
  },
  offsets: {
    work: { G54: { x: 10, y: 0, z: 0 }, G55: { x: 100, y: 0, z: 0 } },
    length: { '1': 50 },
  },
  controller: { switches: { startMotion: 'rapid' }, ...more.controller },
  ...(more.loading ? { loading: more.loading } : {}),
});

/** The machine X that each motion ends at, or the problem told. */
const run = (program: string, more = {}): string[] =>
  eventsOf(program, setup(more))
    .filter((text) => !text.endsWith('missing-end'))
    .map((text) => /→ X(\S+)/.exec(text)?.[1] ?? text);

describe('parameters of the published language (facts sheet 4.3)', () => {
  test.each([
    // Origins: read as they are, set for the next selection (4.4).
    ['G53 X#5221', ['10']],
    ['G53 X#5241', ['100']],
    ['#5241=50\nG55 X0', ['50']],
    ['#5221=50\nX0\nG54 X1\nG55 X0\nG54 X0', ['10', '11', '100', '50']],
    ['#5221=50\nG53 X#5221', ['50']],
    ['#5221=50\nG10 L2 P1 X7\nG55\nG54 X0', ['7']],
    // The number of the active system.
    ['G55\nG53 X#5220', ['2']],
    ['#5220=2', ['1 1-8 not-modelled system-parameter']],
    // Stored points.
    ['G53 X#5161', ['1']],
    ['#5161=5\nG28', ['5']],
    // G92: kept by G92.2, cleared by G92.1 (4.7), brought back by G92.3.
    ['X4\nG92 X7\nG53 X#5211', ['14', '-3']],
    ['X4\nG92 X7\nG92.2\nG53 X#5211', ['14', '-3']],
    ['X4\nG92 X7\nG92.1\nG53 X#5211', ['14', '0']],
    ['#5211=20\nG92.3\nX0', ['30']],
    // A work offset that nobody entered is not known.
    ['G53 X#5261', ['1 5-11 not-modelled depends']],
  ])('%j', (program, ends) => {
    expect(run(program)).toEqual(ends);
  });

  test('stored lengths are in the unit of the setup, whatever is in force (4.12)', () => {
    const controller = { defaults: { units: 'inch' }, switches: { startMotion: 'rapid' } };
    expect(
      run('G21 G53 X#5161', {
        controller,
        machine: { references: { g28: { x: 25.4, y: 0, z: 0 } } },
      }),
    ).toEqual(['1']);
  });

  test('a stated value wins over references and work offsets', () => {
    const controller = {
      parameters: { '#5221': 70, '#5161': 8 },
      switches: { startMotion: 'rapid' },
    };
    expect(run('X0\nG28', { controller })).toEqual(['70', '8']);
  });
});

describe('parameters that the setup declares', () => {
  const controller = {
    language: 'custom-macro',
    currentTool: '#500',
    selectedTool: '#501',
    currentPocket: '#502',
    pocketContents: { '3': '#503' },
    inputs: [{ parameter: '#1005', means: 'spindle-still', when: 1 }],
    switches: { startMotion: 'rapid' },
  };

  test.each([
    ['T2 M6\nT3\nG53 X#500\nG53 X#501\nG53 X#502\nG53 X#503', ['2', '3', '2', '3']],
    // Setting it tells the controller what it holds.
    ['#500=4\nG53 X#500', ['4']],
    ['#501=5\nG53 X#501', ['5']],
    // Nothing is known of an input but the two ways it may read.
    ['G53 X#1005', ['0', '1']],
    ['#1005=1', ['1 1-8 not-modelled system-parameter']],
  ])('%j', (program, ends) => {
    expect(run(program, { controller })).toEqual(ends);
  });

  test('a spindle whose tool is not known may hold any', () => {
    const loading = { pockets: [{ pocket: 1, tool: 1 }], inSpindle: 'unknown' };
    expect(run('G53 X#500', { controller, loading })).toEqual(['0', '8']);
  });
});
