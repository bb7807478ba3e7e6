import { promisify } from 'node:util';
import { gunzip } from 'node:zlib';
import { select, type StoreContext } from '../store-context';
import { collectLines } from './collect-lines';

const expand = promisify(gunzip);

interface ChunkPlace {
  readonly ordinal: number;
  readonly firstLine: number;
}

/**
 * The lines of a text from one number to another, both included. Only chunks holding a byte of them
 * are read, one at a time. Served by program_chunk_lines.
 */
export async function readLines(
  ctx: StoreContext,
  textId: string,
  from: number,
  to: number,
): Promise<string[]> {
  const places = await select<ChunkPlace>(
    ctx,
    `select ordinal, first_line as "firstLine" from program_chunk
     where text_id = :textId and first_line <= :to and :from < first_line + line_count
     order by ordinal`,
    { textId, from, to },
  );
  const lines = collectLines(from, to);
  for (const { ordinal, firstLine } of places) {
    const bytes = await readChunk(ctx, textId, ordinal);
    if (bytes) lines.push(bytes, firstLine);
  }
  return lines.end();
}

/** All bytes of a text as they were uploaded, one chunk in memory at a time. */
export async function* readBytes(ctx: StoreContext, textId: string): AsyncGenerator<Uint8Array> {
  for (let ordinal = 0; ; ordinal += 1) {
    const bytes = await readChunk(ctx, textId, ordinal);
    if (!bytes) return;
    yield bytes;
  }
}

async function readChunk(
  ctx: StoreContext,
  textId: string,
  ordinal: number,
): Promise<Uint8Array | undefined> {
  const [row] = await select<{ data: Buffer }>(
    ctx,
    'select data from program_chunk where text_id = :textId and ordinal = :ordinal',
    { textId, ordinal },
  );
  return row && (await expand(row.data));
}
