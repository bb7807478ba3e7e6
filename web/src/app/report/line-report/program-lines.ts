import { DestroyRef, Injectable, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { EMPTY, Subject, auditTime, catchError, from, mergeMap, tap } from 'rxjs';
import type { ProblemError } from '../../http/problem-error';
import { toProblemError } from '../../http/problem-error';
import { CheckClient } from '../check-client';
import { LineCache } from './line-cache';
import type { LineRange } from './line-ranges';

/** A fast scroll passes many lines that nobody reads: only where it rests is asked for (ms). */
const REST = 60;
const REQUESTS_AT_ONCE = 3;

/** The program's text for the lines in view, fetched by ranges. */
@Injectable()
export class ProgramLines {
  readonly #client = inject(CheckClient);
  readonly #wanted = new Subject<void>();
  readonly #version = signal(0);
  readonly #problem = signal<ProblemError | null>(null);
  #cache = new LineCache();
  #revisionId = '';
  #last = 0;
  #inView: readonly LineRange[] = [];

  /** Grows whenever lines have come: read it to be told. */
  readonly version = this.#version.asReadonly();
  readonly problem = this.#problem.asReadonly();

  constructor() {
    this.#wanted
      .pipe(
        auditTime(REST),
        mergeMap(() => from(this.#cache.ask(this.#inView, this.#last))),
        mergeMap((range) => this.#fetch(range), REQUESTS_AT_ONCE),
        takeUntilDestroyed(inject(DestroyRef)),
      )
      .subscribe();
  }

  open(revisionId: string, last: number): void {
    if (this.#revisionId === revisionId && this.#last === last) return;
    this.#revisionId = revisionId;
    this.#last = last;
    this.#cache = new LineCache();
    this.#version.update((version) => version + 1);
  }

  text(line: number): string | undefined {
    return this.#cache.text(line);
  }

  /** The lines now in view. */
  want(ranges: readonly LineRange[]): void {
    this.#inView = ranges;
    if (this.#revisionId !== '' && this.#last > 0) this.#wanted.next();
  }

  tryAgain(): void {
    this.#problem.set(null);
    this.#wanted.next();
  }

  #fetch(range: LineRange) {
    const cache = this.#cache;
    return this.#client.lines(this.#revisionId, range.from, range.to).pipe(
      tap((answer) => {
        cache.keep(range.from, answer.lines);
        this.#problem.set(null);
        this.#version.update((version) => version + 1);
      }),
      catchError((error: unknown) => {
        cache.giveUp(range);
        this.#problem.set(toProblemError(error));
        return EMPTY;
      }),
    );
  }
}
