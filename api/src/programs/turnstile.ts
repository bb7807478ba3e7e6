/** Lets a fixed number of tasks run at once; the others wait their turn in the order they came. */
export interface Turnstile {
  pass<T>(task: () => Promise<T>): Promise<T>;
}

export function openTurnstile(atOnce: number): Turnstile {
  const waiting: (() => void)[] = [];
  let running = 0;
  const enter = () =>
    new Promise<void>((resolve) => {
      if (running < atOnce) {
        running += 1;
        resolve();
      } else {
        waiting.push(resolve);
      }
    });
  const leave = () => {
    const next = waiting.shift();
    // Whoever waits takes over the place; only then does the count stay right.
    if (next) next();
    else running -= 1;
  };
  return {
    pass: async (task) => {
      await enter();
      try {
        return await task();
      } finally {
        leave();
      }
    },
  };
}
