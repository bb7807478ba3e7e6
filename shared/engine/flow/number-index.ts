/** Room for the line beside its number in one double: 2^26 lines, numbers below 2^27. */
const LINE_ROOM = 2 ** 26;
const HIGHEST_NUMBER = 2 ** 27;

/** The line numbers (N words) of a text: sorted once, eight bytes each, however many there are. */
export class NumberIndex {
  private keys: Float64Array;
  private count = 0;

  constructor(lines: number) {
    this.keys = new Float64Array(Math.min(lines, FIRST));
  }

  /** Lines have to be noted in their order. */
  note(number: number, line: number): void {
    if (!Number.isInteger(number) || number < 0 || number >= HIGHEST_NUMBER) return;
    if (this.count === this.keys.length) {
      const grown = new Float64Array(this.keys.length * 2);
      grown.set(this.keys);
      this.keys = grown;
    }
    this.keys[this.count++] = number * LINE_ROOM + line;
  }

  sort(): this {
    this.keys = this.keys.slice(0, this.count).sort();
    return this;
  }

  /**
   * The line with this number that is met first from `from` on to `last`, then from `first` on: line numbers
   * may repeat, and controllers look ahead before they look back (facts sheet 12.1.5).
   */
  find(number: number, from: number, first: number, last: number): number | undefined {
    return this.next(number, from, last) ?? this.next(number, first, last);
  }

  private next(number: number, from: number, last: number): number | undefined {
    const wanted = number * LINE_ROOM + from;
    let low = 0;
    let high = this.keys.length;
    while (low < high) {
      const middle = (low + high) >>> 1;
      if (this.keys[middle]! < wanted) low = middle + 1;
      else high = middle;
    }
    const key = this.keys[low];
    if (key === undefined) return undefined;
    const line = key - number * LINE_ROOM;
    return line <= last && line < LINE_ROOM ? line : undefined;
  }
}
const FIRST = 1_024;
