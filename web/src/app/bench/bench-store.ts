import { HttpClient } from '@angular/common/http';
import { DestroyRef, Injectable, computed, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { Observable } from 'rxjs';
import {
  EMPTY,
  Subject,
  auditTime,
  catchError,
  filter,
  merge,
  of,
  switchMap,
  tap,
  timer,
} from 'rxjs';
import type { Bench } from '#contracts';
import { benchSchema } from '#contracts';
import { parsed } from '../http/parsed';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { ShopEvents } from '../http/shop-events';
import { countNeedingSomeone, partChecks, withProgress } from './bench-lists';

/** While the event stream is down, the bench is read again this often (ms). */
const POLL = 5_000;
/** Verdicts that come in a burst are read once (ms). */
const GATHER = 400;

/** What is on the bench now, kept current by events, or by asking while there are none. */
@Injectable({ providedIn: 'root' })
export class BenchStore {
  readonly #http = inject(HttpClient);
  readonly #events = inject(ShopEvents);
  readonly #bench = signal<Bench | null>(null);
  readonly #problem = signal<ProblemError | null>(null);
  readonly #asked = new Subject<void>();

  readonly problem = this.#problem.asReadonly();
  readonly live = this.#events.live;
  readonly bench = this.#bench.asReadonly();
  readonly lists = computed(() => {
    const bench = this.#bench();
    return bench && partChecks(withProgress(bench.checks, this.#events.byCheck()));
  });
  readonly needingSomeone = computed(() => {
    const lists = this.lists();
    return lists ? countNeedingSomeone(lists) : 0;
  });

  /** Reads the bench and keeps it current for as long as the caller lives. */
  follow(): void {
    const news = this.#events.progress$.pipe(filter((progress) => this.#isNews(progress)));
    const polls = timer(POLL, POLL).pipe(filter(() => !this.#events.live()));
    merge(of(null), merge(news, polls, this.#asked).pipe(auditTime(GATHER)))
      .pipe(
        switchMap(() => this.#read()),
        takeUntilDestroyed(inject(DestroyRef)),
      )
      .subscribe();
  }

  /** Reads it again now: after an act of this person, or when they ask to try again. */
  readAgain(): void {
    this.#asked.next();
  }

  /** Line counts are laid over the list as they come; a start, an end or a stranger needs a reading. */
  #isNews(progress: { checkId: string; state: string }): boolean {
    const known = this.#bench()?.checks.find((check) => check.id === progress.checkId);
    return known?.state !== progress.state;
  }

  #read(): Observable<Bench> {
    return this.#http.get('/api/v1/bench').pipe(
      parsed(benchSchema),
      tap((bench) => {
        this.#bench.set(bench);
        this.#problem.set(null);
      }),
      catchError((error: unknown) => {
        this.#problem.set(toProblemError(error));
        return EMPTY;
      }),
    );
  }
}
