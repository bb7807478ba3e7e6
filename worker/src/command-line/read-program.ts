import { closeSync, openSync, readSync } from 'node:fs';
import { InputRefused } from './input-refused';
import { reasonOf } from './read-setup';

/** Small enough to stay out of the way, large enough that reading costs nothing beside checking. */
const CHUNK_BYTES = 256 * 1024;

/**
 * Hands a program's bytes over in chunks; the same buffer is used again for the next one.
 * @throws InputRefused when it cannot be read or is no text.
 */
export function readProgram(path: string, take: (bytes: Uint8Array) => void): void {
  const file = openProgram(path);
  const buffer = new Uint8Array(CHUNK_BYTES);
  try {
    for (let isFirst = true; ; isFirst = false) {
      const length = readChunk(path, file, buffer);
      if (length === 0) return;
      if (isFirst) refuseBinary(path, buffer.subarray(0, length));
      take(buffer.subarray(0, length));
    }
  } finally {
    closeSync(file);
  }
}

function openProgram(path: string): number {
  try {
    return openSync(path, 'r');
  } catch (error) {
    throw new InputRefused(`The program ${path} cannot be read: ${reasonOf(error)}.`);
  }
}

function readChunk(path: string, file: number, buffer: Uint8Array): number {
  try {
    return readSync(file, buffer);
  } catch (error) {
    // A folder opens and then cannot be read.
    throw new InputRefused(`The program ${path} cannot be read: ${reasonOf(error)}.`);
  }
}

/** How much of the beginning is looked at; a text has no NUL byte, and pictures and archives have one here. */
const SNIFFED_BYTES = 8192;

function refuseBinary(path: string, bytes: Uint8Array): void {
  const isUtf16 =
    (bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff);
  if (isUtf16) {
    throw new InputRefused(`The program ${path} is UTF-16 text: save it as plain text (UTF-8).`);
  }
  if (bytes.subarray(0, SNIFFED_BYTES).includes(0)) {
    throw new InputRefused(
      `The program ${path} is no text but a binary file: give the posted program.`,
    );
  }
}
