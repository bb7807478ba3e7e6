import { Injectable, inject, signal } from '@angular/core';
import { Observable, catchError, defer, of, retry, share, switchMap, tap, timer } from 'rxjs';
import type { CheckProgress } from '#contracts';
import { checkProgressSchema } from '#contracts';
import { CurrentUser } from '../sign-in/current-user';
import { OPEN_EVENTS } from './event-stream';

const ADDRESS = '/api/v1/events';
/** First pause before the stream is opened again, and the longest (ms). */
const FIRST_PAUSE = 2_000;
const LONGEST_PAUSE = 30_000;
/** `EventSource.CLOSED`, written out: the class is not there outside browsers. */
const CLOSED = 2;
/** So many checks are remembered; older ones are long done. */
const REMEMBERED = 500;

/**
 * How far every check of the shop has got, as it happens. While `live` is false the stream is down
 * and pages read by asking instead; it opens itself again.
 */
@Injectable({ providedIn: 'root' })
export class ShopEvents {
  readonly #open = inject(OPEN_EVENTS);
  readonly #user = inject(CurrentUser);
  readonly #live = signal(false);
  readonly #byCheck = signal<ReadonlyMap<string, CheckProgress>>(new Map());

  readonly live = this.#live.asReadonly();
  /** The newest word on each check heard of since the page was opened, by check id. */
  readonly byCheck = this.#byCheck.asReadonly();
  /** One stream for all who listen; it closes when the last one leaves. */
  readonly progress$: Observable<CheckProgress> = defer(() => this.#stream()).pipe(
    retry({ delay: (_error, failures) => this.#pause(failures), resetOnSuccess: true }),
    tap((progress) => this.#remember(progress)),
    share(),
  );

  #stream(): Observable<CheckProgress> {
    return new Observable<CheckProgress>((subscriber) => {
      const source = this.#open(ADDRESS);
      const hear = (event: MessageEvent<string>): void => {
        const progress = checkProgressSchema.safeParse(readJson(event.data));
        if (progress.success) subscriber.next(progress.data);
      };
      source.onopen = () => this.#live.set(true);
      source.onmessage = hear;
      source.onerror = () => {
        this.#live.set(false);
        // A broken connection is mended by the browser; a refused one stays closed.
        if (source.readyState === CLOSED) subscriber.error(new Error('closed'));
      };
      return () => {
        this.#live.set(false);
        source.close();
      };
    });
  }

  /** Waits longer after each failure, and asks for a new access token: an ended one closes the stream. */
  #pause(failures: number): Observable<unknown> {
    const pause = Math.min(FIRST_PAUSE * 2 ** (failures - 1), LONGEST_PAUSE);
    return timer(pause).pipe(
      switchMap(() => this.#user.refresh()),
      catchError(() => of(null)),
    );
  }

  #remember(progress: CheckProgress): void {
    this.#byCheck.update((known) => {
      const next = new Map(known);
      next.delete(progress.checkId);
      next.set(progress.checkId, progress);
      const oldest = next.keys().next().value;
      if (REMEMBERED < next.size && oldest) next.delete(oldest);
      return next;
    });
  }
}

function readJson(text: string): unknown {
  try {
    return JSON.parse(text) as unknown;
  } catch {
    // A broken event is dropped: the next one, or the next reading, says the same.
    return null;
  }
}
