import { LineSource, type LineReader } from '../source/line-source';
import { utf8 } from '../source/utf8';

const LF = 10;
const CR = 13;
/** Room for this many bytes and lines at first; both grow by doubling. */
const FIRST_BYTES = 4_096;
const FIRST_LINES = 256;
/** A last line without a line end is given one. */
const LAST_LINE_END = 1;

/** A text kept whole, so that its lines can be read in any order. Lines count from 1, as an editor has them. */
export interface ProgramText {
  /** As findings name it; '' for the program that is checked. */
  readonly name: string;
  readonly lines: number;
  /** Every line in it ends with a line end. */
  readonly bytes: Uint8Array;
  /** Where a line begins in `bytes`. */
  startOf(line: number): number;
  /** Whether the line ends with a line end in the text; only the last one may not. */
  isEnded(line: number): boolean;
  /** The length of a line that was too long to be kept, else 0. */
  overlongLength(line: number): number;
  /** The last line that holds any character, at least 1. */
  readonly lastWritten: number;
}

/** Keeps all that is pushed, cut into lines exactly as a walk that streams cuts it. */
export class TextKeeper implements LineReader, ProgramText {
  readonly name: string;
  lines = 0;
  bytes: Uint8Array;
  private length = 0;
  private starts = new Int32Array(FIRST_LINES);
  private readonly overlong = new Map<number, number>();
  private endsOpen = false;
  private readonly source = new LineSource(this);

  /** `size`: how many bytes are to come, where that is known. */
  constructor(name = '', size = FIRST_BYTES) {
    this.name = name;
    this.bytes = new Uint8Array(size + LAST_LINE_END);
  }

  push(bytes: Uint8Array): void {
    this.source.push(bytes);
  }

  /** To be called once, after the last push. */
  end(): ProgramText {
    this.source.end();
    return this;
  }

  startOf(line: number): number {
    return this.starts[line - 1]!;
  }

  isEnded(line: number): boolean {
    return !(this.endsOpen && line === this.lines);
  }

  overlongLength(line: number): number {
    return this.overlong.get(line) ?? 0;
  }

  get lastWritten(): number {
    let line = this.lines;
    while (line > 1 && isLineEnd(this.bytes[this.startOf(line)]!) && !this.overlong.has(line))
      line--;
    return Math.max(1, line);
  }

  readLines(bytes: Uint8Array, at: number, end: number): void {
    this.makeRoom(end - at);
    this.bytes.set(bytes.subarray(at, end), this.length);
    let start = this.length;
    this.length += end - at;
    while (start < this.length) {
      this.beginLine(start);
      start = this.nextLine(start);
    }
  }

  readOverlong(_bytes: Uint8Array, length: number): void {
    this.readLines(EMPTY_LINE, 0, 1);
    this.overlong.set(this.lines, length);
  }

  readLast(bytes: Uint8Array, end: number): void {
    this.readLines(bytes, 0, end);
    this.endsOpen = true;
  }

  private nextLine(start: number): number {
    const { bytes } = this;
    let at = start;
    while (!isLineEnd(bytes[at]!)) at++;
    return bytes[at] === CR && at + 1 < this.length && bytes[at + 1] === LF ? at + 2 : at + 1;
  }

  private beginLine(start: number): void {
    if (this.lines === this.starts.length) {
      const grown = new Int32Array(this.starts.length * 2);
      grown.set(this.starts);
      this.starts = grown;
    }
    this.starts[this.lines++] = start;
  }

  private makeRoom(more: number): void {
    const needed = this.length + more;
    if (needed <= this.bytes.length) return;
    const grown = new Uint8Array(Math.max(needed, this.bytes.length * 2));
    grown.set(this.bytes.subarray(0, this.length));
    this.bytes = grown;
  }
}

const EMPTY_LINE = Uint8Array.of(LF);
const isLineEnd = (byte: number): boolean => byte === LF || byte === CR;

/** A text that the setup gives. */
export function keepText(name: string, text: string): ProgramText {
  const bytes = utf8(text);
  const keeper = new TextKeeper(name, bytes.length);
  keeper.push(bytes);
  return keeper.end();
}
