import type { MachineState, Motion, Observer } from './events';

interface MotionCall {
  readonly on: Observer;
  readonly motion: NonNullable<Observer['motion']>;
}

/**
 * Passes motions to the observers that want them. This is the one event that comes with every block, and
 * some forty rules listen to it: a call costs about 8 ns, so an observer is not called for kinds of motion
 * it has no use for, nor once it has seen enough. Observers are plain functions and never use `this`.
 */
export class MotionCalls {
  private rapid: readonly MotionCall[];
  private feed: readonly MotionCall[];
  private arc: readonly MotionCall[];
  private probe: readonly MotionCall[];

  constructor(
    observers: readonly Observer[],
    private readonly state: MachineState,
  ) {
    this.rapid = callsFor(observers, 'rapid');
    this.feed = callsFor(observers, 'feed');
    this.arc = callsFor(observers, 'arc');
    this.probe = callsFor(observers, 'probe');
  }

  tell(motion: Motion): void {
    const { kind } = motion;
    const calls =
      kind === 'feed'
        ? this.feed
        : kind === 'rapid'
          ? this.rapid
          : kind === 'arc'
            ? this.arc
            : this.probe;
    for (const call of calls) if (call.motion(motion, this.state) === 'enough') this.drop(call.on);
  }

  /** The lists are replaced, not changed, so that the loop now running goes on over its own. */
  private drop(observer: Observer): void {
    const others = (calls: readonly MotionCall[]) => calls.filter(({ on }) => on !== observer);
    this.rapid = others(this.rapid);
    this.feed = others(this.feed);
    this.arc = others(this.arc);
    this.probe = others(this.probe);
  }
}

function callsFor(observers: readonly Observer[], kind: Motion['kind']): readonly MotionCall[] {
  return observers.flatMap((on) =>
    on.motion && (on.motionKinds ?? [kind]).includes(kind) ? [{ on, motion: on.motion }] : [],
  );
}
