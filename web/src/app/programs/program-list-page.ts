import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  computed,
  effect,
  inject,
  signal,
  untracked,
} from '@angular/core';
import { takeUntilDestroyed, toObservable, toSignal } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormField, MatLabel, MatPrefix } from '@angular/material/form-field';
import { MatIcon } from '@angular/material/icon';
import { MatInput } from '@angular/material/input';
import { MatPaginator, MatPaginatorIntl } from '@angular/material/paginator';
import type { PageEvent } from '@angular/material/paginator';
import { MatProgressBar } from '@angular/material/progress-bar';
import { MatOption, MatSelect } from '@angular/material/select';
import { ActivatedRoute, Router } from '@angular/router';
import {
  EMPTY,
  auditTime,
  catchError,
  combineLatest,
  debounceTime,
  filter,
  finalize,
  map,
  merge,
  switchMap,
  tap,
  timer,
} from 'rxjs';
import type { Observable } from 'rxjs';
import type { CheckProgress, ProgramPage as Page } from '#contracts';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { ShopEvents } from '../http/shop-events';
import { Notice } from '../ui/notice/notice';
import { PageHeader } from '../ui/page-header/page-header';
import { PageWords } from '../ui/page-words';
import type { ListQuery } from './list-query';
import { PAGE_SIZES, changed, listParams, readListQuery } from './list-query';
import { MachineChoices } from './machine-choices';
import { ProgramReader } from './program-reader';
import { ProgramTable } from './program-table';
import { UploadPanel } from './upload-panel';
import { UploadQueue } from './upload-queue';

/** A person types on; the list is asked for when they pause this long (ms). */
const TYPING_PAUSE = 250;
/** News in a burst is read once (ms); without a stream the list is read again this often (ms). */
const GATHER = 600;
const POLL = 5_000;

/** Programs: send them in, find them again. What is sought stands in the address. */
@Component({
  selector: 'nl-program-list-page',
  imports: [
    MatButton,
    MatFormField,
    MatIcon,
    MatInput,
    MatLabel,
    MatOption,
    MatPaginator,
    MatPrefix,
    MatProgressBar,
    MatSelect,
    Notice,
    PageHeader,
    ProgramTable,
    ReactiveFormsModule,
    UploadPanel,
  ],
  providers: [{ provide: MatPaginatorIntl, useClass: PageWords }],
  templateUrl: './program-list-page.html',
  styleUrl: './program-list-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProgramListPage {
  readonly #events = inject(ShopEvents);
  readonly #reader = inject(ProgramReader);
  readonly #route = inject(ActivatedRoute);
  readonly #router = inject(Router);
  readonly #again = signal(0);

  protected readonly choices = inject(MachineChoices);
  protected readonly pageSizes = PAGE_SIZES;
  protected readonly verdicts = VERDICTS;
  protected readonly search = new FormControl('', { nonNullable: true });
  protected readonly query = toSignal(this.#route.queryParams.pipe(map(readListQuery)), {
    initialValue: readListQuery({}),
  });
  protected readonly page = signal<Page | null>(null);
  protected readonly problem = signal<ProblemError | null>(null);
  protected readonly reading = signal(false);
  protected readonly isFiltered = computed(() => {
    const { search, verdict, machineId } = this.query();
    return Boolean(search || verdict || machineId);
  });
  protected readonly pageIndex = computed(() => this.query().offset / this.query().limit);
  /** What the stream said since the list was read, laid over it. */
  protected readonly byCheck = this.#events.byCheck;

  constructor() {
    effect(() => {
      const { search } = this.query();
      if (untracked(() => this.search.value.trim()) !== search) this.search.setValue(search);
    });
    this.search.valueChanges
      .pipe(debounceTime(TYPING_PAUSE), takeUntilDestroyed())
      .subscribe((search) => this.ask({ search: search.trim() }));
    this.#news()
      .pipe(takeUntilDestroyed(inject(DestroyRef)))
      .subscribe(() => this.readAgain());
    combineLatest([toObservable(this.query), toObservable(this.#again)])
      .pipe(
        switchMap(([query]) => this.#read(query)),
        takeUntilDestroyed(),
      )
      .subscribe();
  }

  /** Changes what is asked for; the address carries it, so the back key undoes it. */
  protected ask(change: Partial<ListQuery>): void {
    const query = changed(this.query(), change);
    void this.#router.navigate([], {
      relativeTo: this.#route,
      queryParams: listParams(query),
      // Every letter typed would be a step back otherwise.
      replaceUrl: 'search' in change,
    });
  }

  protected turn({ pageIndex, pageSize }: PageEvent): void {
    const offset = pageSize === this.query().limit ? pageIndex * pageSize : 0;
    this.ask({ offset, limit: pageSize });
  }

  protected showAll(): void {
    this.ask({ search: '', verdict: '', machineId: undefined });
  }

  protected readAgain(): void {
    this.#again.update((count) => count + 1);
  }

  #news(): Observable<unknown> {
    const ended = this.#events.progress$.pipe(filter(isEnd));
    const polls = timer(POLL, POLL).pipe(filter(() => !this.#events.live()));
    return merge(ended, polls, inject(UploadQueue).stored$).pipe(auditTime(GATHER));
  }

  #read(query: ListQuery): Observable<Page> {
    this.reading.set(true);
    return this.#reader.page(query).pipe(
      tap((page) => {
        this.page.set(page);
        this.problem.set(null);
        // The last row of the last page may be gone by now.
        if (page.total && page.total <= query.offset) this.ask({ offset: 0 });
      }),
      catchError((error: unknown) => {
        this.problem.set(toProblemError(error));
        return EMPTY;
      }),
      finalize(() => this.reading.set(false)),
    );
  }
}

const VERDICTS = [
  { value: '', word: 'any verdict' },
  { value: 'stopped', word: 'stopped' },
  { value: 'held', word: 'held' },
  { value: 'clear', word: 'clear' },
  { value: 'waiting', word: 'being checked' },
] as const;

function isEnd(progress: CheckProgress): boolean {
  return progress.state === 'done' || progress.state === 'failed';
}
