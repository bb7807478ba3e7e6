import type { Decision } from './flow/decisions';
import type { Observer } from './interpreter/events';
import { exerciseQuietLines } from './interpreter/quiet/exercise';
import { Reading } from './reading';
import { openReport } from './report/open-report';
import type { Assumption, Report } from './report/report';
import { openSha256 } from './report/sha256';
import { RULES } from './rules/catalogue';
import type { CutMemory, Rule } from './rules/rule';
import type { Setup } from './shop/setup';
import { openShop, type Shop } from './shop/shop';
import { utf8 } from './source/utf8';

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

/**
 * One check of one program. Memory does not grow with the program, unless its blocks are not run in the order of
 * the text: then that is kept whole, up to a limit.
 */
export interface Check {
  /** Any chunking of the program's bytes. */
  push(bytes: Uint8Array): void;
  /**
   * 'read-again': the program has `/` blocks, or its blocks are not run in the order of the text; push all
   * bytes once more, then call this again. It may ask more than once.
   */
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
  exerciseQuietLines(shop);
  const digest = options.digests === false ? undefined : openSha256();
  const cuts = { isKept: false, isWanted: false, want: () => void (cuts.isWanted = true) };
  let gathered = openGathered(shop, options, cuts);
  let isFirstTime = true;
  let bytes = 0;
  let isDone = false;
  return {
    push(chunk) {
      if (isDone)
        throw new Error('The check has read the whole program; nothing more can be pushed.');
      if (isFirstTime) {
        bytes += chunk.length;
        digest?.push(chunk);
      }
      gathered.reading.push(chunk, cuts.isWanted);
    },
    endOfText() {
      isFirstTime = false;
      if (!cuts.isWanted) isDone = gathered.endOfText() === 'done';
      // Only now it is known that the walk should have remembered where it cut: it all begins again.
      if (cuts.isWanted) {
        cuts.isWanted = false;
        cuts.isKept = true;
        isDone = false;
        gathered = openGathered(shop, options, cuts);
      }
      return isDone ? 'done' : 'read-again';
    },
    get linesRead() {
      return gathered.reading.linesRead;
    },
    get bytesRead() {
      return gathered.reading.bytesRead;
    },
    report({ name, sha256 }) {
      if (!isDone) throw new Error('The report is asked for before the end of the text.');
      return gathered.finish({ name, sha256: sha256 ?? digest?.hex() ?? '', bytes });
    },
  };
}

/** A reading of the program with what is gathered from all of its walks. */
function openGathered(shop: Shop, options: CheckOptions, cuts: CutMemory) {
  const gathering = openReport(shop, options.rules ?? RULES, cuts);
  const observers = [...gathering.observers, ...(options.observe?.() ?? [])];
  const skips = options.blockDelete === 'on';
  const reading = new Reading(shop, observers, { skips, isAlwaysLoud: options.isAlwaysLoud });
  const first = reading.walk;
  const walkOthers = (which: 'run' | 'skipped') => {
    const made = reading.walkOthers((assumed) =>
      gathering.openOtherWalk(which, () => assumptions(assumed())),
    );
    gathering.assume(which, assumptions(made));
  };
  return {
    reading,
    endOfText(): 'done' | 'read-again' {
      if (reading.end() === 'read-again') return 'read-again';
      if (reading.walk === first) {
        walkOthers('run');
        if (!first.firstSkippable || skips) return 'done';
        if (reading.beginSkipping(gathering.openSecondWalk()) === 'read-again') return 'read-again';
      }
      walkOthers('skipped');
      return 'done';
    },
    finish(program: { readonly name: string; readonly sha256: string; readonly bytes: number }) {
      const { linesRead: lines, blocks, firstSkippable } = first;
      const { movesAtBounds } = reading;
      return gathering.finish({ ...program, lines, blocks, firstSkippable, movesAtBounds });
    },
  };
}

/** What a walk took for granted, as a report says it: each condition with its outcome once. */
function assumptions(made: readonly Decision[]): readonly Assumption[] {
  const seen = new Map<string, Assumption>();
  for (const each of made.map(assumption)) {
    const { line, within, condition } = each;
    const key = `${line} ${within?.text} ${within?.line} ${condition}`;
    if (!seen.has(key)) seen.set(key, each);
  }
  return [...seen.values()];
}

function assumption({ place, condition, holds }: Decision): Assumption {
  const { line, within } = place;
  const words = `${condition} ${holds ? 'holds' : 'does not hold'}`;
  if (!within) return { line, condition: words };
  return { line, within: { text: within.text, line: within.line }, condition: words };
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
