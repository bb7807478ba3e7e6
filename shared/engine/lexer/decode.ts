/** Bytes of the well-formed UTF-8 character at `at`, or 1 for a byte that begins none. */
export function characterLength(bytes: Uint8Array, at: number, end: number): number {
  const lead = bytes[at]!;
  if (lead < 0xc2 || lead > 0xf4) return 1;
  const length = lead < 0xe0 ? 2 : lead < 0xf0 ? 3 : 4;
  if (at + length > end) return 1;
  const second = bytes[at + 1]!;
  // Over-long forms, surrogates and points past U+10FFFF are not well-formed (Unicode table 3-7).
  const low = lead === 0xe0 ? 0xa0 : lead === 0xf0 ? 0x90 : 0x80;
  const high = lead === 0xed ? 0x9f : lead === 0xf4 ? 0x8f : 0xbf;
  if (second < low || high < second) return 1;
  for (let i = 2; i < length; i++) if ((bytes[at + i]! & 0xc0) !== 0x80) return 1;
  return length;
}

const LEAD_BITS = [0, 0x7f, 0x1f, 0x0f, 0x07] as const;

/** UTF-8 as text; a byte that belongs to no character becomes U+FFFD. */
export function decodeUtf8(bytes: Uint8Array, from: number, end: number): string {
  let text = '';
  for (let at = from; at < end;) {
    const length = characterLength(bytes, at, end);
    let point = bytes[at]! & LEAD_BITS[length as 1 | 2 | 3 | 4];
    if (length === 1 && bytes[at]! >= 0x80) point = 0xfffd;
    for (let i = 1; i < length; i++) point = (point << 6) | (bytes[at + i]! & 0x3f);
    text += String.fromCodePoint(point);
    at += length;
  }
  return text;
}
