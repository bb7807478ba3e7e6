import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatSnackBar } from '@angular/material/snack-bar';
import { RouterLink } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import type { CheckRecord } from '#contracts';
import { toProblemError } from '../http/problem-error';
import { CheckStarter } from '../programs/check-starter';
import { CurrentUser } from '../sign-in/current-user';
import { CountPipe } from '../ui/count-pipe';
import { MomentPipe } from '../ui/moment-pipe';
import { Notice } from '../ui/notice/notice';
import { PageHeader } from '../ui/page-header/page-header';
import { longDay } from '../ui/time';
import { BenchStore } from './bench-store';
import { CheckRow } from './check-row';
import { spindleInWords } from './spindle-in-words';

/** What needs me now. The page after sign-in. */
@Component({
  selector: 'nl-bench-page',
  imports: [CheckRow, CountPipe, MatButton, MomentPipe, Notice, PageHeader, RouterLink],
  templateUrl: './bench-page.html',
  styleUrl: './bench-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BenchPage {
  readonly #snackBar = inject(MatSnackBar);
  readonly #starter = inject(CheckStarter);
  readonly #user = inject(CurrentUser);
  protected readonly store = inject(BenchStore);

  protected readonly today = longDay(new Date());
  protected readonly starting = signal<ReadonlySet<string>>(new Set());
  protected readonly mayCheck = computed(() => this.#user.may('ask-for-check'));
  protected readonly lists = this.store.lists;

  /** What waits on a person, in the order it should be looked at. */
  protected readonly waiting = computed(() => {
    const lists = this.lists();
    if (!lists) return [];
    return [
      { heading: 'Not finished', about: 'the check itself failed', checks: lists.failed },
      { heading: 'Stopped', about: 'must not run as they are', checks: lists.stopped },
      { heading: 'Held', about: 'someone must look', checks: lists.held },
      {
        heading: 'Out of date',
        about: 'something they were held against has changed since',
        checks: lists.outOfDate,
      },
    ].filter((each) => each.checks.length);
  });
  protected readonly isBare = computed(() => {
    const bench = this.store.bench();
    return bench !== null && bench.checks.length === 0;
  });
  protected readonly machines = computed(() =>
    (this.store.bench()?.machines ?? []).map((machine) => ({
      ...machine,
      spindle: spindleInWords(machine.inSpindle),
    })),
  );

  protected canCheckAgain(check: CheckRecord): boolean {
    return this.mayCheck() && (check.outOfDate || check.state === 'failed');
  }

  protected async checkAgain(check: CheckRecord): Promise<void> {
    this.starting.update((ids) => new Set([...ids, check.id]));
    try {
      await firstValueFrom(this.#starter.start(check.programRevisionId, check.machineId));
      this.store.readAgain();
    } catch (error) {
      this.#snackBar.open(toProblemError(error).message, 'Close');
    } finally {
      this.starting.update((ids) => new Set([...ids].filter((id) => id !== check.id)));
    }
  }

  protected async checkAllAgain(checks: readonly CheckRecord[]): Promise<void> {
    await Promise.all(checks.map((check) => this.checkAgain(check)));
  }
}
