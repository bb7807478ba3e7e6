/** Characters shown of one line at most; a longer one is cut, so that one odd file cannot flood a page. */
export const LONGEST_LINE_SHOWN = 2000;
/** A character is at most this many bytes of UTF-8; bytes beyond the cut need not be kept. */
const BYTES_PER_CHARACTER = 4;

const LF = 10;
const CR = 13;

/** Gathers the text of lines `from` to `to` out of chunks given in order. */
export interface LineCollector {
  /** `firstLine` of the first chunk counts; the chunks that follow must join it without a gap. */
  push(bytes: Uint8Array, firstLine: number): void;
  /** The lines that there are, decoded as UTF-8, without line ends. */
  end(): string[];
}

export function collectLines(from: number, to: number): LineCollector {
  const lines: string[] = [];
  const kept = new Uint8Array(LONGEST_LINE_SHOWN * BYTES_PER_CHARACTER);
  let keptCount = 0;
  let line = 0;
  let isLineOpen = false;
  let isBehindCr = false;

  const endLine = (): void => {
    if (from <= line && line <= to) lines.push(decode(kept.subarray(0, keptCount)));
    line += 1;
    keptCount = 0;
    isLineOpen = false;
  };
  return {
    push(bytes, firstLine) {
      if (line === 0) line = firstLine;
      for (let at = 0; at < bytes.length && line <= to; at += 1) {
        const byte = bytes[at]!;
        const isSecondOfCrlf = byte === LF && isBehindCr;
        isBehindCr = byte === CR;
        if (isSecondOfCrlf) continue;
        if (byte === LF || byte === CR) {
          endLine();
          continue;
        }
        isLineOpen = true;
        if (from <= line && keptCount < kept.length) {
          kept[keptCount] = byte;
          keptCount += 1;
        }
      }
    },
    end() {
      if (isLineOpen && line <= to) endLine();
      return lines;
    },
  };
}

/** Invalid bytes become replacement characters; a byte-order mark stays, the engine reads it too. */
function decode(bytes: Uint8Array): string {
  const text = new TextDecoder('utf-8', { ignoreBOM: true }).decode(bytes);
  return text.length <= LONGEST_LINE_SHOWN ? text : text.slice(0, LONGEST_LINE_SHOWN);
}
