import type { Observer } from './interpreter/events';
import { Walk } from './interpreter/walk';
import { openReport } from './report/open-report';
import type { Report } from './report/report';
import { openSha256 } from './report/sha256';
import { RULES } from './rules/catalogue';
import type { Rule } from './rules/rule';
import type { Setup } from './shop/setup';
import { openShop } from './shop/shop';

export interface CheckOptions {
  /** Called beside the rules, on the walk that reads `/` blocks as run. */
  readonly observers?: readonly Observer[] | undefined;
  /** In place of the whole catalogue. */
  readonly rules?: readonly Rule[] | undefined;
  /** False where the host works out the digest of the bytes itself and gives it to `report`. */
  readonly digests?: boolean | undefined;
  /** 'on': the controller's block-delete switch is on, so blocks with a `/` are skipped and never read as run. */
  readonly blockDelete?: 'on' | undefined;
}

/** One check of one program. Memory does not grow with the program. */
export interface Check {
  /** Any chunking of the program's bytes. */
  push(bytes: Uint8Array): void;
  /** 'read-again': the program has `/` blocks; push all bytes once more, then call this again. */
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
  const gathering = openReport(shop, options.rules ?? RULES);
  const digest = options.digests === false ? undefined : openSha256();
  const observers = [...gathering.observers, ...(options.observers ?? [])];
  const skips = options.blockDelete === 'on';
  const first = new Walk(shop, observers, { skips });
  let current = first;
  let bytes = 0;
  let bytesRead = 0;
  let isDone = false;
  return {
    push(chunk) {
      if (isDone)
        throw new Error('The check has read the whole program; nothing more can be pushed.');
      bytesRead += chunk.length;
      if (current === first) {
        bytes += chunk.length;
        digest?.push(chunk);
      }
      current.push(chunk);
    },
    endOfText() {
      current.endOfText();
      if (current === first && first.firstSkippable && !skips) {
        current = new Walk(shop, gathering.openSecondWalk(), { skips: true });
        bytesRead = 0;
        return 'read-again';
      }
      isDone = true;
      return 'done';
    },
    get linesRead() {
      return current.linesRead;
    },
    get bytesRead() {
      return bytesRead;
    },
    report({ name, sha256 }) {
      if (!isDone) throw new Error('The report is asked for before the end of the text.');
      return gathering.finish({
        name,
        sha256: sha256 ?? digest?.hex() ?? '',
        bytes,
        lines: first.linesRead,
        blocks: first.blocks,
        firstSkippable: first.firstSkippable,
        movesAtBounds: first.movesAtBounds,
      });
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
  check.push(bytes);
  if (check.endOfText() === 'read-again') {
    check.push(bytes);
    check.endOfText();
  }
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
