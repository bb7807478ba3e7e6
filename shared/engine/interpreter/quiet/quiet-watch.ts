import type { MachineState, Motion, Observer } from '../events';
import type { Pace } from './pace';
import { Quiet } from './quiet';
import { Stretch } from './stretch';

/** Motions told between two questions, at most: what is quiet also depends on where the head is. */
const MOST_PATIENCE = 64;
/** Comments remembered as saying nothing; programs repeat themselves. */
const MOST_COMMENTS = 2000;
/** A message (NISTIR 6556 3.2.4) is handed on without its mark, so that it is never quiet. */
const MAY_BE_MESSAGE = /^[ \t]*m/i;

/**
 * Knows what motion is quiet now. The observers are asked anew after every event; after motion that was
 * not quiet ever more seldom, because it can only make them less curious.
 */
export class QuietWatch {
  readonly quiet = new Quiet();
  readonly stretch = new Stretch();
  /** Whether every observer of motions says what it need not see. */
  readonly isPossible: boolean;
  readonly pace: Pace | undefined;
  /** Who wants every quiet motion. */
  readonly followers: readonly NonNullable<Observer['quietMotion']>[];
  private readonly asked: readonly NonNullable<Observer['quiet']>[];
  private readonly gathering: readonly NonNullable<Observer['stretch']>[];
  private readonly readers: readonly Observer[];
  private readonly quietComments = new Set<string>();
  private isStale = true;
  private loud = 0;
  private patience = 1;

  constructor(
    observers: readonly Observer[],
    private readonly state: MachineState,
  ) {
    this.asked = observers.flatMap(({ quiet }) => (quiet ? [quiet] : []));
    this.followers = observers.flatMap(({ quietMotion }) => (quietMotion ? [quietMotion] : []));
    this.gathering = observers.flatMap(({ stretch }) => (stretch ? [stretch] : []));
    this.pace = observers.find(({ pace }) => pace !== undefined)?.pace;
    this.readers = observers.filter(({ comment }) => comment !== undefined);
    this.isPossible =
      this.pace !== undefined &&
      observers.every(({ motion, quiet }) => !motion || quiet !== undefined);
  }

  /** Whether nobody takes anything from a comment, which is plain ASCII. */
  isQuietComment(bytes: Uint8Array, from: number, to: number): boolean {
    if (this.readers.length === 0) return true;
    let text = '';
    for (let at = from; at < to; at++) text += String.fromCharCode(bytes[at]!);
    if (this.quietComments.has(text)) return true;
    if (MAY_BE_MESSAGE.test(text)) return false;
    for (const { saysNothing } of this.readers) if (!saysNothing?.(text)) return false;
    if (this.quietComments.size >= MOST_COMMENTS) this.quietComments.clear();
    this.quietComments.add(text);
    return true;
  }

  /** Something other than motion was told: what was quiet may not be now. */
  ask(): void {
    this.isStale = true;
  }

  noteLoud(motion: Motion): void {
    this.loud++;
    if (motion.by !== 'program') this.isStale = true;
    else if (motion.kind !== 'rapid' && motion.feed > 0)
      this.quiet.feedMinutes -= motion.length / motion.feed;
  }

  /** Whether any motion is quiet now. */
  refresh(): boolean {
    if (this.isStale) this.patience = 1;
    else if (this.loud < this.patience) return !this.quiet.isClosed;
    else this.patience = Math.min(2 * this.patience, MOST_PATIENCE);
    this.isStale = false;
    this.loud = 0;
    this.quiet.open();
    for (const quiet of this.asked) quiet(this.quiet, this.state);
    return !this.quiet.isClosed;
  }

  /** Hands over what has been gathered, before anything else is told. */
  flush(): void {
    const { stretch } = this;
    if (stretch.motions === 0) return;
    this.quiet.feedMinutes -= stretch.feedMinutes;
    for (const gather of this.gathering) gather(stretch, this.state);
    stretch.clear();
  }
}
