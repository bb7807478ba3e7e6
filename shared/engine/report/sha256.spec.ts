import { createHash } from 'node:crypto';
import { expect, test } from 'vitest';
import { openSha256, sha256Hex } from './sha256';

const byNode = (content: Uint8Array | string) => createHash('sha256').update(content).digest('hex');

test('agrees with the examples of FIPS 180-4', () => {
  // Secure Hash Standard examples, SHA256.pdf: one-block and two-block messages.
  expect(sha256Hex('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
  expect(sha256Hex('abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq')).toBe(
    '248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1',
  );
  expect(sha256Hex('')).toBe('e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855');
});

test('agrees with the runtime at every length around a block', () => {
  for (let length = 0; length <= 200; length += 1) {
    const bytes = Uint8Array.from({ length }, (_, index) => (index * 37 + length) & 255);
    expect(sha256Hex(bytes)).toBe(byNode(bytes));
  }
});

test('does not care how the bytes are cut into chunks', () => {
  const bytes = Uint8Array.from({ length: 1000 }, (_, index) => (index * 91) & 255);
  for (const size of [1, 7, 63, 64, 65, 128, 999]) {
    const digest = openSha256();
    for (let at = 0; at < bytes.length; at += size) digest.push(bytes.subarray(at, at + size));
    expect(digest.hex()).toBe(byNode(bytes));
  }
});

test('writes text as UTF-8', () => {
  for (const text of ['Ø 6 мм', '½″ – 🪵', 'a\u0000b']) expect(sha256Hex(text)).toBe(byNode(text));
});
