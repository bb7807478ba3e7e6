import { figure, length, point } from './fact-field';
import { wordBox, wordFact } from './fact-words';

const NOW = new Date('2026-12-01T12:00:00Z');

describe('facts as a person reads them', () => {
  it('words figures, pairs and points in the person’s unit', () => {
    expect(wordFact(length('d', 'Diameter'), 6.35, 'inch', NOW)).toBe('0.25 in');
    expect(wordFact(figure('f', 'Feed', 'feed'), 2540, 'inch', NOW)).toBe('100 in/min');
    const travel = { type: 'interval', key: 't', label: 'X', quantity: 'length' } as const;
    expect(wordFact(travel, [-220, 0], 'mm', NOW)).toBe('−220 to 0 mm');
    expect(wordFact(point('p', 'Point'), { x: 25.4, y: 0, z: -25.4 }, 'inch', NOW)).toBe(
      'X 1 in, Y 0 in, Z −1 in',
    );
  });

  it('says an open side of a box as open', () => {
    expect(wordBox({ min: { x: -60, z: 0 }, max: { x: 60 } }, 'mm')).toBe(
      'X −60 to 60 mm, Z above 0 mm',
    );
    expect(wordBox({ min: {}, max: { y: 80 } }, 'mm')).toBe('Y below 80 mm');
    expect(wordBox({ min: {}, max: {} }, 'mm')).toBe('everywhere');
  });

  it('gives a choice by its label and says when nothing is said', () => {
    const field = {
      type: 'choice',
      key: 'c',
      label: 'Dwell',
      choices: [{ value: 'seconds', label: 'seconds' }],
    } as const;
    expect(wordFact(field, 'seconds', 'mm', NOW)).toBe('seconds');
    expect(wordFact(field, undefined, 'mm', NOW)).toBe('not said');
    expect(wordFact({ ...length('d', 'D'), orLetter: true }, 'Q', 'mm', NOW)).toBe(
      'the value of word Q',
    );
  });
});
