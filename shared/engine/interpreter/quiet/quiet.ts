import { Room } from '../../geometry/room';

/**
 * Motion that interests no rule. Every observer of motions narrows this down to what it need not see,
 * for the state the machine is in; what is left of it by all of them is carried out without calling any.
 *
 * Only motion in program coordinates by G0 to G3 can be quiet, with no axis but X, Y and Z moved. What an
 * observer leaves open here it must be ready to miss until an event other than such a motion comes: more
 * motion may make it less curious, never more. A rapid straight up is quiet if its end is in the room.
 */
export class Quiet {
  /** Where feed motion is quiet if all of it lies within, arcs by their true extremes. */
  readonly feed = new Room();
  /** Where rapids are. */
  readonly rapid = new Room();
  readonly rooms: readonly Room[] = [this.feed, this.rapid];
  /** Whether arcs can be quiet. */
  hasArcs = true;
  /** Feeds up to this (mm/min) are quiet. */
  greatestFeed = Infinity;
  /** So much more feed motion (minutes by its F word) is quiet, from now on. */
  feedMinutes = Infinity;

  open(): void {
    this.feed.open();
    this.rapid.open();
    this.hasArcs = true;
    this.greatestFeed = this.feedMinutes = Infinity;
  }

  /** Nothing is quiet. */
  close(): void {
    this.feed.close();
    this.rapid.close();
  }

  get isClosed(): boolean {
    return this.feed.isClosed && this.rapid.isClosed;
  }
}
