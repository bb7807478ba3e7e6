import { Decisions, type Decision } from './flow/decisions';
import { KeptProgram } from './flow/kept-program';
import { Library } from './flow/library';
import { LARGEST_KEPT, MOST_REPEATED, MOST_WALKS } from './flow/limits';
import { TextKeeper } from './flow/program-text';
import type { Observer } from './interpreter/events';
import { Walk, type WalkOptions } from './interpreter/walk';
import type { Shop } from './shop/shop';

/** Of all walks of one reading together: what is beyond is named, not walked. */
const MOST_BLOCKS = 2 * MOST_REPEATED;

/**
 * Feeds walks with the bytes of one program. A walk streams them; where it pauses for the whole text, the bytes
 * are asked for once more and kept, and from then on every walk goes over what is kept.
 */
export class Reading {
  walk: Walk;
  /** Of the push now going on. */
  bytesRead = 0;
  /** Whether any walk so far judged a motion at the bounds of what is not known. */
  movesAtBounds = false;
  private decisions = new Decisions();
  private keeper: TextKeeper | undefined;
  private kept: KeptProgram | undefined;
  private readonly library: Library;

  constructor(
    private readonly shop: Shop,
    observers: readonly Observer[],
    private options: WalkOptions,
  ) {
    this.walk = new Walk(shop, observers, options);
    this.library = new Library(shop.setup.subprograms, this.grammar);
  }

  /** `isVain`: bytes that are only counted, because it all begins again. */
  push(bytes: Uint8Array, isVain = false): void {
    this.bytesRead += bytes.length;
    if (!isVain) (this.keeper ?? this.walk).push(bytes);
  }

  /** Lines of the push now going on. */
  get linesRead(): number {
    return this.keeper?.lines ?? this.walk.linesRead;
  }

  /** After the last byte of a push: whether the walk is over, or the bytes are needed once more. */
  end(): 'walked' | 'read-again' {
    if (this.keeper) {
      this.kept = new KeptProgram(this.keeper.end(), this.grammar);
      this.keeper = undefined;
      this.follow();
      return 'walked';
    }
    this.walk.endOfText();
    if (this.walk.pausedAt === 0) return 'walked';
    if (this.bytesRead <= LARGEST_KEPT) this.keeper = new TextKeeper('', this.bytesRead);
    else this.walk.streamOn();
    this.bytesRead = 0;
    return 'read-again';
  }

  /** Begins another walk of the same program, which skips `/` blocks; over kept text it is over at once. */
  beginSkipping(observers: readonly Observer[]): 'walked' | 'read-again' {
    this.options = { ...this.options, skips: true };
    this.decisions = new Decisions();
    this.walk = new Walk(this.shop, observers, this.options);
    if (this.kept) {
      this.follow();
      return 'walked';
    }
    this.bytesRead = 0;
    return 'read-again';
  }

  /**
   * Walks the other outcomes of every condition that is not known before the run, the nearest to the beginning
   * first, each with observers of its own. Gives what the walk before this call took for granted.
   */
  walkOthers(
    open: (assumed: () => readonly Decision[]) => readonly Observer[],
  ): readonly Decision[] {
    const { walk, decisions } = this;
    this.movesAtBounds ||= walk.movesAtBounds;
    const queue = decisions.others();
    const walks = [walk];
    const notWalked = [...decisions.beyond];
    let blocks = walk.follower?.blocksRun ?? 0;
    const isExhausted = () => blocks >= MOST_BLOCKS || walks.at(-1)!.follower?.isExhausted === true;
    while (queue.length > 0 && walks.length < MOST_WALKS && !isExhausted()) {
      const own = new Decisions(queue.shift()!.given);
      const other = new Walk(
        this.shop,
        open(() => own.made),
        this.options,
      );
      other.follow({ program: this.kept!, library: this.library, decisions: own });
      walks.push(other);
      this.movesAtBounds ||= other.movesAtBounds;
      blocks += other.follower!.blocksRun;
      queue.push(...own.others());
      notWalked.push(...own.beyond);
    }
    tellNotWalked(walks, [...queue.map(({ parts }) => parts), ...notWalked]);
    tellIfNeverLeft(walks);
    return decisions.made;
  }

  private follow(): void {
    const { kept, library, decisions } = this;
    this.walk.follow({ program: kept!, library, decisions });
  }

  private get grammar() {
    const { language, switches } = this.shop.setup.controller;
    return { isMacro: language === 'custom-macro', isStrict: switches.strict };
  }
}

/** Each condition once, however many walks would part there; to all walks, because it hangs on none of them. */
function tellNotWalked(walks: readonly Walk[], notWalked: readonly Decision[]): void {
  const told = new Set<string>();
  for (const { place, condition } of notWalked) {
    const key = `${place.line} ${place.within?.text} ${place.within?.line} ${condition}`;
    if (told.has(key)) continue;
    told.add(key);
    const facts = { what: condition, reason: 'undecided', most: MOST_WALKS };
    for (const walk of walks) walk.tellLater('not-modelled', place, facts);
  }
}

/** A loop that some walk waits in for ever is left in another one; if it is in none, it never ends. */
function tellIfNeverLeft(walks: readonly Walk[]): void {
  if (walks.some(({ follower }) => !follower?.waitsAt)) return;
  const { place, facts } = walks[0]!.follower!.waitsAt!;
  for (const walk of walks) walk.tellLater('never-ends', place, facts);
}
