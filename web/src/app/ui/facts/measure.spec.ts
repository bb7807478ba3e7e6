import { readFigure, showFigure, wordBoth, wordFigure } from './measure';

describe('figures as a person types them', () => {
  const rows: [typed: string, units: 'mm' | 'inch', stored: number][] = [
    ['92.4', 'mm', 92.4],
    [' 92,4 ', 'mm', 92.4],
    ['−12.5', 'mm', -12.5],
    ['.5', 'mm', 0.5],
    // 1 in = 25.4 mm exactly; exact inch shanks: trade handbook tables (1/8 3.175, 1/4 6.35, 3/8 9.525).
    ['1', 'inch', 25.4],
    ['0.1', 'inch', 2.54],
    ['1/8', 'inch', 3.175],
    ['1/4', 'inch', 6.35],
    ['3/8', 'inch', 9.525],
    ['1 1/2', 'inch', 38.1],
    ['-1/4', 'inch', -6.35],
    // A 4 ft by 8 ft sheet: 1219.2 by 2438.4 mm.
    ['48', 'inch', 1219.2],
    ['96', 'inch', 2438.4],
    // A unit behind the figure wins over the person's own.
    ['12.7mm', 'inch', 12.7],
    ['0.5 in', 'mm', 12.7],
    ['1/2"', 'mm', 12.7],
  ];
  it.each(rows)('reads %s typed by someone who works in %s as %d mm', (typed, units, stored) => {
    expect(readFigure(typed, 'length', units)).toEqual({ stored });
  });

  it('reads feeds and accelerations by the same factor, and seconds by none', () => {
    expect(readFigure('100', 'feed', 'inch')).toEqual({ stored: 2540 });
    expect(readFigure('10 in/s²', 'acceleration', 'mm')).toEqual({ stored: 254 });
    expect(readFigure('2.5', 'seconds', 'inch')).toEqual({ stored: 2.5 });
  });

  it('reads a life in minutes, or in the unit behind it, as seconds', () => {
    expect(readFigure('90', 'lifetime', 'mm')).toEqual({ stored: 5400 });
    expect(readFigure('1.5 h', 'lifetime', 'inch')).toEqual({ stored: 5400 });
    expect(readFigure('5400s', 'lifetime', 'mm')).toEqual({ stored: 5400 });
    expect(showFigure(5400, 'lifetime', 'mm')).toBe('90');
    expect(wordFigure(5400, 'lifetime', 'mm')).toBe('1 h 30 min');
  });

  it('refuses a comma that could be a decimal mark or a thousands mark', () => {
    expect(readFigure('1,219', 'length', 'mm')).toEqual({
      sentence: '“1,219” could be read two ways. Write 1.219 or 1219.',
    });
  });

  it('refuses what is no number, names it, and tells an empty box from a wrong one', () => {
    expect(readFigure('abc', 'length', 'mm')).toEqual({ sentence: '“abc” is not a number.' });
    expect(readFigure('1/0', 'length', 'inch')).toEqual({ sentence: '“1/0” is not a number.' });
    expect(readFigure('5 kg', 'length', 'mm')).toEqual({
      sentence: '“kg” is no unit for this figure.',
    });
    expect(readFigure('2.5', 'whole', 'mm')).toEqual({
      sentence: 'Only a whole number fits here.',
    });
    expect(readFigure('  ', 'length', 'mm')).toEqual({ empty: true });
  });
});

describe('figures as a person reads them', () => {
  it('shows a length in the unit the person works in', () => {
    expect(showFigure(6.35, 'length', 'mm')).toBe('6.35');
    expect(showFigure(6.35, 'length', 'inch')).toBe('0.25');
    expect(wordFigure(-12.5, 'length', 'mm')).toBe('−12.5 mm');
    expect(wordFigure(24000, 'rpm', 'inch')).toBe('24000 rev/min');
    expect(wordFigure(-0, 'length', 'mm')).toBe('0 mm');
  });

  it('gives both units where a mistake between them would hurt', () => {
    expect(wordBoth(6.35)).toBe('6.35 mm (0.25 in)');
  });

  it('reads back every exact inch shank it showed', () => {
    for (const stored of [3.175, 4.7625, 6.35, 7.9375, 9.525, 12.7, 15.875, 19.05, 25.4]) {
      const shown = showFigure(stored, 'length', 'inch');
      expect(readFigure(shown, 'length', 'inch')).toEqual({ stored });
    }
  });
});
