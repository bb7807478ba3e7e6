import { expect, test } from 'vitest';
import { canonicalJson } from './canonical-json';

test('writes the example of RFC 8785, section 3.2.2', () => {
  const value = {
    numbers: [Number('333333333.33333329'), 1e30, 4.5, 2e-3, 0.000000000000000000000000001],
    string: '\u20ac$\u000F\u000aA\'\u0042\u0022\u005c\\\\"/',
    literals: [null, true, false],
  };
  expect(canonicalJson(value)).toBe(
    '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\\\\\"/"}',
  );
});

test('sorts keys by UTF-16 code units, as the example of RFC 8785, section 3.2.3', () => {
  const value = {
    '\u20ac': 'Euro Sign',
    '\r': 'Carriage Return',
    '\ufb33': 'Hebrew Letter Dalet With Dagesh',
    '1': 'One',
    '\ud83d\ude00': 'Emoji: Grinning Face',
    '\u0080': 'Control',
    '\u00f6': 'Latin Small Letter O With Diaeresis',
  };
  const names = [...canonicalJson(value).matchAll(/:"([^"]+)"/g)].map((match) => match[1]);
  expect(names).toEqual([
    'Carriage Return',
    'One',
    'Control',
    'Latin Small Letter O With Diaeresis',
    'Euro Sign',
    'Emoji: Grinning Face',
    'Hebrew Letter Dalet With Dagesh',
  ]);
});

test('writes numbers as RFC 8785, appendix B, lists them', () => {
  const rows: [number, string][] = [
    [0, '0'],
    [-0, '0'],
    [5e-324, '5e-324'],
    [-1.7976931348623157e308, '-1.7976931348623157e+308'],
    [9007199254740992, '9007199254740992'],
    [295147905179352830000, '295147905179352830000'],
    [9.999999999999997e22, '9.999999999999997e+22'],
    [1e23, '1e+23'],
    [0.000001, '0.000001'],
    [333333333.33333325, '333333333.33333325'],
  ];
  for (const [value, text] of rows) expect(canonicalJson(value)).toBe(text);
});

test('refuses numbers JSON does not have, and leaves out keys that are undefined', () => {
  expect(() => canonicalJson({ x: Number.NaN })).toThrow(RangeError);
  expect(() => canonicalJson([Infinity])).toThrow(RangeError);
  expect(canonicalJson({ b: undefined, a: [] })).toBe('{"a":[]}');
});
