import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Response } from 'express';

/** Streams bytes to the reply as fast as it takes them; a reader who leaves is no fault. */
export async function sendText(
  bytes: AsyncIterable<Uint8Array>,
  response: Response,
): Promise<void> {
  try {
    await pipeline(Readable.from(bytes, { objectMode: false }), response);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ERR_STREAM_PREMATURE_CLOSE') throw error;
  }
}
