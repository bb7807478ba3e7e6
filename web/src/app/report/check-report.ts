import { DestroyRef, Injectable, computed, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { Observable } from 'rxjs';
import {
  EMPTY,
  Subject,
  catchError,
  filter,
  map,
  merge,
  switchMap,
  takeWhile,
  tap,
  timer,
} from 'rxjs';
import type {
  CheckDetails,
  CheckProgress,
  MachineDetails,
  PlanPath,
  StoredFinding,
} from '#contracts';
import { setupSchema } from '#contracts';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { ShopEvents } from '../http/shop-events';
import { CheckClient } from './check-client';

/** While the event stream is down a running check is asked for this often (ms). */
const POLL = 2_000;
/** And every so many turns all the same: an event may have passed before the page listened. */
const SELDOM = 8;

/** One check as its report page needs it: read, followed while it runs, and read again when done. */
@Injectable()
export class CheckReport {
  readonly #client = inject(CheckClient);
  readonly #events = inject(ShopEvents);
  readonly #opened = new Subject<string>();
  readonly #details = signal<CheckDetails | null>(null);
  readonly #progress = signal<CheckProgress | null>(null);
  readonly #findings = signal<readonly StoredFinding[] | null>(null);
  readonly #path = signal<PlanPath | null>(null);
  readonly #machineNow = signal<MachineDetails | null>(null);
  readonly #problem = signal<ProblemError | null>(null);
  readonly #findingsProblem = signal<ProblemError | null>(null);
  readonly #pathProblem = signal<ProblemError | null>(null);

  readonly details = this.#details.asReadonly();
  readonly findings = this.#findings.asReadonly();
  readonly path = this.#path.asReadonly();
  /** The machine as it stands today; read only when the check is out of date. */
  readonly machineNow = this.#machineNow.asReadonly();
  readonly problem = this.#problem.asReadonly();
  readonly findingsProblem = this.#findingsProblem.asReadonly();
  readonly pathProblem = this.#pathProblem.asReadonly();
  /** The check with the newest word on how far it has got. */
  readonly check = computed(() => {
    const check = this.#details()?.check ?? null;
    const progress = this.#progress();
    if (!check || progress?.checkId !== check.id || isOver(check.state)) return check;
    return { ...check, state: progress.state, linesRead: progress.linesRead };
  });
  /** The setup as it was checked; null when this page cannot read it. */
  readonly setup = computed(() => {
    const parsed = setupSchema.safeParse(this.#details()?.setup);
    return parsed.success ? parsed.data : null;
  });

  constructor() {
    this.#opened
      .pipe(
        switchMap((id) => this.#read(id)),
        takeUntilDestroyed(inject(DestroyRef)),
      )
      .subscribe();
  }

  /** Reads a check anew, forgetting any other. */
  open(id: string): void {
    if (this.#details()?.check.id !== id) this.#forget();
    this.#problem.set(null);
    this.#opened.next(id);
  }

  #read(id: string): Observable<unknown> {
    return this.#client.details(id).pipe(
      catchError((error: unknown) => this.#keep(this.#problem, error)),
      tap((details) => this.#details.set(details)),
      switchMap((details) =>
        isOver(details.check.state) ? this.#rest(details) : this.#follow(id),
      ),
    );
  }

  /** Findings, path and, when something has moved on, the machine of today: side by side. */
  #rest(details: CheckDetails): Observable<unknown> {
    const { id, state, outOfDate, machineId } = details.check;
    const now = outOfDate
      ? this.#client.machine(machineId).pipe(
          tap((machine) => this.#machineNow.set(machine)),
          // Only the notice grows shorter without it: that something changed is known already.
          catchError(() => EMPTY),
        )
      : EMPTY;
    if (state === 'failed') return now;
    const findings = this.#client.findings(id).pipe(
      tap((all) => this.#findings.set(all)),
      catchError((error: unknown) => this.#keep(this.#findingsProblem, error)),
    );
    const path = this.#client.path(id).pipe(
      tap((drawn) => this.#path.set(drawn)),
      catchError((error: unknown) => this.#keep(this.#pathProblem, error)),
    );
    return merge(findings, path, now);
  }

  /** Until the check is over: events while they come, asking while they do not; then reads the rest. */
  #follow(id: string): Observable<unknown> {
    const told = this.#events.progress$.pipe(filter((progress) => progress.checkId === id));
    const asked = timer(POLL, POLL).pipe(
      filter((turn) => !this.#events.live() || turn % SELDOM === 0),
      switchMap(() =>
        this.#client.details(id).pipe(
          map(({ check }) => ({ ...check, checkId: check.id })),
          // The server may be away for a moment; the next turn asks again.
          catchError(() => EMPTY),
        ),
      ),
    );
    return merge(told, asked).pipe(
      tap((progress) => this.#progress.set(progress)),
      takeWhile((progress) => !isOver(progress.state), true),
      filter((progress) => isOver(progress.state)),
      switchMap(() => this.#read(id)),
    );
  }

  #keep(into: { set(problem: ProblemError): void }, error: unknown): Observable<never> {
    into.set(toProblemError(error));
    return EMPTY;
  }

  #forget(): void {
    this.#details.set(null);
    this.#progress.set(null);
    this.#findings.set(null);
    this.#path.set(null);
    this.#machineNow.set(null);
    this.#findingsProblem.set(null);
    this.#pathProblem.set(null);
  }
}

function isOver(state: CheckDetails['check']['state']): boolean {
  return state === 'done' || state === 'failed';
}
