import { expect, test } from 'vitest';
import { readToolComment } from './tool-comment';

/** [comment, tool, diameter, unit, kind, tapered] */
type Row = readonly [
  string,
  number | undefined,
  number | undefined,
  'mm' | 'inch' | undefined,
  string | undefined,
  boolean,
];

test.each<Row>([
  // The tool list posts write in the head of a program.
  ['T3  D=3.175 CR=0. - ZMIN=-6. - FLAT END MILL', 3, 3.175, undefined, 'end', false],
  ['T6 D=0.25 CR=0. TAPER=118DEG - ZMIN=-0.03 - DRILL', 6, 0.25, undefined, 'drill', false],
  ['T8 D=6.35 CR=3.175 - ZMIN=-5 - ball end mill', 8, 6.35, undefined, 'ball', false],
  ['T1 D=2. CR=0. - ZMIN=-0.02 - face mill', 1, 2, undefined, 'face', false],
  [
    'T2 D=0.842 CR=0. TAPER=45DEG - ZMIN=-0.07 - CHAMFER MILL',
    2,
    0.842,
    undefined,
    undefined,
    true,
  ],
  ['T4 D=12. TAPER=30deg - ZMIN=-3 - engraver', 4, 12, undefined, 'v', true],
  [
    'T2 D=0.1875 CR=0. TAPER=118deg - ZMIN=-0.2 - center drill',
    2,
    0.1875,
    undefined,
    undefined,
    false,
  ],
  ['T5 D=6 - right hand tap', 5, 6, undefined, undefined, false],
  // What people write.
  ['T7 - 6mm upcut spiral: square pocket', 7, 6, 'mm', 'end', false],
  ['TOOL 1: 1/4" END MILL', 1, 0.25, 'inch', 'end', false],
  ['Tool No. 12 - 12.7 mm compression', 12, 12.7, 'mm', 'end', false],
  ['T1 1-1/2 in surfacing', 1, 1.5, 'inch', 'face', false],
  ['T3 - 3mm V-bit: grooves', 3, 3, 'mm', 'v', true],
  ['T02 DIA 6,35 MM SLOT DRILL', 2, 6.35, 'mm', 'end', false],
  ['TOOL - 1 DIA. OFF. - 1 LEN. - 1 DIA. - .25', 1, 0.25, undefined, undefined, false],
  ['6mm endmill', undefined, 6, 'mm', 'end', false],
])('reads %j', (comment, tool, diameter, unit, kind, isTapered) => {
  expect(readToolComment(comment)).toEqual({ tool, diameter, unit, kind, isTapered });
});

test.each([
  'DRILL ALL HOLES',
  'CHANGE TOOL',
  '2D POCKET1',
  'MILLING TIME = HH:MM',
  'STOCK: ~600mm x 120mm, ~20mm thick',
  '10mm deep pocket',
  '6MM SHANK',
  'Tools table:',
  '18 mm birch plywood',
])('takes nothing from %j', (comment) => {
  expect(readToolComment(comment)).toBeUndefined();
});

test.each([
  // A change commented out, offset numbers, and lengths that are not diameters.
  'T1 M6',
  'T1 D=1 H=1',
  'T1 6MM SHANK V-BIT',
  'T4 18mm deep',
  'T5 2X 90',
])('takes a number but no size from %j', (comment) => {
  expect(readToolComment(comment)?.diameter).toBeUndefined();
});
