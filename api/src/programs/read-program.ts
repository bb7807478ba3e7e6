import { SNIFFED_BYTES, sniffText } from './sniff-text';

export interface WhyRefused {
  readonly code: string;
  readonly reason: string;
  readonly next: string;
}

/** A file that is not taken; thrown through the transaction that was storing it. */
export class RefusedFile extends Error {
  override readonly name = 'RefusedFile';
  constructor(readonly why: WhyRefused) {
    super(why.reason);
  }
}

/**
 * Passes on the bytes of a file while holding them against what a program may be: text, and no larger
 * than the shop allows. The first bytes are held back until they have been looked at.
 * @throws RefusedFile at the first byte that decides it; nothing after it is read.
 */
export async function* readProgram(
  source: AsyncIterable<Uint8Array>,
  limitBytes: number,
): AsyncGenerator<Uint8Array> {
  let head: Uint8Array[] = [];
  let bytes = 0;
  let isLookedAt = false;
  for await (const chunk of source) {
    bytes += chunk.length;
    if (limitBytes < bytes) throw new RefusedFile(tooLarge(limitBytes));
    if (isLookedAt) {
      yield chunk;
      continue;
    }
    head.push(chunk);
    if (bytes < SNIFFED_BYTES) continue;
    yield lookAt(head);
    head = [];
    isLookedAt = true;
  }
  if (!isLookedAt && 0 < bytes) yield lookAt(head);
}

function lookAt(chunks: readonly Uint8Array[]): Uint8Array {
  const head = Buffer.concat(chunks);
  const notText = sniffText(head.subarray(0, SNIFFED_BYTES));
  if (notText) throw new RefusedFile(notText);
  return head;
}

function tooLarge(limitBytes: number): WhyRefused {
  return {
    code: 'too-large',
    reason: `It is larger than ${spokenSize(limitBytes)}, the most this shop takes in one file.`,
    next: 'Post it in parts, or ask the shop lead to raise the upload limit.',
  };
}

const UNITS = ['bytes', 'kB', 'MB', 'GB'] as const;

/** 268,435,456 as "256 MB": binary steps, as the limit is set. */
export function spokenSize(bytes: number): string {
  let value = bytes;
  let unit = 0;
  while (1024 <= value && unit < UNITS.length - 1) {
    value /= 1024;
    unit += 1;
  }
  const figure = Number.isInteger(value) ? String(value) : value.toFixed(1);
  return `${figure} ${UNITS[unit]}`;
}
