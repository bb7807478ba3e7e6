import { expect, test } from 'vitest';
import { sniffText } from './sniff-text';

const bytes = (text: string) => new TextEncoder().encode(text);
const utf16 = (text: string) => Uint8Array.from([...text].flatMap((c) => [c.charCodeAt(0), 0]));

test.each([
  ['an ordinary program', bytes('%\nO0001 (DOOR)\nG21 G90\nG0 X0 Y0\nM30\n%\n')],
  ['line ends of carriage returns alone', bytes('G21\rG90\rM30\r')],
  ['nothing at all', new Uint8Array(0)],
  ['words that are not English', bytes('(plâque ø)\nG0 X0\n')],
  ['a Latin-1 comment', Uint8Array.from([0x28, 0xe9, 0x29, 0x0a])],
  ['the marks of a serial line', bytes('\u0012%\r\nG0 X0\r\n%\u0014\u001a')],
  ['a byte order mark of UTF-8', Uint8Array.from([0xef, 0xbb, 0xbf, 0x47, 0x30])],
  ['a one-letter file', bytes('G')],
])('allows %s', (_what, head) => {
  expect(sniffText(head)).toBeUndefined();
});

// Signatures: PNG (W3C recommendation, section 5.2), PDF (ISO 32000-1, 7.5.2), gzip (RFC 1952, 2.3.1).
test.each([
  [
    'PNG picture',
    Uint8Array.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0]),
    'It is a PNG picture, not program text.',
  ],
  ['PDF document', bytes('%PDF-1.7\n'), 'It is a PDF document, not program text.'],
  ['gzip archive', Uint8Array.from([0x1f, 0x8b, 8, 0]), 'It is a gzip archive, not program text.'],
  [
    'zero byte',
    bytes('G0 X1\u0000\nM30\n'),
    'Byte 6 is zero, so it is a binary file, not program text.',
  ],
  [
    'heap of control characters',
    Uint8Array.from({ length: 100 }, (_, at) => (at % 5 === 0 ? 1 : 65)),
    '20 of its first 100 bytes are control characters, so it is a binary file.',
  ],
])('refuses a %s and says why', (_what, head, reason) => {
  expect(sniffText(head)).toMatchObject({ code: 'not-text', reason });
});

test.each([
  ['with a byte order mark', Uint8Array.from([0xff, 0xfe, 0x47, 0x00])],
  ['without one', utf16('G21 G90\nM30\n')],
])('names UTF-16 %s', (_what, head) => {
  expect(sniffText(head)?.code).toBe('utf-16');
});
