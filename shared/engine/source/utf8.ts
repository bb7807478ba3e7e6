/** UTF-8 without a host; a lone surrogate becomes the replacement character. */
export function utf8(text: string): Uint8Array {
  const bytes = new Uint8Array(text.length * 3);
  let length = 0;
  for (const character of text) {
    let point = character.codePointAt(0)!;
    if (0xd800 <= point && point <= 0xdfff) point = 0xfffd;
    if (point < 0x80) bytes[length++] = point;
    else if (point < 0x800) {
      bytes[length++] = 0xc0 | (point >> 6);
      bytes[length++] = 0x80 | (point & 63);
    } else if (point < 0x10000) {
      bytes[length++] = 0xe0 | (point >> 12);
      bytes[length++] = 0x80 | ((point >> 6) & 63);
      bytes[length++] = 0x80 | (point & 63);
    } else {
      bytes[length++] = 0xf0 | (point >> 18);
      bytes[length++] = 0x80 | ((point >> 12) & 63);
      bytes[length++] = 0x80 | ((point >> 6) & 63);
      bytes[length++] = 0x80 | (point & 63);
    }
  }
  return bytes.slice(0, length);
}
