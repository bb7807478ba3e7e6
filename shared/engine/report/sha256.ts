/**
 * SHA-256 (FIPS 180-4), because the engine has no runtime to ask: the same digest in Node, in a browser
 * worker and in a test, of bytes that arrive in chunks.
 */
export interface Sha256 {
  push(bytes: Uint8Array): void;
  /** Lower-case hex of everything pushed. Nothing may be pushed afterwards. */
  hex(): string;
}

export function sha256Hex(content: Uint8Array | string): string {
  const digest = openSha256();
  digest.push(typeof content === 'string' ? utf8(content) : content);
  return digest.hex();
}

const BLOCK = 64;
const LENGTH_AT = 56;

export function openSha256(): Sha256 {
  const hash = Int32Array.from(START);
  const schedule = new Int32Array(64);
  const pending = new Uint8Array(BLOCK);
  let held = 0;
  let total = 0;

  return {
    push(bytes) {
      total += bytes.length;
      let from = 0;
      if (held > 0) {
        from = Math.min(BLOCK - held, bytes.length);
        pending.set(bytes.subarray(0, from), held);
        held += from;
        if (held < BLOCK) return;
        digestBlock(hash, schedule, pending, 0);
        held = 0;
      }
      for (; from + BLOCK <= bytes.length; from += BLOCK) digestBlock(hash, schedule, bytes, from);
      pending.set(bytes.subarray(from), 0);
      held = bytes.length - from;
    },
    hex() {
      const tail = new Uint8Array(held < LENGTH_AT ? BLOCK : 2 * BLOCK);
      tail.set(pending.subarray(0, held));
      tail[held] = 0x80;
      const bits = new DataView(tail.buffer);
      bits.setUint32(tail.length - 8, Math.floor(total / 0x2000_0000));
      bits.setUint32(tail.length - 4, (total << 3) >>> 0);
      for (let at = 0; at < tail.length; at += BLOCK) digestBlock(hash, schedule, tail, at);
      return Array.from(hash, (word) => (word >>> 0).toString(16).padStart(8, '0')).join('');
    },
  };
}

/** Hot: once per 64 bytes of every program, so the eight working words are locals. */
function digestBlock(
  hash: Int32Array,
  schedule: Int32Array,
  bytes: Uint8Array,
  from: number,
): void {
  expand(schedule, bytes, from);
  let a = hash[0]!;
  let b = hash[1]!;
  let c = hash[2]!;
  let d = hash[3]!;
  let e = hash[4]!;
  let f = hash[5]!;
  let g = hash[6]!;
  let h = hash[7]!;
  for (let round = 0; round < 64; round += 1) {
    const sum1 = ((e >>> 6) | (e << 26)) ^ ((e >>> 11) | (e << 21)) ^ ((e >>> 25) | (e << 7));
    const choice = (e & f) ^ (~e & g);
    const one = (h + sum1 + choice + ROUND[round]! + schedule[round]!) | 0;
    const sum0 = ((a >>> 2) | (a << 30)) ^ ((a >>> 13) | (a << 19)) ^ ((a >>> 22) | (a << 10));
    const majority = (a & b) ^ (a & c) ^ (b & c);
    h = g;
    g = f;
    f = e;
    e = (d + one) | 0;
    d = c;
    c = b;
    b = a;
    a = (one + sum0 + majority) | 0;
  }
  hash[0] = (hash[0]! + a) | 0;
  hash[1] = (hash[1]! + b) | 0;
  hash[2] = (hash[2]! + c) | 0;
  hash[3] = (hash[3]! + d) | 0;
  hash[4] = (hash[4]! + e) | 0;
  hash[5] = (hash[5]! + f) | 0;
  hash[6] = (hash[6]! + g) | 0;
  hash[7] = (hash[7]! + h) | 0;
}

