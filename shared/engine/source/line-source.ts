/**
 * Chunks of bytes in, whole lines out. LF, CRLF and a lone CR end a line, nothing else; a byte-order
 * mark at the very start belongs to no line. A line that lies inside one chunk is read where it
 * stands; only a line that crosses a chunk border is copied, and of that never more than
 * LONGEST_LINE bytes, so that memory and work stay bounded whatever is pushed.
 */

/** No controller reads a block near this long (256 is usual); what lies beyond is counted, not read. */
export const LONGEST_LINE = 65_536;

const LF = 10;
const CR = 13;
const BYTE_ORDER_MARK = [0xef, 0xbb, 0xbf] as const;

/** What takes the lines. Every stretch handed over ends with a line end. */
export interface LineReader {
  /** Whole lines, from `at` up to `end`. One may still be longer than LONGEST_LINE. */
  readLines(bytes: Uint8Array, at: number, end: number): void;
  /** A line of `length` bytes that was too long to be kept; `bytes` holds its beginning. */
  readOverlong(bytes: Uint8Array, length: number): void;
  /** Text after the last line end, with a line end put behind it. */
  readLast(bytes: Uint8Array, end: number): void;
}

export class LineSource {
  private readonly carry = new Uint8Array(LONGEST_LINE + 2);
  private carried = 0;
  private afterReturn = false;
  private marksMatched = 0;
  private atStart = true;

  constructor(private readonly reader: LineReader) {}

  push(bytes: Uint8Array): void {
    // A host's own kind of byte array beside the carried bytes would make every read of a byte look up
    // which kind it is: about a tenth of the walk.
    const chunk = new Uint8Array(bytes.buffer, bytes.byteOffset, bytes.length);
    let from = this.atStart ? this.skipMark(chunk) : 0;
    if (from >= chunk.length) return;
    if (this.afterReturn) {
      this.afterReturn = false;
      if (chunk[from] === LF) from++;
    }
    if (this.carried > 0) from = this.finishCarried(chunk, from);
    const end = lastLineEnd(chunk, from);
    if (end > from) {
      this.reader.readLines(chunk, from, end);
      this.afterReturn = end === chunk.length && chunk[end - 1] === CR;
      from = end;
    }
    this.keep(chunk, from, chunk.length);
  }

  /** Hands over what follows the last line end, if anything does. */
  end(): void {
    if (this.atStart) this.keepMarks(this.marksMatched);
    if (this.carried > LONGEST_LINE) this.reader.readOverlong(this.carry, this.carried);
    else if (this.carried > 0) {
      this.carry[this.carried] = LF;
      this.reader.readLast(this.carry, this.carried + 1);
    }
    this.carried = 0;
  }

  /** The mark may come in pieces; bytes that only look like its beginning are text after all. */
  private skipMark(chunk: Uint8Array): number {
    let at = 0;
    while (at < chunk.length && this.marksMatched < BYTE_ORDER_MARK.length) {
      if (chunk[at] !== BYTE_ORDER_MARK[this.marksMatched]) {
        this.atStart = false;
        this.keepMarks(this.marksMatched - at);
        return 0;
      }
      this.marksMatched++;
      at++;
    }
    this.atStart = this.marksMatched < BYTE_ORDER_MARK.length;
    return at;
  }

  private keepMarks(count: number): void {
    for (let i = 0; i < count; i++) this.carry[this.carried++] = BYTE_ORDER_MARK[i]!;
  }

  private finishCarried(chunk: Uint8Array, from: number): number {
    let at = from;
    while (at < chunk.length && chunk[at] !== LF && chunk[at] !== CR) at++;
    this.keep(chunk, from, at);
    if (at === chunk.length) return at;
    if (this.carried > LONGEST_LINE) this.reader.readOverlong(this.carry, this.carried);
    else {
      this.carry[this.carried] = LF;
      this.reader.readLines(this.carry, 0, this.carried + 1);
    }
    this.carried = 0;
    if (chunk[at] === LF) return at + 1;
    if (at + 1 === chunk.length) this.afterReturn = true;
    return chunk[at + 1] === LF ? at + 2 : at + 1;
  }

  private keep(chunk: Uint8Array, from: number, to: number): void {
    const room = LONGEST_LINE + 1 - this.carried;
    if (room > 0) this.carry.set(chunk.subarray(from, Math.min(to, from + room)), this.carried);
    this.carried += to - from;
  }
}

/** One past the last line end of the chunk, or `from` when it has none. */
function lastLineEnd(chunk: Uint8Array, from: number): number {
  let end = chunk.length;
  while (end > from && chunk[end - 1] !== LF && chunk[end - 1] !== CR) end--;
  return end;
}
