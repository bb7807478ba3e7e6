import type { MachineState, Motion, Observer } from './events';

type Listener = Required<Pick<Observer, 'motion'>>;

/** Passes motions that are not quiet to the observers that want them; they are plain functions without a `this`. */
export class MotionCalls {
  private readonly listeners: readonly Listener['motion'][];

  constructor(
    observers: readonly Observer[],
    private readonly state: MachineState,
  ) {
    this.listeners = observers.flatMap(({ motion }) => (motion ? [motion] : []));
  }

  tell(motion: Motion): void {
    for (const listener of this.listeners) listener(motion, this.state);
  }
}
