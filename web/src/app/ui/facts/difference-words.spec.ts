import { MACHINE_SECTIONS } from '../../machines/machine-fields';
import { OFFSET_SECTIONS } from '../../machines/offset-fields';
import { wordDifference } from './difference-words';

const MACHINE = MACHINE_SECTIONS.flatMap((section) => section.fields);
const OFFSETS = OFFSET_SECTIONS.flatMap((section) => section.fields);

describe('a difference in words', () => {
  it('names the place by its labels and gives both figures in the person’s unit', () => {
    expect(wordDifference({ path: ['travel', 'x', 1], was: 1300, is: 1310 }, MACHINE, 'mm')).toBe(
      'Limits of each axis, X, left to right, to: 1300 mm, now 1310 mm',
    );
    expect(
      wordDifference({ path: ['spoilboard', 'top'], was: -203.2, is: -200.66 }, MACHINE, 'inch'),
    ).toBe('Spoilboard, Height of its top: −8 in, now −7.9 in');
  });
  it('words choices, lists, boxes and maps', () => {
    const words = (path: (string | number)[], was: unknown, is: unknown) =>
      wordDifference({ path, was, is }, MACHINE, 'mm');
    expect(words(['zones', 0, 'forbids'], 'everything', 'tip')).toBe(
      'Zones to keep out of, zone 1, Keeps out: everything, now the tool’s tip',
    );
    expect(words(['zones'], [], [{}])).toBe('Zones to keep out of: 0 entries, now 1 entry');
    expect(words(['bodies', 1, 'box', 'max', 'x'], 60, 70)).toBe(
      'Moving bodies, body 2, Box, X to: 60 mm, now 70 mm',
    );
    expect(wordDifference({ path: ['work', 'G54', 'x'], was: 30, is: 31 }, OFFSETS, 'mm')).toBe(
      'Offsets, G54, X: 30 mm, now 31 mm',
    );
  });
  it('keeps the path where no field is known', () => {
    expect(wordDifference({ path: ['new', 'thing'], was: undefined, is: 1 }, MACHINE, 'mm')).toBe(
      'new, thing: 1',
    );
  });
});
