import type { BlockWords } from '#contracts';

/** What a word means by itself; what it does also depends on the state at that line. Source: NISTIR 6556. */
const CODES: Readonly<Record<string, string>> = {
  G0: 'rapid',
  G1: 'feed move',
  G2: 'arc, clockwise',
  G3: 'arc, counterclockwise',
  G4: 'dwell',
  G10: 'set data',
  G17: 'XY plane',
  G18: 'ZX plane',
  G19: 'YZ plane',
  G20: 'inches',
  G21: 'millimetres',
  G28: 'go home by way of a point',
  G30: 'go to the second home',
  G40: 'compensation off',
  G41: 'compensation left',
  G42: 'compensation right',
  G43: 'length offset on',
  G49: 'length offset off',
  G53: 'machine coordinates, this block',
  G61: 'exact path',
  G64: 'continuous path',
  G73: 'drill, breaking chips',
  G80: 'cycle off',
  G81: 'drill',
  G82: 'drill with dwell',
  G83: 'drill in pecks',
  G90: 'absolute',
  G91: 'incremental',
  G92: 'shift zero',
  G93: 'inverse time feed',
  G94: 'feed per minute',
  G98: 'back to the level before',
  G99: 'back to R',
  M0: 'stop',
  M1: 'optional stop',
  M2: 'end',
  M3: 'spindle clockwise',
  M4: 'spindle counterclockwise',
  M5: 'spindle off',
  M6: 'tool change',
  M7: 'mist on',
  M8: 'flood on',
  M9: 'coolant off',
  M30: 'end',
};
const LETTERS: Readonly<Record<string, string>> = {
  A: 'angle about X',
  D: 'diameter offset',
  F: 'feed',
  H: 'length offset number',
  I: 'arc centre along X',
  J: 'arc centre along Y',
  K: 'arc centre along Z',
  L: 'repeats',
  P: 'dwell or key',
  Q: 'peck',
  R: 'radius or retract level',
  S: 'spindle speed',
  T: 'tool',
  X: 'along X',
  Y: 'along Y',
  Z: 'along Z',
};

export interface MeantWord {
  readonly word: string;
  readonly meaning: string;
}

export function meanWords({ words }: BlockWords): readonly MeantWord[] {
  return words.map(({ letter, value }) => {
    const word = `${letter}${value}`;
    const offset = letter === 'G' && 54 <= value && value < 60 ? 'work offset' : undefined;
    const isCode = letter === 'G' || letter === 'M';
    const meaning = isCode ? (CODES[word] ?? offset ?? 'see the controller') : LETTERS[letter];
    return { word, meaning: meaning ?? 'see the controller' };
  });
}
