import { decodeUtf8 } from './decode';

/** Words a line may hold before it is no block at all; 26 letters and a handful of G and M words are usual. */
export const MOST_WORDS = 200;
/** Faults noted on one line; further ones say nothing new. */
const MOST_FAULTS = 8;

/** Comments of one line that are kept; nobody writes as many. */
const MOST_COMMENTS = 200;

/** What can be wrong with a line before anything of it is carried out; ids are those of the rules. */
export type ReadingProblem =
  | 'unreadable-block'
  | 'not-modelled'
  | 'repeated-word'
  | 'out-of-range-word'
  | 'nested-comment'
  | 'modal-conflict'
  | 'odd-characters'
  | 'no-decimal-point'
  | 'letter-for-digit';

/** A fault of reading: which rule it is, the bytes that show it, and the figures for its sentence. */
export interface Fault {
  readonly problem: ReadingProblem;
  readonly from: number;
  readonly to: number;
  readonly facts: Readonly<Record<string, string | number | boolean | null>>;
  /** Whether the block can no longer be trusted, so that nothing of it is carried out. */
  readonly voids: boolean;
}

/** A comment without its marks. */
export interface CommentText {
  readonly from: number;
  readonly to: number;
  /** Whether it is opened by a semicolon and runs to the end of the line. */
  readonly isLine: boolean;
}

/**
 * One line as the lexer leaves it, reused from line to line: parallel arrays, so that a block of
 * plain motion allocates nothing. Positions are indexes into `bytes`; letters are 0 for A … 25 for Z.
 */
export class LineWords {
  /** The bytes the line stands in; whoever reads lines sets it for all lines of a stretch. */
  bytes: Uint8Array = new Uint8Array(0);
  start = 0;
  /** One past the last byte of the line, its end mark not counted. */
  end = 0;
  count = 0;
  readonly letters = new Uint8Array(MOST_WORDS);
  readonly values = new Float64Array(MOST_WORDS);
  readonly starts = new Int32Array(MOST_WORDS);
  readonly ends = new Int32Array(MOST_WORDS);
  /** Whether the line ends with a line end; only the last line of a text may not. */
  ended = true;

  /** Whether any field below differs from its empty state: on most lines none does. */
  isRare = false;
  /** Whether the line begins with the block-delete mark, and where that stands. */
  skippable = false;
  skipAt = 0;
  /** Where a percent sign stands, or -1. */
  percentAt = -1;
  /**
   * Whether the line computes or steers. The lexer then leaves everything else of it to readStatement:
   * its words, comments and faults stand here only once that has read it.
   */
  isStatement = false;
  readonly comments: CommentText[] = [];
  readonly faults: Fault[] = [];
  /** Whether some fault voids the block. */
  isVoid = false;
  /** Bits of all bytes of comments and odd characters; nothing else can lie outside ASCII. */
  bits = 0;

  /** Empties what the last rare line left. */
  clearRare(): void {
    this.isRare = false;
    this.skippable = false;
    this.percentAt = -1;
    this.isStatement = false;
    this.comments.length = 0;
    this.faults.length = 0;
    this.isVoid = false;
    this.bits = 0;
  }

  /** A line with nothing on it, for what is told once the text is over. */
  clear(): void {
    this.clearRare();
    this.start = this.end = this.count = 0;
  }

  comment(from: number, to: number, isLine: boolean): void {
    this.isRare = true;
    if (this.comments.length < MOST_COMMENTS) this.comments.push({ from, to, isLine });
  }

  /** Whether the line holds anything but plain ASCII, so that bytes and columns differ. */
  get hasWide(): boolean {
    return (this.bits & 0x80) !== 0;
  }

  fault(fault: Fault): void {
    this.isRare = true;
    if (fault.voids) this.isVoid = true;
    if (this.faults.length >= MOST_FAULTS) return;
    if (this.faults.some((noted) => noted.problem === fault.problem)) return;
    this.faults.push(fault);
  }

  /** The bytes as text; anything but plain ASCII shows as a question mark. */
  text(from: number, to: number): string {
    let text = '';
    for (let at = from; at < to; at++) {
      const byte = this.bytes[at]!;
      text += 0x20 <= byte && byte < 0x7f ? String.fromCharCode(byte) : '?';
    }
    return text;
  }

  /** A comment's text. */
  decode(from: number, to: number): string {
    return decodeUtf8(this.bytes, from, to);
  }
}
