import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { takeUntilDestroyed, toObservable } from '@angular/core/rxjs-interop';
import { MatPaginator, MatPaginatorIntl } from '@angular/material/paginator';
import type { PageEvent } from '@angular/material/paginator';
import type { Observable } from 'rxjs';
import { EMPTY, catchError, switchMap, tap } from 'rxjs';
import type { ProblemError } from '../http/problem-error';
import { toProblemError } from '../http/problem-error';
import { MomentPipe } from '../ui/moment-pipe';
import { Notice } from '../ui/notice/notice';
import { PageWords } from '../ui/page-words';
import { auditLine } from './audit-words';
import type { AuditTrail } from './shop-client';
import { ShopClient } from './shop-client';

const PAGE_SIZES = [25, 50, 100, 500] as const;

/** Who did what and when, newest first. It is only ever added to. */
@Component({
  selector: 'nl-audit-page',
  imports: [MatPaginator, MomentPipe, Notice],
  providers: [{ provide: MatPaginatorIntl, useClass: PageWords }],
  templateUrl: './audit-page.html',
  styleUrl: './audit-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AuditPage {
  readonly #client = inject(ShopClient);
  readonly #trail = signal<AuditTrail | null>(null);

  protected readonly pageSizes = PAGE_SIZES;
  protected readonly asked = signal({ pageIndex: 0, pageSize: 50, again: 0 });
  protected readonly problem = signal<ProblemError | null>(null);
  protected readonly total = computed(() => this.#trail()?.total ?? 0);
  protected readonly lines = computed(() => this.#trail()?.events.map(auditLine) ?? null);

  constructor() {
    toObservable(this.asked)
      .pipe(
        switchMap(({ pageIndex, pageSize }) => this.#read(pageIndex * pageSize, pageSize)),
        takeUntilDestroyed(),
      )
      .subscribe();
  }

  protected turn({ pageIndex, pageSize }: PageEvent): void {
    this.asked.update((asked) => ({ ...asked, pageIndex, pageSize }));
  }

  protected readAgain(): void {
    this.asked.update((asked) => ({ ...asked, again: asked.again + 1 }));
  }

  #read(offset: number, limit: number): Observable<AuditTrail> {
    return this.#client.audit(offset, limit).pipe(
      tap((trail) => {
        this.#trail.set(trail);
        this.problem.set(null);
      }),
      catchError((error: unknown) => {
        this.problem.set(toProblemError(error));
        return EMPTY;
      }),
    );
  }
}