function expand(schedule: Int32Array, bytes: Uint8Array, from: number): void {
  for (let word = 0; word < 16; word += 1) {
    const at = from + word * 4;
    schedule[word] =
      (bytes[at]! << 24) | (bytes[at + 1]! << 16) | (bytes[at + 2]! << 8) | bytes[at + 3]!;
  }
  for (let word = 16; word < 64; word += 1) {
    const before15 = schedule[word - 15]!;
    const before2 = schedule[word - 2]!;
    const small0 =
      ((before15 >>> 7) | (before15 << 25)) ^
      ((before15 >>> 18) | (before15 << 14)) ^
      (before15 >>> 3);
    const small1 =
      ((before2 >>> 17) | (before2 << 15)) ^
      ((before2 >>> 19) | (before2 << 13)) ^
      (before2 >>> 10);
    schedule[word] = (schedule[word - 16]! + small0 + schedule[word - 7]! + small1) | 0;
  }
}

/** UTF-8 of a string. Nearly always plain ASCII, which needs no more than a copy. */
function utf8(text: string): Uint8Array {
  const bytes = new Uint8Array(text.length);
  for (let at = 0; at < text.length; at++) {
    const code = text.charCodeAt(at);
    if (code >= 0x80) return wideUtf8(text);
    bytes[at] = code;
  }
  return bytes;
}

/** UTF-8 of a string; a lone surrogate becomes U+FFFD, as encoders do. */
function wideUtf8(text: string): Uint8Array {
  const bytes: number[] = [];
  for (const character of text) {
    const written = character.codePointAt(0)!;
    const code = 0xd800 <= written && written <= 0xdfff ? 0xfffd : written;
    if (code < 0x80) bytes.push(code);
    else if (code < 0x800) bytes.push(0xc0 | (code >> 6), 0x80 | (code & 0x3f));
    else if (code < 0x10000)
      bytes.push(0xe0 | (code >> 12), 0x80 | ((code >> 6) & 0x3f), 0x80 | (code & 0x3f));
    else
      bytes.push(
        0xf0 | (code >> 18),
        0x80 | ((code >> 12) & 0x3f),
        0x80 | ((code >> 6) & 0x3f),
        0x80 | (code & 0x3f),
      );
  }
  return Uint8Array.from(bytes);
}

/** First 32 bits of the fractional parts of the square roots of the first 8 primes (FIPS 180-4, 5.3.3). */
const START = [
  0x6a09e667, 0xbb67ae85, 0x3c6ef372, 0xa54ff53a, 0x510e527f, 0x9b05688c, 0x1f83d9ab, 0x5be0cd19,
];
/** First 32 bits of the fractional parts of the cube roots of the first 64 primes (FIPS 180-4, 4.2.2). */
const ROUND = Int32Array.from([
  0x428a2f98, 0x71374491, 0xb5c0fbcf, 0xe9b5dba5, 0x3956c25b, 0x59f111f1, 0x923f82a4, 0xab1c5ed5,
  0xd807aa98, 0x12835b01, 0x243185be, 0x550c7dc3, 0x72be5d74, 0x80deb1fe, 0x9bdc06a7, 0xc19bf174,
  0xe49b69c1, 0xefbe4786, 0x0fc19dc6, 0x240ca1cc, 0x2de92c6f, 0x4a7484aa, 0x5cb0a9dc, 0x76f988da,
  0x983e5152, 0xa831c66d, 0xb00327c8, 0xbf597fc7, 0xc6e00bf3, 0xd5a79147, 0x06ca6351, 0x14292967,
  0x27b70a85, 0x2e1b2138, 0x4d2c6dfc, 0x53380d13, 0x650a7354, 0x766a0abb, 0x81c2c92e, 0x92722c85,
  0xa2bfe8a1, 0xa81a664b, 0xc24b8b70, 0xc76c51a3, 0xd192e819, 0xd6990624, 0xf40e3585, 0x106aa070,
  0x19a4c116, 0x1e376c08, 0x2748774c, 0x34b0bcb5, 0x391c0cb3, 0x4ed8aa4a, 0x5b9cca4f, 0x682e6ff3,
  0x748f82ee, 0x78a5636f, 0x84c87814, 0x8cc70208, 0x90befffa, 0xa4506ceb, 0xbef9a3f7, 0xc67178f2,
]);
