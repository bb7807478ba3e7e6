import type { LineRange } from './line-ranges';

/** Lines asked for together; a window of folded lines touches many places, so chunks are small. */
export const CHUNK = 200;
/** The most lines the server hands out at once. */
export const LINES_AT_ONCE = 2000;
/** Chunks kept: about as much text as a program of 100,000 lines. */
const KEPT_CHUNKS = 500;

/** Lines of one program, read in chunks as they come into view; the least lately seen are let go. */
export class LineCache {
  readonly #chunks = new Map<number, readonly string[]>();
  readonly #asked = new Set<number>();

  /** The text of a line, or undefined while it is not here. */
  text(line: number): string | undefined {
    const at = chunkOf(line);
    const chunk = this.#chunks.get(at);
    return chunk?.[line - 1 - at * CHUNK];
  }

  /** What must be asked for so that all of `ranges` is here, in as few requests as allowed; marks it asked. */
  ask(ranges: readonly LineRange[], last: number): readonly LineRange[] {
    const wanted = new Set<number>();
    for (const { from, to } of ranges) {
      for (let at = chunkOf(from); at <= chunkOf(Math.min(to, last)); at += 1) {
        this.#touch(at);
        if (!this.#chunks.has(at) && !this.#asked.has(at)) wanted.add(at);
      }
    }
    const chunks = [...wanted].sort((a, b) => a - b);
    for (const at of chunks) this.#asked.add(at);
    return requestsFor(chunks, last);
  }

  /** Keeps the lines of an answer that begins at a chunk's first line. */
  keep(from: number, lines: readonly string[]): void {
    const first = chunkOf(from);
    for (let index = 0; index * CHUNK < lines.length; index += 1) {
      this.#chunks.set(first + index, lines.slice(index * CHUNK, (index + 1) * CHUNK));
      this.#asked.delete(first + index);
    }
    for (const oldest of this.#chunks.keys()) {
      if (this.#chunks.size <= KEPT_CHUNKS) break;
      this.#chunks.delete(oldest);
    }
  }

  /** A request failed: its lines may be asked for again. */
  giveUp({ from, to }: LineRange): void {
    for (let at = chunkOf(from); at <= chunkOf(to); at += 1) this.#asked.delete(at);
  }

  #touch(at: number): void {
    const chunk = this.#chunks.get(at);
    if (!chunk) return;
    this.#chunks.delete(at);
    this.#chunks.set(at, chunk);
  }
}

function chunkOf(line: number): number {
  return Math.floor((line - 1) / CHUNK);
}

/** Neighbouring chunks together, up to the server's limit. */
function requestsFor(chunks: readonly number[], last: number): readonly LineRange[] {
  const requests: { from: number; to: number }[] = [];
  for (const at of chunks) {
    const from = at * CHUNK + 1;
    const to = Math.min(last, from + CHUNK - 1);
    const before = requests.at(-1);
    if (before && before.to + 1 === from && to - before.from < LINES_AT_ONCE) before.to = to;
    else requests.push({ from, to });
  }
  return requests;
}
