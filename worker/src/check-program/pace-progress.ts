/** Listeners are told this often at most, unless many lines were read since. */
const TELL_MS = 250;
const TELL_LINES = 20_000;
/** The row is kept up to date this often at most: a write costs more than a notice. */
const KEEP_MS = 1000;

export interface ProgressSink {
  tell(linesRead: number): Promise<void>;
  keep(linesRead: number): Promise<void>;
}

/** Passes progress on at a pace that neither floods listeners nor writes a row for every chunk. */
export function paceProgress(
  sink: ProgressSink,
  now: () => number,
): (linesRead: number) => Promise<void> {
  let toldAt = -Infinity;
  let toldLines = 0;
  let keptAt = now();
  return async (linesRead) => {
    const moment = now();
    if (TELL_MS <= moment - toldAt || TELL_LINES <= linesRead - toldLines) {
      toldAt = moment;
      toldLines = linesRead;
      await sink.tell(linesRead);
    }
    if (KEEP_MS <= moment - keptAt) {
      keptAt = moment;
      await sink.keep(linesRead);
    }
  };
}
