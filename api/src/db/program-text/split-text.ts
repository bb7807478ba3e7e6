/** Raw bytes a stored chunk holds at most: large enough to compress well, small enough to read one for one line. */
export const CHUNK_BYTES = 256 * 1024;

/** A stretch of a program text, cut behind a line end wherever a line is not longer than a chunk. */
export interface TextChunk {
  readonly bytes: Uint8Array;
  /** The line, counted from 1, that the first byte belongs to. */
  readonly firstLine: number;
  /** Lines of which at least one byte stands in the chunk. */
  readonly lineCount: number;
  readonly firstByte: number;
}
/** Cuts bytes pushed in any sizes into chunks; the same bytes give the same chunks. */
export interface TextSplitter {
  /** The chunks that are complete now. Their bytes are copies and may be kept. */
  push(bytes: Uint8Array): TextChunk[];
  /** What is left, as the last chunks. */
  end(): TextChunk[];
  /** Bytes and lines handed out so far; lines as an editor counts them: line ends + 1 if text follows. */
  readonly bytes: number;
  readonly lines: number;
}

const LF = 10;
const CR = 13;

/** `chunkBytes`: at least 2, so that a CRLF has room in one chunk. */
export function openTextSplitter(chunkBytes = CHUNK_BYTES): TextSplitter {
  // One byte more than a chunk: whether a CR at its end ends a line is known with the byte behind it.
  const buffer = new Uint8Array(chunkBytes + 1);
  let held = 0;
  let bytes = 0;
  let lineEnds = 0;
  let isLineOpen = false;

  const take = (length: number): TextChunk => {
    const taken = buffer.slice(0, length);
    const ends = countLineEnds(taken);
    isLineOpen = !isLineEnd(taken[length - 1]);
    const lineCount = ends + (isLineOpen ? 1 : 0);
    const chunk = { bytes: taken, firstLine: lineEnds + 1, lineCount, firstByte: bytes };
    buffer.copyWithin(0, length, held);
    held -= length;
    bytes += length;
    lineEnds += ends;
    return chunk;
  };
  return {
    push(pushed) {
      const chunks: TextChunk[] = [];
      for (let from = 0; from < pushed.length;) {
        const room = Math.min(pushed.length - from, buffer.length - held);
        buffer.set(pushed.subarray(from, from + room), held);
        held += room;
        from += room;
        if (held === buffer.length) chunks.push(take(cutAt(buffer)));
      }
      return chunks;
    },
    end() {
      const chunks: TextChunk[] = [];
      while (0 < held) chunks.push(take(held));
      return chunks;
    },
    get bytes() {
      return bytes;
    },
    get lines() {
      return lineEnds + (isLineOpen ? 1 : 0);
    },
  };
}

/** Where a full buffer is cut: behind its last line end, else before its last byte; never inside a CRLF. */
function cutAt(buffer: Uint8Array): number {
  const most = buffer.length - 1;
  for (let at = most; 0 < at; at -= 1) {
    const isInsideCrlf = buffer[at - 1] === CR && buffer[at] === LF;
    if (isLineEnd(buffer[at - 1]) && !isInsideCrlf) return at;
  }
  return buffer[most - 1] === CR ? most - 1 : most;
}

/** LF, CRLF and lone CR end a line, nothing else. */
function countLineEnds(bytes: Uint8Array): number {
  let ends = 0;
  for (let at = 0; at < bytes.length; at += 1) {
    const byte = bytes[at];
    if (byte === LF) ends += 1;
    else if (byte === CR && bytes[at + 1] !== LF) ends += 1;
  }
  return ends;
}

function isLineEnd(byte: number | undefined): boolean {
  return byte === LF || byte === CR;
}
