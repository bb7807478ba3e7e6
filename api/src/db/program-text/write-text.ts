import { createHash } from 'node:crypto';
import { promisify } from 'node:util';
import { gzip } from 'node:zlib';
import { selectOne, type BoundContext } from '../store-context';
import { openTextSplitter, type TextChunk } from './split-text';

const compress = promisify(gzip);
/** Level 4: a tenth larger than the default and twice as fast on program text; an upload waits for it. */
const GZIP_OPTIONS = { level: 4 };

export interface StoredText {
  readonly textId: string;
  readonly sha256: string;
  readonly bytes: number;
  readonly lines: number;
}

/**
 * Stores a program text as it streams in, one chunk in memory at a time. The hash is known only at the
 * end: until then the text stands without one, visible to this transaction alone. When the shop has
 * the same bytes already, what was written is taken back and the text it has is returned.
 */
export async function writeText(
  ctx: BoundContext,
  shopId: string,
  source: AsyncIterable<Uint8Array>,
): Promise<StoredText> {
  const { transaction, models } = ctx;
  const pending = await models.programText.create({ shopId }, { transaction });
  const splitter = openTextSplitter();
  const hash = createHash('sha256');
  let ordinal = 0;
  const writeChunks = async (chunks: readonly TextChunk[]): Promise<void> => {
    for (const chunk of chunks) {
      await writeChunk(ctx, pending.id, ordinal, chunk);
      ordinal += 1;
    }
  };
  for await (const bytes of source) {
    hash.update(bytes);
    await writeChunks(splitter.push(bytes));
  }
  await writeChunks(splitter.end());

  const sha256 = hash.digest('hex');
  const { bytes, lines } = splitter;
  const twin = await findTwin(ctx, shopId, sha256);
  if (twin === undefined) {
    await pending.update({ sha256, bytes, lines }, { transaction });
  } else {
    await pending.destroy({ transaction });
  }
  return { textId: twin ?? pending.id, sha256, bytes, lines };
}

async function writeChunk(
  { models, transaction }: BoundContext,
  textId: string,
  ordinal: number,
  { bytes, firstLine, lineCount, firstByte }: TextChunk,
): Promise<void> {
  const data = await compress(bytes, GZIP_OPTIONS);
  const byteCount = bytes.length;
  await models.programChunk.create(
    { textId, ordinal, firstLine, lineCount, firstByte, byteCount, data },
    { transaction, returning: false },
  );
}

/**
 * The text of the shop with this hash, if there is one. Two uploads of the same bytes at the same
 * moment must not both find none: the lock on shop and hash makes the second wait for the first.
 */
async function findTwin(
  ctx: BoundContext,
  shopId: string,
  sha256: string,
): Promise<string | undefined> {
  const values = { shopId, sha256 };
  await selectOne(
    ctx,
    `select pg_advisory_xact_lock(hashtextextended('program_text ' || :shopId || :sha256, 0))`,
    values,
  );
  const row = await selectOne<{ id: string }>(
    ctx,
    'select id from program_text where shop_id = :shopId and sha256 = :sha256',
    values,
  );
  return row?.id;
}
