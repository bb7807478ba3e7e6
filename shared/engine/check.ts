import type { Observer } from './interpreter/events';
import { Walk } from './interpreter/walk';
import { openReport } from './report/open-report';
import type { Report } from './report/report';
import { openSha256 } from './report/sha256';
import { RULES } from './rules/catalogue';
import type { CutMemory, Rule } from './rules/rule';
import type { Setup } from './shop/setup';
import { openShop, type Shop } from './shop/shop';

export interface CheckOptions {
  /** Opens what is called beside the rules, on the walk that reads `/` blocks as run; anew if that begins again. */
  readonly observe?: (() => readonly Observer[]) | undefined;
  /** In place of the whole catalogue. */
  readonly rules?: readonly Rule[] | undefined;
  /** For tests: every motion is told to every rule. */
  readonly isAlwaysLoud?: boolean | undefined;
  /** False where the host works out the digest of the bytes itself and gives it to `report`. */
  readonly digests?: boolean | undefined;
  /** 'on': the controller's block-delete switch is on, so blocks with a `/` are skipped and never read as run. */
  readonly blockDelete?: 'on' | undefined;
}

/** One check of one program. Memory does not grow with the program. */
export interface Check {
  /** Any chunking of the program's bytes. */
  push(bytes: Uint8Array): void;
  /** 'read-again': push all bytes once more, then call this again; it may be asked for several times. */
  endOfText(): 'done' | 'read-again';
  /** Of the reading now going on. */
  readonly linesRead: number;
  readonly bytesRead: number;
  report(program: ProgramName): Report;
}

export interface ProgramName {
  readonly name: string;
  /** Worked out by the check itself when absent. */
  readonly sha256?: string | undefined;
}

export function startCheck(setup: Setup, options: CheckOptions = {}): Check {
  const shop = openShop(setup);
  const digest = options.digests === false ? undefined : openSha256();
  const cuts = { isKept: false, isWanted: false, want: () => void (cuts.isWanted = true) };
  let reading = openReading(shop, options, cuts);
  let isFirstTime = true;
  let bytes = 0;
  let bytesRead = 0;
  let isDone = false;
  return {
    push(chunk) {
      if (isDone)
        throw new Error('The check has read the whole program; nothing more can be pushed.');
      bytesRead += chunk.length;
      if (isFirstTime) {
        bytes += chunk.length;
        digest?.push(chunk);
      }
      if (!cuts.isWanted) reading.current.push(chunk);
    },
    endOfText() {
      bytesRead = 0;
      isFirstTime = false;
      if (!cuts.isWanted) isDone = reading.endOfText() === 'done';
      // Only now it is known that the walk should have remembered where it cut: it all begins again.
      if (cuts.isWanted) {
        cuts.isWanted = false;
        cuts.isKept = true;
        isDone = false;
        reading = openReading(shop, options, cuts);
      }
      return isDone ? 'done' : 'read-again';
    },
    get linesRead() {
      return reading.current.linesRead;
    },
    get bytesRead() {
      return bytesRead;
    },
    report({ name, sha256 }) {
      if (!isDone) throw new Error('The report is asked for before the end of the text.');
      return reading.finish({ name, sha256: sha256 ?? digest?.hex() ?? '', bytes });
    },
  };
}

/** One reading of the whole text, and a second one of it where there are `/` blocks. */
function openReading(shop: Shop, options: CheckOptions, cuts: CutMemory) {
  const gathering = openReport(shop, options.rules ?? RULES, cuts);
  const observers = [...gathering.observers, ...(options.observe?.() ?? [])];
  const skips = options.blockDelete === 'on';
  const { isAlwaysLoud } = options;
  const first = new Walk(shop, observers, { skips, isAlwaysLoud });
  let current = first;
  return {
    get current() {
      return current;
    },
    endOfText(): 'done' | 'read-again' {
      current.endOfText();
      if (current !== first || !first.firstSkippable || skips) return 'done';
      current = new Walk(shop, gathering.openSecondWalk(), { skips: true, isAlwaysLoud });
      return 'read-again';
    },
    finish(program: { readonly name: string; readonly sha256: string; readonly bytes: number }) {
      const { linesRead: lines, blocks, firstSkippable, movesAtBounds } = first;
      return gathering.finish({ ...program, lines, blocks, firstSkippable, movesAtBounds });
    },
  };
}

/** The whole of it at once, for tests and small texts. */
export function checkProgram(
  program: string | Uint8Array,
  setup: Setup,
  name = 'program.nc',
): Report {
  const bytes = typeof program === 'string' ? utf8(program) : program;
  const check = startCheck(setup);
  do check.push(bytes);
  while (check.endOfText() === 'read-again');
  return check.report({ name });
}

/** UTF-8 without a host; a lone surrogate becomes the replacement character. */
export function utf8(text: string): Uint8Array {
  const bytes = new Uint8Array(text.length * 3);
  let length = 0;
  for (const character of text) {
    let point = character.codePointAt(0)!;
    if (0xd800 <= point && point <= 0xdfff) point = 0xfffd;
    if (point < 0x80) bytes[length++] = point;
    else if (point < 0x800) {
      bytes[length++] = 0xc0 | (point >> 6);
      bytes[length++] = 0x80 | (point & 63);
    } else if (point < 0x10000) {
      bytes[length++] = 0xe0 | (point >> 12);
      bytes[length++] = 0x80 | ((point >> 6) & 63);
      bytes[length++] = 0x80 | (point & 63);
    } else {
      bytes[length++] = 0xf0 | (point >> 18);
      bytes[length++] = 0x80 | ((point >> 12) & 63);
      bytes[length++] = 0x80 | ((point >> 6) & 63);
      bytes[length++] = 0x80 | (point & 63);
    }
  }
  return bytes.slice(0, length);
}
