/** What a byte may begin outside comments. */
export const ODD = 0;
export const LETTER = 1;
export const BLANK = 2;
export const LINE_END = 3;
export const OPEN_COMMENT = 4;
export const SEMICOLON = 5;
export const SLASH = 6;
export const PERCENT = 7;
export const PARAMETER = 8;
export const STRAY_VALUE = 9;
export const CLOSE_COMMENT = 10;
export const COLON = 11;
/** The letter O: a label, or a slip for a nought, but never an ordinary word. */
export const LETTER_O = 12;

export const CLASS_OF = classes();

function classes(): Uint8Array {
  const table = new Uint8Array(256);
  const set = (text: string, kind: number) => {
    for (const character of text) table[character.charCodeAt(0)] = kind;
  };
  set('ABCDEFGHIJKLMNPQRSTUVWXYZabcdefghijklmnpqrstuvwxyz', LETTER);
  set('Oo', LETTER_O);
  set(' \t', BLANK);
  set('\n\r', LINE_END);
  set('(', OPEN_COMMENT);
  set(';', SEMICOLON);
  set('/', SLASH);
  set('%', PERCENT);
  set('#', PARAMETER);
  set('0123456789.+-[],=', STRAY_VALUE);
  set(')', CLOSE_COMMENT);
  set(':', COLON);
  return table;
}

export const isLetter = (byte: number): boolean =>
  CLASS_OF[byte] === LETTER || CLASS_OF[byte] === LETTER_O;

/** 1 for what, behind a number, makes it another number: more digits, a point, a comma, an exponent. */
export const CONTINUES_NUMBER = Uint8Array.from({ length: 256 }, (_, byte) =>
  '0123456789.,Ee'.includes(String.fromCharCode(byte)) ? 1 : 0,
);

/** Powers of ten that are exact in a double. */
export const POWERS_OF_TEN = Float64Array.from({ length: 23 }, (_, exponent) =>
  Number(`1e${exponent}`),
);
