import { expect, test } from 'vitest';
import { LineWords } from '../lexer/line-words';
import { readLine } from '../lexer/read-line';
import { Block } from './block';
import { codeName, GROUP, groupTables } from './code-groups';
import { parseBlock, type BlockDialect } from './parse-block';

function parse(text: string, dialect: Partial<BlockDialect> = {}): Block {
  const words = new LineWords();
  words.bytes = new TextEncoder().encode(`${text}\n`);
  readLine(words.bytes, 0, words);
  const block = new Block(words);
  const isStrict = dialect.isStrict ?? false;
  parseBlock(words, block, { ...groupTables(isStrict), isStrict, increment: 0, ...dialect });
  return block;
}

const faultsOf = (block: Block) =>
  block.words.faults.map(({ problem, facts }) => {
    const { reason, what, other, needs, letter } = facts;
    return [problem, reason ?? needs, what ?? letter, other].filter(Boolean).join(' ');
  });

const groupsOf = (block: Block) =>
  Object.entries(GROUP)
    .filter(([, group]) => block.hasGroup(group))
    .map(([name, group]) => {
      const letter = GROUP.stop <= group && group <= GROUP.override ? 'M' : 'G';
      return `${name} ${codeName(letter, block.codes[group]!)}`;
    });

test.each([
  ['G0 X1', ['motion G0']],
  [
    'G17 G20 G40 G49 G54 G64 G80 G90 G94 G98',
    [
      'plane G17',
      'distance G90',
      'feedMode G94',
      'units G20',
      'compensation G40',
      'length G49',
      'cycle G80',
      'return G98',
      'workOffset G54',
      'path G64',
    ],
  ],
  ['G59.1 G61.1 G38.2 Z1', ['motion G38.2', 'workOffset G59.1', 'path G61.1']],
  ['T1 M06', ['change M6']],
  ['M3 M8 M48 M30', ['stop M30', 'spindle M3', 'coolant M8', 'override M48']],
  ['G00.0 M02.0', ['motion G0', 'stop M2']],
  // Several cancels of modes that are never on say nothing.
  ['G15 G50 G69', ['idle G69']],
  ['N10', []],
])('sorts %j into its groups', (text, groups) => {
  const block = parse(text);
  expect(groupsOf(block)).toEqual(groups);
  expect(faultsOf(block)).toEqual([]);
});

test('keeps codes that no table places, in the order written', () => {
  const { others } = parse('G5 M64 G150.1 M3 M131');
  expect(others.map(({ letter, tenths }) => codeName(letter, tenths))).toEqual([
    'G5',
    'M64',
    'G150.1',
    'M131',
  ]);
});

test.each([
  // NISTIR 6556 3.4: one code a modal group.
  ['G0 G1 X1', ['modal-conflict same-group G1 G0']],
  ['M3 M4', ['modal-conflict same-group M4 M3']],
  ['G54 G55', ['modal-conflict same-group G55 G54']],
  ['G90 G91', ['modal-conflict same-group G91 G90']],
  ['G1 G1 X1', ['modal-conflict repeated-code G1 G1']],
  // NISTIR 6556 3.2.5: one word a letter.
  ['G0 X1 X2', ['repeated-word X2']],
  ['N10 N20 G0 X1', ['repeated-word N20']],
  // NISTIR 6556 3.2.2.1: one decimal of a G number, none of an M number.
  ['G1.05 X1', ['out-of-range-word code G1.05']],
  ['M3.5', ['out-of-range-word code M3.5']],
  ['G-1', ['out-of-range-word code G-1']],
  ['N-5 G0 X1', ['out-of-range-word not-negative N-5']],
  ['N1.5 G0 X1', ['out-of-range-word whole N1.5']],
  // Codes that claim the axis words.
  ['G28 G1 X1', ['modal-conflict axis-words G28 G1']],
  ['G92 G0 X1', ['modal-conflict axis-words G92 G0']],
  ['G10 L2 P1 G81 X1', ['modal-conflict axis-words G10 G81']],
])('finds what cannot stand together in %j', (text, faults) => {
  expect(faultsOf(parse(text))).toEqual(faults);
});

// Safety lines as posts write them; common practice, no source.
test.each([
  'G0 G17 G40 G49 G80 G90',
  'G80 G0 Z50.',
  'G1 G80 X1',
  'G91 G28 G0 Z0.',
  'G0 G28 G91 Z0',
  'G0 G30 Z0',
  'G98 G0 G81 X1 Y1 Z-1 R1',
  'M7 M8',
  'M3 M8 M7 M48 M0',
  'N123456 G0 X1',
])('lets %j pass', (text) => {
  expect(faultsOf(parse(text))).toEqual([]);
});

test.each([
  ['G80 G0 X1', ['modal-conflict same-group G0 G80']],
  ['G0 G81 X1', ['modal-conflict same-group G81 G0']],
  ['G28 G0 X1', ['modal-conflict axis-words G28 G0']],
  ['M7 M8', ['modal-conflict same-group M8 M7']],
  ['M3 M6 M8 M48 M0', ['modal-conflict m-words']],
  ['N123456 G0 X1', ['out-of-range-word five-digits N123456']],
  ['G0 N10 X1', ['unreadable-block line-number-first N10']],
])('refuses %j where the controller is strict', (text, faults) => {
  expect(faultsOf(parse(text, { isStrict: true }))).toEqual(faults);
});

test('a strict controller knows only the published codes', () => {
  const { others } = parse('G52 G73 G95 G90.1 M98 M99', { isStrict: true });
  expect(others).toHaveLength(6);
  expect(parse('G52 X1').others).toHaveLength(0);
});

test('counts lengths without a point in least increments, and nothing else', () => {
  const block = parse('N10 T2 X10 Y10. Z0 I5 F200 S9000 H3 P500', { increment: 0.001 });
  const values = Array.from({ length: block.words.count }, (_, word) => block.words.values[word]);
  expect(values).toEqual([10, 2, 0.01, 10, 0, 0.005, 200, 9000, 3, 500]);
  expect(faultsOf(block)).toEqual(['no-decimal-point X10']);
});

test('knows mist and flood apart when both stand in a block', () => {
  const both = parse('M7 M8');
  expect([both.mist, both.flood]).toEqual([true, true]);
  const off = parse('M9');
  expect([off.mist, off.flood]).toEqual([false, false]);
});
